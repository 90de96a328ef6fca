// A week of which sessions are missing, scaled to its sessions: sum x sessions / known ones. Scaled to its known days instead it would come out too small, for the days that
// are missing are those on which something was to be done. Sessions: the days with training, or those on which the plan expects a recording where these are more: a match
// played a day later is one session and not two. A choice, no published source.
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Seven days in a row by their sessions.</summary>
/// <param name="UpTo">Its last date.</param>
/// <param name="Load">As if every session of it were known; null where too few days are.</param>
/// <param name="Known">What of it is.</param>
/// <param name="IsSetAside">One of its days is (<see cref="PlanPhases.IsSetAside"/>).</param>
internal readonly record struct TrainingWeek(LocalDate UpTo, double? Load, KnownWeek Known, bool IsSetAside)
{
    private const int Length = 7;

    /// <summary>Weeks one before the other, the newest first, as many as the series holds.</summary>
    /// <param name="last">Index of the last day of the newest week.</param>
    /// <param name="coveredOf7">Known days that a week must have.</param>
    public static IEnumerable<TrainingWeek> Before(IReadOnlyList<Day> days, int last, int weeks, int coveredOf7) =>
        PastWeek.Ends(last, weeks).Select(index => EndingAt(days, index, coveredOf7));

    /// <summary>Days with a known load above 0, count.</summary>
    public int Trained => Known.Trained;

    /// <summary>Whether a plan tells of a recording to come on one of its days.</summary>
    public bool IsPlanned => Known.IsPlanned;

    /// <summary>The week as one to compare with.</summary>
    public PastWeek Past => new(UpTo, Load, IsSetAside);

    private static TrainingWeek EndingAt(IReadOnlyList<Day> days, int index, int coveredOf7)
    {
        var (sum, known, trained, unread, expected, aside) = (0.0, 0, 0, 0, 0, false);
        for (var at = Math.Max(0, index - Length + 1); at <= index; at++)
        {
            var day = days[at];
            sum += day.Load ?? 0;
            known += day.Load is null ? 0 : 1;
            trained += day.Load > 0 ? 1 : 0;
            unread += day.Load is null && day.State == DayState.Recorded ? 1 : 0;
            expected += day.Plan.Expected > 0 ? 1 : 0;
            aside |= day.Plan.IsSetAside();
        }

        var week = new KnownWeek(Significant.Round(sum), known, trained, Math.Max(trained + unread, expected), expected > 0);
        var load = known < coveredOf7 ? null : week.Whole;
        return new TrainingWeek(days[index].Date, load is { } whole ? Significant.Round(whole) : null, week, aside);
    }
}
