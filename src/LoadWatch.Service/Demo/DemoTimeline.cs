using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>
/// Which sessions a part holds, date by date. Dates of the plots count back from the last date, weekdays are those of the calendar. Heavy leg work ends with
/// the last of a usual week's days of it, so that it is told as one gap and not as few days before that.
/// </summary>
internal static class DemoTimeline
{
    /// <summary>Length of the demo, days.</summary>
    public const int Days = 84;

    /// <summary>First date of the illness, days back.</summary>
    public const int IllFrom = 12;

    /// <summary>The day of the return, days back.</summary>
    public const int IllUntil = 5;

    /// <summary>First date of the absence that was told, days back.</summary>
    public const int AwayFrom = 10;

    /// <summary>The row across the lake, days back.</summary>
    public const int LongRow = 2;

    /// <summary>Planned days off before and after it, days back: the week as a whole stays an ordinary one on most seeds.</summary>
    public static readonly IReadOnlyList<int> OffAroundTheLongRow = [4, 3, 1];

    /// <summary>Nobody misses a session so near the end, days back.</summary>
    private const int UnbrokenDays = 42;

    private const double MissedShare = 0.06;

    /// <param name="until">The morning of the brief; the sessions end the day before.</param>
    public static IEnumerable<PlannedSession> Of(DemoPart part, int seed, LocalDate until)
    {
        for (var back = Days; back >= 1; back--)
        {
            var date = until.PlusDays(-back);
            foreach (var slot in Slots(part, date, back, until).Where(slot => !IsMissed(part, seed, date + slot.At, back)))
                yield return new PlannedSession(date, slot, HeartRateSeen: part.Plot != DemoPlot.StrapFailed || back > 21);
        }
    }

    private static IEnumerable<WeekSlot> Slots(DemoPart part, LocalDate date, int back, LocalDate until)
    {
        if (part.Group == DemoCast.Boat && date == DemoCalendar.DayOff(until))
            return [];

        var usual = part.Week.On(date.DayOfWeek);
        return part.Plot switch
        {
            DemoPlot.RampUp when back <= 7 => WeekPlan.TwoRowsADay.Where(slot => slot.Day == date.DayOfWeek),
            DemoPlot.EasyOnly when date > DemoCalendar.LatestBefore(until, 17, IsoDayOfWeek.Tuesday) =>
                usual.Where(slot => slot.Kind != SessionKind.Gym).Select(slot => slot with { Kind = SessionKind.Row }),
            DemoPlot.Ill when back is <= IllFrom and > IllUntil => [],
            DemoPlot.Ill when back <= IllUntil => usual.Select(slot => slot with { Minutes = slot.Minutes * 2 / 3 }),
            DemoPlot.AwayAsTold when back <= AwayFrom => [],
            DemoPlot.LongRow when OffAroundTheLongRow.Contains(back) => [],
            DemoPlot.LongRow when back == LongRow => [WeekPlan.RowAcrossTheLake(date.DayOfWeek)],
            DemoPlot.SilentThirteenDays when back <= 13 => [],
            DemoPlot.SilentTwoWeeks when back <= 14 => [],
            DemoPlot.ArmsForWeeks when date > DemoCalendar.LatestBefore(until, 25, IsoDayOfWeek.Saturday) => usual.Select(slot => slot with { Kind = SessionKind.ClassArms }),
            DemoPlot.ArmsForDays when date > DemoCalendar.LatestBefore(until, 13, IsoDayOfWeek.Saturday) => usual.Select(slot => slot with { Kind = SessionKind.ClassArms }),
            _ when part.Group == DemoCast.Boat && DemoCalendar.IsInCamp(date, until) => usual.Select(slot => slot with { Minutes = slot.Minutes * 6 / 5 }),
            _ => usual,
        };
    }

    private static bool IsMissed(DemoPart part, int seed, LocalDateTime start, int back) =>
        back > UnbrokenDays && back < Days - 7 && DemoRandom.For(seed, "missed " + part.Id, start).Between(0, 1) < MissedShare;
}
