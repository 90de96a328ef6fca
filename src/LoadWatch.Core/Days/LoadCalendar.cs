using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Lays one person's activities out as unbroken dates with their trends. Pure: the order of the activities does not matter (I-5).</summary>
public static class LoadCalendar
{
    /// <summary>Raised when days or findings come out otherwise of the same sessions: then everybody's are computed anew, and nothing is decoded.</summary>
    public const int Version = 6;

    /// <summary>No value and no rule looks further back than this; what would is carried (<see cref="Carried"/>). Days.</summary>
    public const int LookBackDays = 400;

    /// <summary>A recording settles the state of this many days before it (I-6). Days.</summary>
    public const int SettledDaysBack = 7;

    /// <summary>
    /// Every date from the first activity to <paramref name="through"/>, oldest first; empty without activities. Activities dated later
    /// are ignored. A day's own state may still be settled by recordings of the 7 days after it (I-6), and with it the values that rest
    /// on that state.
    /// </summary>
    /// <param name="plan">What plan and answers say of the person: rest that they state is known, and each day carries what holds on it. Null: nothing.</param>
    /// <exception cref="ArgumentException">A load is not finite.</exception>
    public static IReadOnlyList<Day> Build(string person, IReadOnlyList<ActivityOnDay> activities, LocalDate through, PersonPlan? plan = null) =>
        Continue(person, [], [.. activities.Where(activity => activity.Date <= through)], through, plan ?? PersonPlan.None);

    /// <summary>The dates behind those that there are, up to <paramref name="to"/>: the same as if all were laid out at once.</summary>
    /// <param name="before">Unbroken days up to the one before: all of them, or the last <see cref="LookBackDays"/>; none: it begins with the first activity.</param>
    /// <param name="activities">Of the dates to lay out; those of the 7 days behind <paramref name="to"/> settle them.</param>
    /// <param name="deviation">Of monotony.</param>
    public static IReadOnlyList<Day> Continue(
        string person,
        IReadOnlyList<Day> before,
        IReadOnlyList<ActivityOnDay> activities,
        LocalDate to,
        PersonPlan plan,
        LoadDeviation deviation = LoadDeviation.Sample)
    {
        var loads = LoadTrend.After(before, deviation);
        var sessions = SessionTrend.After(before);
        var regions = BodyRegions.All.Select(region => StimulusTrend.After(region, before)).ToList();
        return CalendarDates.Lay(before.Count == 0 ? null : before[^1], activities, to, plan)
            .Select(date => loads.Add(Bare(person, date, sessions, regions)))
            .ToList();
    }

    /// <summary>The same days by another quantity. Of a stretch that began earlier the trends of the first 28 are not to be used.</summary>
    /// <param name="load">What a session of a day has of it, or null.</param>
    /// <param name="firstCovered">The first date with a known value, where that is known already.</param>
    /// <param name="deviation">Of monotony.</param>
    public static IReadOnlyList<Day> By(
        IReadOnlyList<Day> days, Func<Day, DaySession, double?> load, LocalDate? firstCovered, LoadDeviation deviation = LoadDeviation.Sample)
    {
        var trend = new LoadTrend(deviation, firstCovered);
        return [.. days.Select(day => trend.Add(day with
        {
            LoadError = null,
            Load = DayLoad.Of(day.State, [.. day.Sessions.Where(session => session.AddsLoad).Select(session => load(day, session))]),
        }))];
    }

    private static Day Bare(string person, CalendarDate date, SessionTrend trend, List<StimulusTrend> regions)
    {
        IReadOnlyList<DaySession> sessions = date.Activities.Count == 0 ? [] : [.. date.Activities.Select(activity => activity.Session).OfType<DaySession>()];
        var (largest, longestRun) = trend.Add(sessions);
        return new Day
        {
            Person = person,
            Date = date.Date,
            State = date.State,
            StateSource = date.StateSource,
            Load = date.Load,
            LoadError = date.LoadError,
            DaysSinceRecorded = date.DaysSinceRecorded,
            Plan = date.Plan,
            Sessions = sessions,
            LargestSession30 = largest,
            LongestRunMetres30 = longestRun,
            Regions = Regions(regions, date),
            Carried = new Carried { Sources = date.Sources },
        };
    }

    private static Dictionary<BodyRegion, RegionDay> Regions(List<StimulusTrend> trends, CalendarDate date)
    {
        var regions = new Dictionary<BodyRegion, RegionDay>(trends.Count);
        foreach (var trend in trends)
        {
            regions[trend.Region] = trend.Add(date);
        }

        return regions;
    }
}
