using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>A person's days and findings, from what counts of their training. Pure.</summary>
public sealed record PersonSeries(IReadOnlyList<Day> Days, IReadOnlyList<Finding> Findings)
{
    /// <summary>From the first activity on.</summary>
    /// <param name="training">What counts, later dates than <paramref name="through"/> among it.</param>
    /// <param name="tests">The same of function tests.</param>
    /// <param name="through">Last date.</param>
    /// <param name="changes">Null: no reference value ever changes.</param>
    /// <param name="bestMeans">As <see cref="RuleSubject.BestMeans"/>; null: of no session.</param>
    public static PersonSeries Of(
        Person person,
        Group group,
        IReadOnlyList<JoinedActivity> training,
        IReadOnlyList<DatedTest> tests,
        PersonPlan plan,
        LocalDate through,
        ReferenceChanges? changes = null,
        IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>>? bestMeans = null) =>
        Continue(person, group, [], [.. training.Where(activity => activity.Date <= through)], tests, plan, through, changes, bestMeans);

    /// <summary>The dates behind days that there are: the same as if all were computed at once.</summary>
    /// <param name="before">
    /// Unbroken days up to the one before, all or as many as look-backs need (<see cref="LoadCalendar.LookBackDays"/>, or from <see cref="Loads.ReferencePeriods.Reach"/>
    /// on where that is earlier); none: from the first activity on.
    /// </param>
    /// <param name="training">What counts of the dates to compute; that of the 7 days behind <paramref name="to"/> settles them.</param>
    /// <param name="tests">From the first date to compute on; with no days before, all.</param>
    /// <param name="plan">What is said of the dates to compute, and of the month before them.</param>
    /// <param name="to">Last date.</param>
    /// <param name="changes">Null: no reference value ever changes.</param>
    /// <param name="bestMeans">As <see cref="RuleSubject.BestMeans"/>; null: of no session.</param>
    public static PersonSeries Continue(
        Person person,
        Group group,
        IReadOnlyList<Day> before,
        IReadOnlyList<JoinedActivity> training,
        IReadOnlyList<DatedTest> tests,
        PersonPlan plan,
        LocalDate to,
        ReferenceChanges? changes = null,
        IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>>? bestMeans = null)
    {
        var first = before.Count > 0 ? before[^1].Date.PlusDays(1) : training.Min(activity => (LocalDate?)activity.Date);
        if (first is not { } from || from > to)
        {
            return new PersonSeries([], []);
        }

        var stretch = new SeriesStretch(person, group, plan, changes) { BestMeans = bestMeans ?? RuleSubject.NoBestMeans };
        var (all, findings) = (before.ToList(), new List<Finding>());
        foreach (var next in (changes?.Periods.Cuts(from, to) ?? []).Append(to.PlusDays(1)))
        {
            var computed = stretch.Of(
                all, [.. training.Where(activity => activity.Date >= from)], [.. tests.Where(test => from == first || test.Date >= from)], from, next.PlusDays(-1));
            all.AddRange(computed.Days);
            findings.AddRange(computed.Findings);
            from = next;
        }

        return new PersonSeries(all[before.Count..], findings);
    }
}
