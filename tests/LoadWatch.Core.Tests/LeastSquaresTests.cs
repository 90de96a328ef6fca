namespace LoadWatch;

public class LeastSquaresTests
{
    /// <summary>
    /// By hand: x' = 2.5, y' = 3.5, Sxx = 5, Sxy = 7, so b = 1.4 and a = 0; residuals 0.6, -0.8, -0.2, 0.4, squares 1.2, s = sqrt(0.6) = 0.774597;
    /// error of b = 0.774597 / 2.236068 = 0.346410, of a = 0.774597 sqrt(0.25 + 6.25 / 5) = 0.948683; Syy = 11, R2 = 1 - 1.2 / 11 = 0.890909.
    /// </summary>
    [Fact]
    public void FourPointsGiveTheLineAndItsErrors()
    {
        var line = LeastSquares.Of([1, 2, 3, 4], [2, 2, 4, 6])!;

        Assert.Equal(1.4, line.Slope, 12);
        Assert.Equal(0, line.Intercept, 12);
        Assert.Equal(0.774597, line.StandardError!.Value, 6);
        Assert.Equal(0.346410, line.SlopeError!.Value, 6);
        Assert.Equal(0.948683, line.InterceptError!.Value, 6);
        Assert.Equal(0.890909, line.RSquared!.Value, 6);
    }

    [Fact]
    public void TwoPointsLeaveNothingOverForAnError()
    {
        var line = LeastSquares.Of([1, 3], [5, 9])!;

        Assert.Equal((2, 3), (line.Slope, line.Intercept));
        Assert.Null(line.StandardError);
        Assert.Null(line.SlopeError);
        Assert.Null(line.InterceptError);
    }

    [Fact]
    public void WithoutALineThereIsNone()
    {
        Assert.Null(LeastSquares.Of([], []));
        Assert.Null(LeastSquares.Of([1], [1]));
        Assert.Null(LeastSquares.Of([0.1, 0.1, 0.1], [1, 2, 3]));
        Assert.Null(LeastSquares.Of([1, double.NaN], [1, 2]));
        Assert.Null(LeastSquares.Of([1, 2], [1, double.PositiveInfinity]));
    }

    [Fact]
    public void WhereYDoesNotVaryNothingIsExplained() => Assert.Null(LeastSquares.Of([1, 2, 3], [4, 4, 4])!.RSquared);
}
