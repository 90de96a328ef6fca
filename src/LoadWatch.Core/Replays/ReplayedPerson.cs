using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;

namespace LoadWatch.Replays;

/// <summary>One person's stored past.</summary>
/// <param name="Group">With the limits in force today.</param>
/// <param name="Days">Unbroken, oldest first, with their sessions.</param>
/// <param name="Tests">By date.</param>
public sealed record ReplayedPerson(Person Person, Group Group, IReadOnlyList<Day> Days, PersonPlan Plan, IReadOnlyList<DatedTest> Tests)
{
    /// <summary>As <see cref="RuleSubject.BestMeans"/>, of all sessions.</summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> BestMeans { get; init; } = RuleSubject.NoBestMeans;

    /// <summary>
    /// The findings of every day by some limits. Days are taken as they are stored: a changed reference value is not looked across, and a quantity that today's
    /// limits do not name was not kept, so that it is unknown.
    /// </summary>
    public IReadOnlyList<Finding> Findings(RuleLimits limits) => RuleBook.Evaluate(new RuleSubject(Person, Days, limits)
    {
        LoadUnit = LoadUnits.Of(Group.LoadQuantity),
        LoadQuantity = Group.LoadQuantity,
        Deviation = Group.Deviation,
        SessionLoads = Days.SelectMany(day => day.Sessions).ToDictionary(session => session.Key, session => session.Load, StringComparer.Ordinal),
        Activities = [.. Days.SelectMany(day => day.Sessions.Select(session => session.On(day.Date)))],
        Plan = Plan,
        Tests = Tests,
        BestMeans = BestMeans,
        Series = limits.Quantities.ToDictionary(name => name, name => new QuantitySeries(name, LoadUnits.Of(name), By(name)), StringComparer.Ordinal),
    });

    private IReadOnlyList<Day> By(string name) => LoadCalendar.By(Days, (day, session) => Value(name, day, session), firstCovered: null, Group.Deviation);

    private double? Value(string name, Day day, DaySession session)
    {
        var says = !QuantityNames.IsOfHeartRate(name) || Person.HeartRateIsValidOn(day.Date);
        return says && session.Quantities.TryGetValue(name, out var value) ? value : QuantitySports.MayHold(name, Sport.Parse(session.Sport)) ? null : 0;
    }
}
