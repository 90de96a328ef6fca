// The usual week: the median of a person's ordinary weeks. A week is ordinary when enough of it is known, it holds some load and none of its days is set
// aside by plan or answers (light week, off-season, travel, absence, return). All a choice.
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Seven days in a row.</summary>
/// <param name="UpTo">Its last date.</param>
/// <param name="Load">Scaled to 7 known days; null where too few are known.</param>
/// <param name="IsSetAside">One of its days is (<see cref="PlanPhases.IsSetAside"/>).</param>
internal readonly record struct PastWeek(LocalDate UpTo, double? Load, bool IsSetAside)
{
    private const int Length = 7;

    public bool IsOrdinary => !IsSetAside && Load > 0;

    /// <summary>Set aside, or known to hold no load: a week that no other is compared with.</summary>
    public bool IsSkipped => IsSetAside || Load == 0;

    /// <summary>Weeks one before the other, the newest first, as many as the series holds.</summary>
    /// <param name="last">Index of the last day of the newest week.</param>
    /// <param name="coveredOf7">Known days that a week must have.</param>
    public static IEnumerable<PastWeek> Before(IReadOnlyList<Day> days, int last, int weeks, int coveredOf7) =>
        Ends(last, weeks).Select(index => EndingAt(days, index, coveredOf7));

    /// <summary>Indices of the last days of weeks one before the other, the newest first, as many as the series holds.</summary>
    /// <param name="last">Of the newest.</param>
    public static IEnumerable<int> Ends(int last, int weeks)
    {
        for (var index = last; index >= 0 && index > last - (weeks * Length); index -= Length)
        {
            yield return index;
        }
    }

    /// <param name="acute">Its load as the last of its days tells it.</param>
    /// <param name="isSetAside">One of its days is.</param>
    public static PastWeek EndingOn(LocalDate date, double? acute, double coverage7, bool isSetAside, int coveredOf7) =>
        new(date, Math.Round(coverage7 * Length) >= coveredOf7 ? acute : null, isSetAside);

    private static PastWeek EndingAt(IReadOnlyList<Day> days, int index, int coveredOf7)
    {
        var aside = false;
        for (var at = Math.Max(0, index - Length + 1); at <= index; at++)
        {
            aside = aside || days[at].Plan.IsSetAside();
        }

        return EndingOn(days[index].Date, days[index].Acute, days[index].Coverage7, aside, coveredOf7);
    }
}
