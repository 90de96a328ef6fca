namespace LoadWatch.Capacity;

/// <summary>
/// How sure the parameters of a least-squares fit are, and what is computed from them: the covariance is s^2 (J'J)^-1 with the derivatives J and s^2 = squares left / (n - p).
/// A standard error is the root of its diagonal; that of a function of the parameters with the gradient g is sqrt(g' C g) (the delta method). Textbook.
/// </summary>
internal sealed class ParameterCovariance
{
    private readonly double[][] covariance;

    private ParameterCovariance(double[][] covariance) => this.covariance = covariance;

    /// <summary>Null where there are no more points than parameters, or the derivatives depend on each other.</summary>
    /// <param name="derivatives">J: of each point by each parameter.</param>
    public static ParameterCovariance? Of(IReadOnlyList<double[]> derivatives, IReadOnlyList<double> residuals)
    {
        var (points, parameters) = (derivatives.Count, derivatives[0].Length);
        if (points <= parameters || Inverse(Normal(derivatives, parameters)) is not { } inverse)
        {
            return null;
        }

        var variance = residuals.Sum(residual => residual * residual) / (points - parameters);
        double[][] values = [.. inverse.Select(row => row.Select(value => variance * value).ToArray())];
        return Enumerable.Range(0, parameters).All(at => double.IsFinite(Math.Sqrt(values[at][at]))) ? new ParameterCovariance(values) : null;
    }

    /// <summary>Standard error of a parameter.</summary>
    public double Error(int parameter) => Math.Sqrt(covariance[parameter][parameter]);

    /// <summary>Standard error of a function of the parameters.</summary>
    /// <param name="gradient">Its derivative by each parameter.</param>
    public double ErrorOf(IReadOnlyList<double> gradient)
    {
        var variance = covariance.Select((row, one) => row.Select((value, other) => gradient[one] * value * gradient[other]).Sum()).Sum();
        return Math.Sqrt(Math.Max(variance, 0));
    }

    private static double[][] Normal(IReadOnlyList<double[]> derivatives, int parameters) =>
    [
        .. Enumerable.Range(0, parameters).Select(row => Enumerable.Range(0, parameters).Select(column => derivatives.Sum(of => of[row] * of[column])).ToArray()),
    ];

    /// <summary>By elimination, of a symmetric matrix scaled to a diagonal of 1, since the parameters differ by powers of ten.</summary>
    private static double[][]? Inverse(double[][] matrix)
    {
        var size = matrix.Length;
        var scale = Enumerable.Range(0, size).Select(at => Math.Sqrt(matrix[at][at])).ToArray();
        var rows = Enumerable.Range(0, size)
            .Select(row => Enumerable.Range(0, 2 * size).Select(column => column < size ? matrix[row][column] / (scale[row] * scale[column]) : column - size == row ? 1.0 : 0.0).ToArray())
            .ToArray();
        for (var pivot = 0; pivot < size; pivot++)
        {
            if (!(Math.Abs(rows[pivot][pivot]) > 1e-12))
            {
                return null;
            }

            Eliminate(rows, pivot);
        }

        return [.. rows.Select((row, at) => row[size..].Select((value, column) => value / (scale[at] * scale[column])).ToArray())];
    }

    private static void Eliminate(double[][] rows, int pivot)
    {
        var divisor = rows[pivot][pivot];
        rows[pivot] = [.. rows[pivot].Select(value => value / divisor)];
        for (var row = 0; row < rows.Length; row++)
        {
            var factor = row == pivot ? 0 : rows[row][pivot];
            rows[row] = [.. rows[row].Select((value, column) => value - (factor * rows[pivot][column]))];
        }
    }
}
