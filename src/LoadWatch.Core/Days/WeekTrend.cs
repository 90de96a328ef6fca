using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>One person's weeks against those before them. Takes every date in order, oldest first.</summary>
internal sealed class WeekTrend
{
    private const int WeekDays = 7;
    internal const int KnownOf7 = 5;

    /// <summary>The usual rests on so many weeks, at the most and at the least, out of those looked back at. A choice.</summary>
    internal const int UsualWeeks = 8;
    internal const int WeeksWanted = 6;
    internal const int LookBackWeeks = 16;

    /// <summary>Of each date the 7 days that end with it.</summary>
    private readonly List<PastWeek> weeks = [];

    /// <summary>Those that the newest is compared with, the newest first.</summary>
    private readonly List<PastWeek> before = new(LookBackWeeks);
    private int lastSetAside = -WeekDays;

    /// <param name="acute">Load of the 7 days that end with the date.</param>
    /// <param name="coverage7">Share of them with known load.</param>
    /// <returns>The usual week and the change against the last ordinary one, fraction; each null where it is not known.</returns>
    public (double? Usual, double? Change) Add(LocalDate date, double? acute, double coverage7, DayPlan plan)
    {
        Learn(date, acute, coverage7, plan);
        LookBack();
        return (UsualWeek.Of(before, UsualWeeks, WeeksWanted)?.Load, WeekChange.Of(weeks[^1].Load, before)?.Fraction);
    }

    /// <summary>A day before the first date.</summary>
    public void Learn(Day day) => Learn(day.Date, day.Acute, day.Coverage7, day.Plan);

    private void Learn(LocalDate date, double? acute, double coverage7, DayPlan plan)
    {
        lastSetAside = plan.IsSetAside() ? weeks.Count : lastSetAside;
        weeks.Add(PastWeek.EndingOn(date, acute, coverage7, weeks.Count - lastSetAside < WeekDays, KnownOf7));
    }

    private void LookBack()
    {
        before.Clear();
        for (var index = weeks.Count - 1 - WeekDays; index >= 0 && index >= weeks.Count - 1 - (WeekDays * LookBackWeeks); index -= WeekDays)
        {
            before.Add(weeks[index]);
        }
    }
}
