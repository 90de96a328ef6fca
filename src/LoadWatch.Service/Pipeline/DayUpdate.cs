using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Activities;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>Brings the days and findings of everybody up to the last date that is over in their zone (I-14).</summary>
public sealed class DayUpdate(WorkingConfiguration configuration, Store store, Instant now, SweepReport report)
{
    /// <summary>A later recording settles up to seven earlier days (I-6).</summary>
    private const int SettlingDays = 7;

    private const int PeopleInOneCommit = 50;

    /// <summary>Dates through which people are computed, by person, where it is not the last date that is over for them.</summary>
    public IReadOnlyDictionary<string, LocalDate> Through { get; init; } = new Dictionary<string, LocalDate>();

    public void Run(CancellationToken cancel)
    {
        var behind = store.Read(session =>
        {
            var dirty = session.People.Dirty().ToDictionary(item => item.Person, item => item.From, StringComparer.Ordinal);
            return configuration.People.Values
                .OrderBy(person => person.Id, StringComparer.Ordinal)
                .Select(person => (person, From: RecomputeFrom(session, person, dirty)))
                .Where(item => item.From is not null)
                .ToList();
        });
        foreach (var group in behind.Chunk(PeopleInOneCommit))
        {
            cancel.ThrowIfCancellationRequested();
            var computed = group.AsParallel().AsOrdered().Select(item => Compute(item.person, item.From!.Value)).ToList();
            store.Write(session => computed.ForEach(series => series.Write(session)));
            report.PeopleComputed += computed.Count;
            report.Advanced();
        }
    }

    /// <summary>The last date that is over for the person: the one that rules and alerts look at.</summary>
    public static LocalDate LastDateOver(Person person, Instant now) => now.InZone(person.Zone).Date.PlusDays(-1);

    private LocalDate ThroughOf(Person person) => Through.TryGetValue(person.Id, out var date) ? date : LastDateOver(person, now);

    private LocalDate? RecomputeFrom(StoreSession session, Person person, Dictionary<string, LocalDate> dirty)
    {
        var asked = dirty.TryGetValue(person.Id, out var date) ? date : (LocalDate?)null;
        var missing = session.People.ComputedTo(person.Id) is { } done && done < ThroughOf(person) ? done.PlusDays(1) : (LocalDate?)null;
        var from = asked is { } early && missing is { } next ? LocalDate.Min(early, next) : asked ?? missing;
        return from?.PlusDays(-SettlingDays);
    }

    private ComputedSeries Compute(Person person, LocalDate from)
    {
        var group = configuration.Groups[person.Group];
        var through = ThroughOf(person);
        var activities = store.Read(session => session.Activities.OfPerson(person.Id)).Select(activity => OnDay(activity, group)).ToList();
        var days = LoadCalendar.Build(person.Id, activities, through);
        var findings = RuleBook.Evaluate(new RuleSubject(person, days, group.Limits) { LoadUnit = LoadUnits.Of(group.LoadQuantity), LoadQuantity = group.LoadQuantity });
        return new ComputedSeries(
            person.Id,
            from,
            through,
            days.Where(day => day.Date >= from).ToList(),
            findings.Where(finding => finding.Date >= from).ToList());
    }

    private static ActivityOnDay OnDay(StoredActivity activity, Group group) => new(
        activity.Winner.Key,
        activity.Winner.Date,
        [activity.Winner.Source],
        activity.Values.Quantities.FirstOrDefault(quantity => quantity.Name == group.LoadQuantity)?.Value,
        activity.Values.Stimulus);

    private sealed record ComputedSeries(
        string Person, LocalDate From, LocalDate Through, IReadOnlyList<Day> Days, IReadOnlyList<Finding> Findings)
    {
        public void Write(StoreSession session)
        {
            session.Days.Replace(Person, From, Days);
            session.Findings.Replace(Person, From, Findings);
            session.People.Computed(Person, Through);
        }
    }
}
