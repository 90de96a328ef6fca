using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Lays one person's activities out as unbroken dates with their trends. Pure: the order of the activities does not matter (I-5).</summary>
public static class LoadCalendar
{
    /// <summary>
    /// Every date from the first activity to <paramref name="through"/>, oldest first; empty without activities. Activities dated later
    /// are ignored. A day's own state may still be settled by recordings of the 7 days after it (I-6), and with it the values that rest
    /// on that state.
    /// </summary>
    /// <param name="plan">What plan and answers say of the person: rest that they state is known, and each day carries what holds on it. Null: nothing.</param>
    /// <exception cref="ArgumentException">A load is not finite.</exception>
    public static IReadOnlyList<Day> Build(string person, IReadOnlyList<ActivityOnDay> activities, LocalDate through, PersonPlan? plan = null)
    {
        var loads = new LoadTrend();
        var regions = BodyRegions.All.Select(region => new StimulusTrend(region)).ToList();
        return CalendarDates.Lay(activities, through, plan ?? PersonPlan.None)
            .Select(date => loads.Add(Bare(person, date)) with { Regions = Regions(regions, date) })
            .ToList();
    }

    private static Day Bare(string person, CalendarDate date) => new()
    {
        Person = person,
        Date = date.Date,
        State = date.State,
        StateSource = date.StateSource,
        Load = date.Load,
        DaysSinceRecorded = date.DaysSinceRecorded,
        Plan = date.Plan,
    };

    private static Dictionary<BodyRegion, RegionDay> Regions(List<StimulusTrend> trends, CalendarDate date) =>
        trends.ToDictionary(trend => trend.Region, trend => trend.Add(date));
}
