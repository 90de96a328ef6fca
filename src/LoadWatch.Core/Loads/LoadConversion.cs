using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// Converts a load that a session lacks from another one that it has, by the person's own sessions that have both. That different methods rank
/// sessions of one person alike is common practice to assume; the 10 pairs and the 12 months are choices.
/// The line of a calendar month is fixed from the 12 months before it, so a value uses nothing dated later than itself (I-5).
/// </summary>
public static class LoadConversion
{
    /// <summary>With fewer sessions that have both there is no line. A choice.</summary>
    public const int FewestPairs = 10;

    private const int Months = 12;

    /// <summary>
    /// The line for the month of <paramref name="date"/>, or null: too few pairs, x that does not vary, or y that does not rise with x.
    /// </summary>
    /// <param name="sessions">Of one person, in any order.</param>
    /// <param name="wanted">Name of the quantity to be had.</param>
    /// <param name="from">Name of the quantity that it is converted from.</param>
    public static ConversionLine? For(IReadOnlyList<SessionLoads> sessions, LocalDate date, string wanted, string from) =>
        For(new LoadPairs(sessions, wanted, from), date, wanted, from);

    internal static ConversionLine? For(LoadPairs pairs, LocalDate date, string wanted, string from)
    {
        var before = FirstOfMonth(date);
        var since = before.PlusMonths(-Months);
        var within = pairs.Between(since, before);
        if (within.Length < FewestPairs || LeastSquares(within) is not var (intercept, slope, standardError))
        {
            return null;
        }

        return new ConversionLine(wanted, from, intercept, slope, standardError, within.Length, since, before);
    }

    internal static LocalDate FirstOfMonth(LocalDate date) => date.PlusDays(1 - date.Day);

    private static (double Intercept, double Slope, double StandardError)? LeastSquares(ReadOnlySpan<LoadPairs.Pair> pairs)
    {
        var (meanX, meanY) = Means(pairs);
        var (sxx, sxy) = (0.0, 0.0);
        foreach (var (_, x, y) in pairs)
        {
            sxx += (x - meanX) * (x - meanX);
            sxy += (x - meanX) * (y - meanY);
        }

        var slope = sxy / sxx;
        var intercept = meanY - (slope * meanX);
        if (!Varies(pairs) || !(slope > 0) || !double.IsFinite(intercept))
        {
            return null;
        }

        var standardError = StandardError(pairs, intercept, slope);
        return double.IsFinite(standardError)
            ? (Significant.Round(intercept), Significant.Round(slope), Significant.Round(standardError))
            : null;
    }

    private static (double X, double Y) Means(ReadOnlySpan<LoadPairs.Pair> pairs)
    {
        var (x, y) = (0.0, 0.0);
        foreach (var pair in pairs)
        {
            (x, y) = (x + pair.X, y + pair.Y);
        }

        return (x / pairs.Length, y / pairs.Length);
    }

    /// <summary>Asked of the values themselves: a mean of equal values may differ from them in its last digit.</summary>
    private static bool Varies(ReadOnlySpan<LoadPairs.Pair> pairs)
    {
        foreach (var pair in pairs)
        {
            if (pair.X > pairs[0].X || pair.X < pairs[0].X)
            {
                return true;
            }
        }

        return false;
    }

    private static double StandardError(ReadOnlySpan<LoadPairs.Pair> pairs, double intercept, double slope)
    {
        var squares = 0.0;
        foreach (var (_, x, y) in pairs)
        {
            var residual = y - intercept - (slope * x);
            squares += residual * residual;
        }

        return Math.Sqrt(squares / (pairs.Length - 2));
    }
}
