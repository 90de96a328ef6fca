using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

/// <summary>Days, sessions and plans for the rules of load; day 0 is Monday, 5 January 2026.</summary>
internal static class Planned
{
    public static IEnumerable<double> Same(double load, int count) => Enumerable.Repeat(load, count);

    /// <summary>A recorded activity every day, then unknown days; null is an activity whose load could not be computed.</summary>
    public static IReadOnlyList<Day> DaysOf(IEnumerable<double?> loads, PersonPlan? plan = null, int unknownTail = 0)
    {
        var activities = loads.Select((load, day) => Activity(day, load)).ToArray();
        return LoadCalendar.Build("anna", activities, On(activities.Length - 1 + unknownTail), plan);
    }

    public static IReadOnlyList<Day> DaysOf(IEnumerable<double> loads, PersonPlan? plan = null, int unknownTail = 0) =>
        DaysOf(loads.Select(load => (double?)load), plan, unknownTail);

    public static PersonPlan Phase(PlanWord word, int from, int until) => new() { Entries = [Entry(word, from, until)] };

    public static PersonPlan Matches(params int[] days) => new() { Entries = [.. days.Select(day => Entry(PlanWord.Match, day, day))] };

    public static PersonPlan Absent(int from, int until) => new() { Absences = [new Absence(AbsenceWord.Ill, On(from), On(until))], Entries = [] };

    public static PlanEntry Entry(PlanWord word, int from, int until) => new(word, On(from), On(until), null, null, false, null);

    public static JoinedActivity Run(int day, double metres, double? load = null) => Session(day, "running", load) with
    {
        Quantities = [.. Session(day, "running", load).Quantities, new Quantity(QuantityNames.Distance, metres, "m", false)],
    };

    public static JoinedActivity Ride(int day, double? load) => Session(day, "cycling", load);

    /// <summary>The days of sessions, each with the load that it has.</summary>
    public static RuleSubject Subject(int through, IEnumerable<JoinedActivity> sessions, PersonPlan? plan = null)
    {
        var sorted = sessions.OrderBy(session => session.Date).ToList();
        var days = LoadCalendar.Build(
            "anna",
            sorted.Select((session, place) => new ActivityOnDay($"{place}", session.Date, ["watch"], session[QuantityNames.BanisterTrimp], [])).ToList(),
            On(through),
            plan);
        return new RuleSubject(Anna, days, Watched.Stated) { Activities = sorted };
    }

    private static JoinedActivity Session(int day, string sport, double? load) => new()
    {
        Key = $"{sport}{day}",
        Date = On(day),
        Sport = new Sport(sport),
        Sources = ["watch"],
        Quantities = load is { } known ? [new Quantity(QuantityNames.BanisterTrimp, known, "AU", false)] : [],
    };
}
