using LoadWatch.Plans;

namespace LoadWatch.Days;

/// <summary>One person's weeks against those before them. Takes every date in order, with its load trends, oldest first.</summary>
internal sealed class WeekTrend
{
    private const int WeekDays = 7;
    private const int KnownOf7 = 5;

    /// <summary>The usual rests on so many weeks, at the most and at the least, out of those looked back at. A choice.</summary>
    private const int UsualWeeks = 8;
    private const int WeeksWanted = 6;
    private const int LookBackWeeks = 16;

    /// <summary>Of each date the 7 days that end with it.</summary>
    private readonly List<PastWeek> weeks = [];
    private int lastSetAside = -WeekDays;

    public Day Add(Day day)
    {
        Learn(day);
        var change = WeekChange.Of(weeks[^1].Load, Before());
        return day with { UsualWeek = UsualWeek.Of(Before(), UsualWeeks, WeeksWanted)?.Load, WeeklyChangeOrdinary = change?.Fraction };
    }

    /// <summary>A day before the first date.</summary>
    public void Learn(Day day)
    {
        lastSetAside = day.Plan.IsSetAside() ? weeks.Count : lastSetAside;
        weeks.Add(PastWeek.EndingWith(day, weeks.Count - lastSetAside < WeekDays, KnownOf7));
    }

    private IEnumerable<PastWeek> Before()
    {
        for (var index = weeks.Count - 1 - WeekDays; index >= 0 && index >= weeks.Count - 1 - (WeekDays * LookBackWeeks); index -= WeekDays)
        {
            yield return weeks[index];
        }
    }
}
