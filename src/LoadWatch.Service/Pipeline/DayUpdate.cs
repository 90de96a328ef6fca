using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.People;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Brings the days and findings of everybody up to the last date that is over in their zone (I-14). It costs what is new, not what there is: who is not behind is
/// not looked at, and of who is, only the dates from the first that changed on are computed.
/// </summary>
public sealed class DayUpdate(WorkingConfiguration configuration, Store store, Instant now, SweepReport report)
{
    private const int PeopleInOneCommit = 20;

    /// <summary>Dates through which people are computed, by person, where it is not the last date that is over for them.</summary>
    public IReadOnlyDictionary<string, LocalDate> Through { get; init; } = new Dictionary<string, LocalDate>();

    /// <param name="last">Written in the commit of the last people, or in one of its own where nobody's days are computed: every commit waits for the disk.</param>
    public void Run(CancellationToken cancel, Action<StoreSession>? last = null)
    {
        var basis = TableBasis.Of(configuration, store);
        var groups = Behind(basis).Chunk(PeopleInOneCommit).ToList();
        foreach (var group in groups)
        {
            Compute(group, group == groups[^1] ? last : null, cancel);
            report.PeopleComputed += group.Length;
        }

        if (groups.Count == 0 && last is not null)
        {
            store.Write(last);
        }
    }

    /// <summary>The last date that is over for the person: the one that rules and alerts look at.</summary>
    public static LocalDate LastDateOver(Person person, Instant now) => PersonDay.LastOver(now, person);

    private void Compute(IReadOnlyList<DayRun> group, Action<StoreSession>? last, CancellationToken cancel)
    {
        while (group.Any(run => !run.IsDone))
        {
            cancel.ThrowIfCancellationRequested();
            var stretches = group.Where(run => !run.IsDone).ToList().AsParallel().AsOrdered().Select(run => store.Read(run.Next)).ToList();
            store.Write(session =>
            {
                stretches.ForEach(stretch => stretch.Write(session));
                if (group.All(run => run.IsDone))
                {
                    last?.Invoke(session);
                }
            });
            report.Advanced();
        }
    }

    private LocalDate ThroughOf(Person person) => Through.TryGetValue(person.Id, out var date) ? date : LastDateOver(person, now);

    private List<DayRun> Behind(TableBasis basis)
    {
        var people = configuration.People.Values.ToDictionary(person => person.Id, StringComparer.Ordinal);
        if (people.Count == 0)
        {
            return [];
        }

        var latest = people.Values.Max(ThroughOf);
        return
        [
            .. store.Read(session => session.People.Behind(latest))
                .Where(behind => people.ContainsKey(behind.Person))
                .Select(behind => (Behind: behind, Person: people[behind.Person], From: From(behind, ThroughOf(people[behind.Person]))))
                .Where(item => item.From is not null)
                .Select(item => new DayRun(configuration, basis, item.Person, item.From!.Value, ThroughOf(item.Person), item.Behind.Marks)),
        ];
    }

    /// <summary>A later recording settles up to seven earlier days (I-6).</summary>
    private static LocalDate? From(PersonBehind behind, LocalDate through)
    {
        var missing = behind.ComputedTo < through ? behind.ComputedTo.Value.PlusDays(1) : (LocalDate?)null;
        var from = behind.DirtyFrom is { } asked && missing is { } next ? LocalDate.Min(asked, next) : behind.DirtyFrom ?? missing;
        return from?.PlusDays(-LoadCalendar.SettledDaysBack);
    }
}
