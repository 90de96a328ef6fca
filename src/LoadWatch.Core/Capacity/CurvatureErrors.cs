namespace LoadWatch.Capacity;

/// <summary>Standard errors of the parameters of a least-squares fit: the roots of the diagonal of s^2 (J'J)^-1, s^2 = squares left / (n - p). Textbook.</summary>
internal static class CurvatureErrors
{
    /// <summary>In the order of the parameters; null where there are no more points than parameters, or the derivatives depend on each other.</summary>
    /// <param name="derivatives">J: of each point by each parameter.</param>
    public static double[]? Of(IReadOnlyList<double[]> derivatives, IReadOnlyList<double> residuals)
    {
        var (points, parameters) = (derivatives.Count, derivatives[0].Length);
        if (points <= parameters || Inverse(Normal(derivatives, parameters)) is not { } inverse)
        {
            return null;
        }

        var variance = residuals.Sum(residual => residual * residual) / (points - parameters);
        double[] errors = [.. Enumerable.Range(0, parameters).Select(at => Math.Sqrt(variance * inverse[at][at]))];
        return Array.TrueForAll(errors, double.IsFinite) ? errors : null;
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
