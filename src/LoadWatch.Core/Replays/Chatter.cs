// After ANSI/ISA-18.2, where chatter is three cycles in a minute; here three changes between active and over in 7 days: a choice.
using LoadWatch.Alerts;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Replays;

/// <summary>Counts alerts that waver.</summary>
public static class Chatter
{
    public const int Days = 7;
    public const int ChangesWanted = 3;

    /// <summary>
    /// Runs of three changes within 7 days between active and over of what one alert is about. What plan, answers or limits ended did not waver: something else was wanted.
    /// </summary>
    /// <param name="changes">In order.</param>
    /// <param name="keyOf">What an alert is about, by its id.</param>
    public static int Of(IEnumerable<AlertChange> changes, Func<string, FindingKey> keyOf) => changes
        .Where(change => AlertLife.IsActive(change.From) != AlertLife.IsActive(change.To))
        .Where(change => change.Reason is not (AlertChangeReason.SuppressedByPlan or AlertChangeReason.RuleSwitchedOff or AlertChangeReason.LimitsChanged))
        .GroupBy(change => keyOf(change.AlertId))
        .Sum(key => Crowded([.. key.Select(change => change.Date)]));

    private static int Crowded(List<LocalDate> changes) =>
        Enumerable.Range(0, Math.Max(0, changes.Count - ChangesWanted + 1)).Count(at => Period.DaysBetween(changes[at], changes[at + ChangesWanted - 1]) < Days);
}
