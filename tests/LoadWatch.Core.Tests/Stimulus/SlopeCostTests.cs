namespace LoadWatch.Stimulus;

/// <summary>Minetti et al. 2002, J Appl Physiol 93:1039-1046: costs as measured, J/kg/m, and the polynomials computed independently.</summary>
public class SlopeCostTests
{
    [Theory]
    [InlineData(-0.45, 3.92, 4.032)]
    [InlineData(-0.40, 3.49, 3.610)]
    [InlineData(-0.35, 2.81, 3.031)]
    [InlineData(-0.30, 2.43, 2.462)]
    [InlineData(-0.20, 1.73, 1.800)]
    [InlineData(-0.10, 1.93, 2.152)]
    [InlineData(0, 3.40, 3.600)]
    [InlineData(0.10, 5.77, 5.968)]
    [InlineData(0.20, 8.92, 9.007)]
    [InlineData(0.30, 12.52, 12.579)]
    [InlineData(0.35, 14.43, 14.600)]
    [InlineData(0.40, 16.83, 16.850)]
    [InlineData(0.45, 18.93, 19.426)]
    public void RunningCostsWhatWasMeasured(double gradient, double measured, double polynomial)
    {
        var cost = SlopeCost.Running(gradient);

        Assert.Equal(polynomial, cost, 5.1e-4);
        Assert.Equal(measured, cost, measured * (gradient >= 0.1 ? 0.04 : 0.12));
    }

    /// <summary>Between -0.2 and level the polynomial is known not to follow what was measured (1.30, 0.81, 1.64), so nothing is asked of it there.</summary>
    [Theory]
    [InlineData(-0.45, 3.46, 3.605)]
    [InlineData(-0.40, 3.23, 3.504)]
    [InlineData(-0.35, 2.65, 2.936)]
    [InlineData(-0.30, 2.18, 2.208)]
    [InlineData(-0.20, null, 1.087)]
    [InlineData(-0.10, null, 1.127)]
    [InlineData(0, null, 2.500)]
    [InlineData(0.10, 4.68, 4.899)]
    [InlineData(0.20, 8.07, 7.877)]
    [InlineData(0.30, 11.29, 11.184)]
    [InlineData(0.35, 12.72, 13.017)]
    [InlineData(0.40, 14.75, 15.098)]
    [InlineData(0.45, 17.33, 17.600)]
    public void WalkingCostsWhatWasMeasuredOnSteepGround(double gradient, double? measured, double polynomial)
    {
        var cost = SlopeCost.Walking(gradient);

        Assert.Equal(polynomial, cost, 5.1e-4);
        Assert.Equal(measured ?? cost, cost, 0.12 * cost);
    }

    [Theory]
    [InlineData(0.6, 0.45)]
    [InlineData(-2, -0.45)]
    public void SteeperThanWasMeasuredReadsAsTheSteepest(double gradient, double steepest) =>
        Assert.Equal(SlopeCost.Running(steepest), SlopeCost.Running(gradient));

    /// <summary>By hand: 5.968 / 3.6, 4.899 / 2.5.</summary>
    [Fact]
    public void TheRatioIsAgainstTheLevel()
    {
        Assert.Equal((1.0, 1.0), (SlopeCost.Ratio(0, walking: false), SlopeCost.Ratio(0, walking: true)));
        Assert.Equal(1.658, SlopeCost.Ratio(0.1, walking: false), 5e-4);
        Assert.Equal(1.960, SlopeCost.Ratio(0.1, walking: true), 5e-4);
    }
}
