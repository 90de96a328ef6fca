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

    /// <summary>Before the month of a line, from which its pairs come. A choice.</summary>
    public const int Months = 12;

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
        return within.Length < FewestPairs || Line(within) is not { StandardError: { } error, Slope: > 0 } line
            ? null
            : new ConversionLine(
                wanted, from, Significant.Round(line.Intercept), Significant.Round(line.Slope), Significant.Round(error), within.Length, since, before);
    }

    internal static LocalDate FirstOfMonth(LocalDate date) => date.PlusDays(1 - date.Day);

    private static LeastSquares? Line(ReadOnlySpan<LoadPairs.Pair> pairs)
    {
        var (x, y) = (new double[pairs.Length], new double[pairs.Length]);
        for (var at = 0; at < pairs.Length; at++)
        {
            (x[at], y[at]) = (pairs[at].X, pairs[at].Y);
        }

        return LeastSquares.Of(x, y);
    }
}
