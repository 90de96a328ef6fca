using LoadWatch.Anchors;
using LoadWatch.People;
using LoadWatch.Stimulus;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Anchors;

/// <summary>Table <c>anchor_observed</c>: reference values from people's own sessions, by the month from which on they hold. Derived.</summary>
public sealed class ObservedAnchorTable
{
    private const string Columns = "person, kind, sport, exercise, machine, holds_from, value, error, shown_on, basis";

    private const string Insert =
        $"INSERT INTO anchor_observed ({Columns}) VALUES (@Person, @Kind, @Sport, @Exercise, @Machine, @HoldsFrom, @Value, @Error, @ShownOn, @Basis)";

    private const string Delete = "DELETE FROM anchor_observed WHERE person = @person AND holds_from >= @from";

    private const string Select = $"""
        SELECT {Columns} FROM anchor_observed WHERE person = @person AND (kind <> 'power_max' OR holds_from >= @since)
        ORDER BY holds_from, kind, sport, exercise, machine
        """;

    private readonly StoreSession session;

    internal ObservedAnchorTable(StoreSession session) => this.session = session;

    /// <summary>A person's, sorted by month.</summary>
    /// <param name="first">
    /// Only those that bear on dates from this one on: a maximal power is adopted month by month and counts for <see cref="PowerCapacity.RecentDays"/> after it was
    /// shown, the others are few and count until the next. Null: all.
    /// </param>
    public IReadOnlyList<ObservedAnchor> OfPerson(string person, LocalDate? first = null) =>
        session.Rows<Row>(Select, new { person, since = first?.PlusDays(-PowerCapacity.RecentDays) ?? LocalDate.MinIsoValue }).ConvertAll(row => row.ToAnchor());

    /// <summary>Stores a person's in place of all from a month on.</summary>
    public void Replace(string person, LocalDate from, IReadOnlyList<ObservedAnchor> anchors)
    {
        session.Execute(Delete, new { person, from });
        session.ExecuteEach(Insert, anchors.Select(Row.From));
    }

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public string Kind { get; init; } = "";

        public string Sport { get; init; } = "";

        public string Exercise { get; init; } = "";

        public string Machine { get; init; } = "";

        public LocalDate HoldsFrom { get; init; }

        public double Value { get; init; }

        public double Error { get; init; }

        public LocalDate ShownOn { get; init; }

        public string Basis { get; init; } = "";

        public static Row From(ObservedAnchor anchor) => new()
        {
            Person = anchor.Person,
            Kind = AnchorKinds.Of(anchor.Kind).Name,
            Sport = anchor.Sport ?? "",
            Exercise = anchor.Exercise ?? "",
            Machine = anchor.Machine ?? "",
            HoldsFrom = anchor.From,
            Value = anchor.Value,
            Error = anchor.Error,
            ShownOn = anchor.ShownOn,
            Basis = anchor.Basis,
        };

        public ObservedAnchor ToAnchor() => new(Person, AnchorKinds.All.First(info => info.Name == Kind).Kind, HoldsFrom, Value, Error, ShownOn, Basis)
        {
            Sport = Sport.Length == 0 ? null : Sport,
            Exercise = Exercise.Length == 0 ? null : Exercise,
            Machine = Machine.Length == 0 ? null : Machine,
        };
    }
}
