using System.Collections.Concurrent;
using LoadWatch.Anchors;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// What tables and own sessions add to the configuration for the computation of recordings: reference values, and the planned sessions that have a time. Reads what is asked for,
/// of the person and the dates, and keeps it; safe to use from several threads where its source is.
/// </summary>
public sealed class TableBasis
{
    private readonly WorkingConfiguration configuration;
    private readonly Action<Action<StoreSession>> read;
    private readonly ConcurrentDictionary<string, PersonAnchors> anchors = new(StringComparer.Ordinal);
    private readonly ConcurrentDictionary<(string Person, LocalDate Month), IReadOnlyList<PlanEntry>> planned;

    private TableBasis(
        WorkingConfiguration configuration, Action<Action<StoreSession>> read, ConcurrentDictionary<(string Person, LocalDate Month), IReadOnlyList<PlanEntry>>? planned = null)
    {
        this.configuration = configuration;
        this.read = read;
        this.planned = planned ?? new();
    }

    /// <summary>The configuration alone.</summary>
    public static TableBasis Of(WorkingConfiguration configuration) => new(configuration, _ => { });

    /// <summary>As the rows are when they are asked for first.</summary>
    public static TableBasis Of(WorkingConfiguration configuration, Store store) => new(configuration, work => store.Read(session =>
    {
        work(session);
        return true;
    }));

    /// <summary>Within one transaction, and not beyond it.</summary>
    public static TableBasis Of(WorkingConfiguration configuration, StoreSession session) => new(configuration, work => work(session));

    /// <summary>A person's reference values, of the configuration, of the tables and from own sessions.</summary>
    /// <param name="first">What is asked for are dates from this one on; null: any.</param>
    public AnchorBook AnchorsOf(Person person, LocalDate? first = null) => Known(person, first).Book;

    /// <summary>Those from own sessions alone, sorted by month.</summary>
    /// <inheritdoc cref="AnchorsOf"/>
    public IReadOnlyList<ObservedAnchor> ObservedOf(Person person, LocalDate? first = null) => Known(person, first).Observed;

    /// <summary>Who is asked for earlier dates as well is read once more, and then whole.</summary>
    private PersonAnchors Known(Person person, LocalDate? first)
    {
        if (anchors.TryGetValue(person.Id, out var known) && (known.First is null || known.First <= first))
        {
            return known;
        }

        var from = known is null ? first : null;
        return anchors[person.Id] = Of(person, from, Read(session => session.ObservedAnchors.OfPerson(person.Id, from)));
    }

    private PersonAnchors Of(Person person, LocalDate? first, IReadOnlyList<ObservedAnchor> observed)
    {
        var stated = StatedOf(person);
        return new PersonAnchors(first, observed, observed.Count == 0 ? stated : stated.OfPerson(person.Id).With(observed.Select(one => one.ToAnchor())));
    }

    /// <summary>The same with other values from own sessions of some people.</summary>
    /// <param name="observed">All of a person, by id.</param>
    public TableBasis With(IReadOnlyDictionary<string, IReadOnlyList<ObservedAnchor>> observed)
    {
        var other = new TableBasis(configuration, read, planned);
        foreach (var (person, known) in anchors.Where(one => !observed.ContainsKey(one.Key)))
        {
            other.anchors[person] = known;
        }

        foreach (var (person, own) in observed)
        {
            other.anchors[person] = Of(configuration.People[person], first: null, own);
        }

        return other;
    }

    /// <summary>Those of the configuration and of the tables alone.</summary>
    public AnchorBook StatedOf(Person person)
    {
        var measured = Read(session => session.TableRows.StandingOf(person.Id, RowKind.Tests)).Select(AnchorOf).OfType<Anchor>().ToList();
        return measured.Count == 0 ? configuration.Anchors : configuration.Anchors.OfPerson(person.Id).With(measured);
    }

    /// <summary>Whether recordings are computed differently by such a row.</summary>
    public static bool Matters(StoredRow row) => IsTimed(row.Content) || AnchorOf(row) is not null;

    /// <summary>Ids of the people whom a row is about.</summary>
    public static IEnumerable<string> Concerned(WorkingConfiguration configuration, StoredRow row) => row switch
    {
        { Person: { } person } => [person],
        { Kind: RowKind.Plan, Subject: "" } => configuration.People.Values.Select(person => person.Id),
        { Kind: RowKind.Plan } => (configuration.Subjects.Of(row) ?? []).Select(person => person.Id),
        _ => [],
    };

    /// <summary>Start and end of the person's planned sessions of a date and its neighbours: a recording may run past midnight.</summary>
    public IReadOnlyList<Interval> Planned(Person person, LocalDate date) =>
    [
        .. TimedIn(person, date.PlusDays(1 - date.Day)).SelectMany(entry => new[] { -1, 0, 1 }.Select(date.PlusDays).Where(entry.Covers).Select(day => IntervalOf(entry, day, person.Zone))),
    ];

    /// <summary>Lines of the plan with start and end that speak for a date of a month or for one next to it.</summary>
    private IReadOnlyList<PlanEntry> TimedIn(Person person, LocalDate month) => planned.GetOrAdd((person.Id, month), _ =>
    [
        .. Read(session => session.TableRows.Plan(person.Id, configuration.Subjects.Means(person), month.PlusDays(-1), month.PlusMonths(1)))
            .Where(row => IsTimed(row.Content))
            .Select(PersonPlans.Entry),
    ]);

    private IReadOnlyList<T> Read<T>(Func<StoreSession, IReadOnlyList<T>> work)
    {
        IReadOnlyList<T> rows = [];
        read(session => rows = work(session));
        return rows;
    }

    private static Interval IntervalOf(PlanEntry entry, LocalDate date, DateTimeZone zone)
    {
        var (start, end) = (entry.Start!.Value, entry.End!.Value);
        var last = end > start ? date : date.PlusDays(1);
        return new Interval((date + start).InZoneLeniently(zone).ToInstant(), (last + end).InZoneLeniently(zone).ToInstant());
    }

    private static bool IsTimed(RowContent content) => content is PlanRow { Start: not null, End: not null };

    /// <summary>The anchor that a row of tests states, measured on its date; null where it is a function test, nobody's, or out of the anchor's range.</summary>
    private static Anchor? AnchorOf(StoredRow row) => row is { Person: { } person, Content: TestRow { Value: { } value, Outcome: null } test }
        && AnchorKinds.All.FirstOrDefault(kind => kind.Name == test.Test) is { } kind
        && (test.Unit is null || test.Unit == kind.Unit)
        && value >= kind.Lowest && value <= kind.Highest
        && (kind.Kind == AnchorKind.OneRepetitionMax) == (test.Exercise is not null)
            ? new Anchor(person, row.Date, kind.Kind, value, AnchorSource.Measured, test.Exercise, Machine: test.Machine)
            : null;

    /// <param name="First">Holds for dates from this one on; null: for any.</param>
    private sealed record PersonAnchors(LocalDate? First, IReadOnlyList<ObservedAnchor> Observed, AnchorBook Book);
}
