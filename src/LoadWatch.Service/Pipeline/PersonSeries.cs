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
    /// <param name="training">What counts, later dates than <paramref name="through"/> among it.</param>
    /// <param name="tests">The same of function tests.</param>
    /// <param name="through">Last date.</param>
    public static PersonSeries Of(
        Person person, Group group, IReadOnlyList<JoinedActivity> training, IReadOnlyList<DatedTest> tests, PersonPlan plan, LocalDate through)
    {
        var activities = training.Where(activity => activity.Date <= through).ToList();
        var counted = Counted(person, group.LoadQuantity, group.LoadFallbacks, activities);
        var days = LoadCalendar.Build(person.Id, counted, through, plan);
        var findings = RuleBook.Evaluate(new RuleSubject(person, days, group.Limits)
        {
            LoadUnit = LoadUnits.Of(group.LoadQuantity),
            LoadQuantity = group.LoadQuantity,
            SessionLoads = counted.ToDictionary(activity => activity.Key, activity => activity.Load, StringComparer.Ordinal),
            Activities = activities,
            Plan = plan,
            Tests = [.. tests.Where(test => test.Date <= through)],
            Series = group.Limits.Quantities.ToDictionary(
                name => name,
                name => new QuantitySeries(name, LoadUnits.Of(name), LoadCalendar.Build(person.Id, Counted(person, name, [], activities), through, plan)),
                StringComparer.Ordinal),
        });
        return new PersonSeries(days, findings);
    }

    /// <summary>Each session with the load that counts for its day.</summary>
    private static List<ActivityOnDay> Counted(Person person, string quantity, IReadOnlyList<string> fallbacks, List<JoinedActivity> activities)
    {
        var order = new LoadOrder(quantity, fallbacks, activities.ConvertAll(Loads), person.HeartRateIsValidOn);
        return activities.ConvertAll(activity => OnDay(activity, order, quantity));
    }

    private static SessionLoads Loads(JoinedActivity activity) => new(activity.Date, activity.Quantities);

    /// <summary>What a session of its sport cannot hold is none: a ride lifts no kilograms.</summary>
    private static ActivityOnDay OnDay(JoinedActivity activity, LoadOrder order, string quantity)
    {
        var load = order.Choose(Loads(activity))?.Value ?? (QuantitySports.MayHold(quantity, activity.Sport) ? null : 0);
        return new ActivityOnDay(activity.Key, activity.Date, activity.Sources, load, activity.Stimulus, activity.AddsLoad);
    }
}
