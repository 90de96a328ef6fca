using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>A person's days and findings, from what counts of their training. Pure.</summary>
public sealed record PersonSeries(IReadOnlyList<Day> Days, IReadOnlyList<Finding> Findings)
{
    /// <summary>From the first activity on.</summary>
    /// <param name="training">What counts, later dates than <paramref name="through"/> among it.</param>
    /// <param name="tests">The same of function tests.</param>
    /// <param name="through">Last date.</param>
    public static PersonSeries Of(
        Person person, Group group, IReadOnlyList<JoinedActivity> training, IReadOnlyList<DatedTest> tests, PersonPlan plan, LocalDate through) =>
        Continue(person, group, [], [.. training.Where(activity => activity.Date <= through)], tests, plan, through);

    /// <summary>The dates behind days that there are: the same as if all were computed at once.</summary>
    /// <param name="before">Unbroken days up to the one before, all or as many as look-backs need (<see cref="LoadCalendar.LookBackDays"/>); none: from the first activity on.</param>
    /// <param name="training">What counts of the dates to compute; that of the 7 days behind <paramref name="to"/> settles them.</param>
    /// <param name="tests">From the first date to compute on; with no days before, all.</param>
    /// <param name="plan">What is said of the dates to compute, and of the month before them.</param>
    /// <param name="to">Last date.</param>
    public static PersonSeries Continue(
        Person person,
        Group group,
        IReadOnlyList<Day> before,
        IReadOnlyList<JoinedActivity> training,
        IReadOnlyList<DatedTest> tests,
        PersonPlan plan,
        LocalDate to)
    {
        var last = before.Count == 0 ? null : before[^1];
        var past = before.SelectMany(day => day.Sessions.Select(session => session.On(day.Date))).ToList();
        var order = new LoadOrder(
            group.LoadQuantity, group.LoadFallbacks, [.. past.Concat(training).Select(Loads)], person.HeartRateIsValidOn, last?.Carried.Loads, last?.Date.PlusDays(1));
        var names = group.Limits.Quantities.Concat(group.LoadFallbacks).Append(group.LoadQuantity).Append(QuantityNames.FosterLoad).ToHashSet(StringComparer.Ordinal);
        var days = LoadCalendar.Continue(person.Id, before, [.. training.Select(activity => OnDay(activity, order, group.LoadQuantity, names))], to, plan);
        if (days.Count == 0)
        {
            return new PersonSeries([], []);
        }

        var all = before.Concat(days).ToList();
        var series = group.Limits.Quantities.ToDictionary(
            name => name, name => new QuantitySeries(name, LoadUnits.Of(name), By(name, person, all, last)), StringComparer.Ordinal);
        var memory = new RuleMemory(last?.Carried ?? Carried.Nothing);
        var findings = RuleBook.Evaluate(new RuleSubject(person, all, group.Limits)
        {
            From = days[0].Date,
            Memory = memory,
            LoadUnit = LoadUnits.Of(group.LoadQuantity),
            LoadQuantity = group.LoadQuantity,
            SessionLoads = all.SelectMany(day => day.Sessions).ToDictionary(session => session.Key, session => session.Load, StringComparer.Ordinal),
            Activities = [.. past, .. training.Where(activity => activity.Date <= to).OrderBy(activity => activity.Date).ThenBy(activity => activity.Key, StringComparer.Ordinal)],
            Plan = plan,
            Tests = [.. tests.Where(test => test.Date <= to)],
            Series = series,
        });
        return new PersonSeries([.. days.Select(day => day with { Carried = Carry(day, person, order, series, memory) })], findings);
    }

    private static SessionLoads Loads(JoinedActivity activity) => new(activity.Date, activity.Quantities);

    /// <summary>What a session of its sport cannot hold is none: a ride lifts no kilograms.</summary>
    private static ActivityOnDay OnDay(JoinedActivity activity, LoadOrder order, string quantity, HashSet<string> names)
    {
        var load = order.Choose(Loads(activity))?.Value ?? (QuantitySports.MayHold(quantity, activity.Sport) ? null : 0);
        return new ActivityOnDay(activity.Key, activity.Date, activity.Sources, load, activity.Stimulus, activity.AddsLoad)
        {
            Session = DaySession.Of(activity, load, names),
        };
    }

    private static IReadOnlyList<Day> By(string name, Person person, IReadOnlyList<Day> days, Day? last) => LoadCalendar.By(
        days,
        (day, session) => Value(name, person, day, session),
        last?.Carried.FirstCovered.TryGetValue(name, out var first) == true ? first : null);

    /// <summary>Of a quantity beside the load a session has what it has: nothing stands in for it.</summary>
    private static double? Value(string name, Person person, Day day, DaySession session)
    {
        var says = !QuantityNames.IsOfHeartRate(name) || person.HeartRateIsValidOn(day.Date);
        return says && session.Quantities.TryGetValue(name, out var value) ? value : QuantitySports.MayHold(name, Recordings.Sport.Parse(session.Sport)) ? null : 0;
    }

    private static Carried Carry(Day day, Person person, LoadOrder order, Dictionary<string, QuantitySeries> series, RuleMemory memory) => day.Carried with
    {
        FirstCovered = series.Values
            .Select(one => (one.Quantity, Ago: one.Days[Period.DaysBetween(one.Days[0].Date, day.Date)].DaysSinceFirstCovered))
            .Where(one => one.Ago.HasValue)
            .OrderBy(one => one.Quantity, StringComparer.Ordinal)
            .ToDictionary(one => one.Quantity, one => day.Date.PlusDays(-one.Ago!.Value), StringComparer.Ordinal),
        Loads = person.HeartRateInvalidFrom is null ? null : order.CarriedOn(day.Date),
        Runs = memory.On(day.Date),
    };
}
