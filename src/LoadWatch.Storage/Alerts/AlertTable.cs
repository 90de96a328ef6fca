using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Storage.Dialects;
using LoadWatch.Storage.Findings;
using NodaTime;

namespace LoadWatch.Storage.Alerts;

/// <summary>Tables <c>alert</c> and <c>alert_change</c>: where each alert stands, and every step of how it came there.</summary>
public sealed class AlertTable
{
    private const string Columns = "id, person, rule, about, raised, judged, state, severity, text, shelved_until, watch, limits_hash, stands_since";

    private const string Upsert = $"""
        INSERT INTO alert ({Columns})
        VALUES (@Id, @Person, @Rule, @About, @Raised, @Judged, @State, @Severity, @Text, @ShelvedUntil, @Watch, @LimitsHash, @StandsSince)
        ON CONFLICT (id) DO UPDATE SET
            judged = excluded.judged, state = excluded.state, severity = excluded.severity, text = excluded.text, shelved_until = excluded.shelved_until,
            watch = excluded.watch, limits_hash = excluded.limits_hash, stands_since = excluded.stands_since
        """;

    private const string SelectOpen = $"SELECT {Columns} FROM alert WHERE person = @person AND state <> 'normal' ORDER BY id";
    private const string SelectAllOpen = $"SELECT {Columns} FROM alert WHERE state <> 'normal' ORDER BY id";
    private const string SelectOfPerson = $"SELECT {Columns} FROM alert WHERE person = @person ORDER BY id";
    private const string SelectAll = $"SELECT {Columns} FROM alert ORDER BY id";
    private const string SelectOne = $"SELECT {Columns} FROM alert WHERE id = @id";

    private readonly StoreSession session;

    internal AlertTable(StoreSession session)
    {
        this.session = session;
        Changes = new AlertChangeTable(session);
    }

    /// <summary>The history of all alerts.</summary>
    public AlertChangeTable Changes { get; }

    /// <summary>A person's alerts that are not normal, sorted by id.</summary>
    public IReadOnlyList<Alert> Open(string person) => Select(SelectOpen, new { person });

    /// <summary>Everybody's alerts that are not normal, sorted by id.</summary>
    public IReadOnlyList<Alert> Open() => Select(SelectAllOpen);

    /// <summary>Every alert, of one person or of all, sorted by id.</summary>
    public IReadOnlyList<Alert> All(string? person = null) => person is null ? Select(SelectAll) : Select(SelectOfPerson, new { person });

    public Alert? Get(string id) => session.Row<Row>(SelectOne, new { id })?.ToAlert();

    /// <summary>Stores an alert in place of the one of the same id.</summary>
    public void Put(Alert alert) => session.Execute(Upsert, Row.From(alert));

    private List<Alert> Select(string sql, object? values = null) => session.Rows<Row>(sql, values).ConvertAll(row => row.ToAlert());

    private sealed class Row
    {
        public string Id { get; init; } = "";

        public string Person { get; init; } = "";

        public string Rule { get; init; } = "";

        public string About { get; init; } = "";

        public LocalDate Raised { get; init; }

        public LocalDate Judged { get; init; }

        public string State { get; init; } = "";

        public string Severity { get; init; } = "";

        public string Text { get; init; } = "";

        public LocalDate? ShelvedUntil { get; init; }

        public string Watch { get; init; } = "";

        public string? LimitsHash { get; init; }

        public LocalDate StandsSince { get; init; }

        public static Row From(Alert alert) => new()
        {
            Id = alert.Id,
            Person = alert.Key.Person,
            Rule = alert.Key.Rule,
            About = AboutWord.Of(alert.Key.Region, alert.Key.Quantity),
            Raised = alert.Raised,
            Judged = alert.Judged,
            State = Words<AlertState>.Of(alert.State),
            Severity = Words<Severity>.Of(alert.Severity),
            Text = alert.Text,
            ShelvedUntil = alert.ShelvedUntil,
            Watch = Words<AlertWatch>.Of(alert.Watch),
            LimitsHash = alert.LimitsHash,
            StandsSince = alert.StandsSince,
        };

        public Alert ToAlert() => new(
            new FindingKey(Person, Rule, AboutWord.Region(About), AboutWord.Quantity(About)),
            Raised,
            Judged,
            Words<AlertState>.Parse(State),
            Words<Severity>.Parse(Severity),
            Text)
        {
            ShelvedUntil = ShelvedUntil,
            Watch = Words<AlertWatch>.Parse(Watch),
            LimitsHash = LimitsHash,
            StandsSince = StandsSince,
        };
    }
}
