namespace LoadWatch;

/// <summary>
/// The straight line y = a + b x through points by ordinary least squares (textbook; no source needed), with means x', y' and n points.
/// b = Sxy / Sxx, a = y' - b x', s = sqrt(sum of (y - a - b x)^2 / (n - 2)), error of b = s / sqrt(Sxx), error of a = s sqrt(1/n + x'^2 / Sxx),
/// R2 = 1 - sum of (y - a - b x)^2 / Syy.
/// </summary>
/// <param name="Intercept">a, in the unit of y.</param>
/// <param name="Slope">b, units of y per unit of x.</param>
/// <param name="StandardError">s, of the estimate; null with two points, which leave nothing over.</param>
/// <param name="InterceptError">Standard error of a; null likewise.</param>
/// <param name="SlopeError">Standard error of b; null likewise.</param>
/// <param name="RSquared">0 to 1; null where y does not vary.</param>
public sealed record LeastSquares(double Intercept, double Slope, double? StandardError, double? InterceptError, double? SlopeError, double? RSquared)
{
    /// <summary>Null with fewer than two points, where x does not vary, and where a number would not be finite.</summary>
    /// <exception cref="ArgumentException">As many x as y are wanted.</exception>
    public static LeastSquares? Of(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        if (SlopeOf(x, y) is not { } slope)
        {
            return null;
        }

        var (meanX, meanY) = (Mean(x), Mean(y));
        var intercept = meanY - (slope * meanX);
        var (residuals, sxx, syy) = (0.0, 0.0, 0.0);
        for (var at = 0; at < x.Length; at++)
        {
            var residual = y[at] - intercept - (slope * x[at]);
            residuals += residual * residual;
            sxx += (x[at] - meanX) * (x[at] - meanX);
            syy += (y[at] - meanY) * (y[at] - meanY);
        }

        var error = x.Length > 2 ? Math.Sqrt(residuals / (x.Length - 2)) : (double?)null;
        var interceptError = error * Math.Sqrt((1.0 / x.Length) + (meanX * meanX / sxx));
        return double.IsFinite(intercept) && double.IsFinite(interceptError ?? 0)
            ? new LeastSquares(intercept, slope, error, interceptError, error / Math.Sqrt(sxx), syy > 0 ? 1 - (residuals / syy) : null)
            : null;
    }

    /// <summary>b alone; null with fewer than two points, where x does not vary, and where it would not be finite.</summary>
    /// <inheritdoc cref="Of"/>
    public static double? SlopeOf(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        if (x.Length != y.Length)
        {
            throw new ArgumentException($"{y.Length} y for {x.Length} x", nameof(y));
        }

        var (meanX, meanY, sxx, sxy) = (Mean(x), Mean(y), 0.0, 0.0);
        for (var at = 0; at < x.Length; at++)
        {
            sxx += (x[at] - meanX) * (x[at] - meanX);
            sxy += (x[at] - meanX) * (y[at] - meanY);
        }

        var slope = sxy / sxx;
        return Varies(x) && double.IsFinite(slope) ? slope : null;
    }

    private static double Mean(ReadOnlySpan<double> values)
    {
        var sum = 0.0;
        foreach (var value in values)
        {
            sum += value;
        }

        return sum / values.Length;
    }

    /// <summary>Asked of the values themselves: a mean of equal values may differ from them in its last digit.</summary>
    private static bool Varies(ReadOnlySpan<double> values)
    {
        foreach (var value in values)
        {
            if (value > values[0] || value < values[0])
            {
                return true;
            }
        }

        return false;
    }
}
