using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>What tables add to the configuration for the computation of recordings: reference values, and the planned sessions that have a time.</summary>
/// <param name="anchors">Those of the configuration and of the tables.</param>
/// <param name="planned">Lines of the plan with start and end, by person.</param>
public sealed class TableBasis(AnchorBook anchors, ILookup<string, PlanEntry> planned)
{
    public AnchorBook Anchors => anchors;

    public static TableBasis Of(WorkingConfiguration configuration, StoreSession session) => new(
        configuration.Anchors.With(session.TableRows.OfKind(RowKind.Tests).Select(AnchorOf).OfType<Anchor>()),
        session.TableRows.OfKind(RowKind.Plan)
            .Where(row => IsTimed(row.Content))
            .SelectMany(row => Concerned(configuration, row).Select(person => (person, Entry: PersonPlans.Entry(row))))
            .ToLookup(pair => pair.person, pair => pair.Entry, StringComparer.Ordinal));

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
        .. planned[person.Id].SelectMany(entry => new[] { -1, 0, 1 }.Select(date.PlusDays).Where(entry.Covers).Select(day => IntervalOf(entry, day, person.Zone))),
    ];

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
}
