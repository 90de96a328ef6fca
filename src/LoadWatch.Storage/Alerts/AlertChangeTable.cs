using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Alerts;

/// <summary>
/// Table <c>alert_change</c>: appended to, never changed. Positions count through the changes of all alerts in the order of their commits.
/// </summary>
public sealed class AlertChangeTable
{
    private const string Columns = "alert, seq, position, date, from_state, to_state, reason, severity, text, evidence";

    private const string Insert = $"""
        INSERT INTO alert_change ({Columns})
        VALUES (
            @Alert, @Seq, (SELECT COALESCE(MAX(position), 0) + 1 FROM alert_change), @Date,
            @FromState, @ToState, @Reason, @Severity, @Text, @Evidence)
        """;

    private const string SelectOf = $"SELECT {Columns} FROM alert_change WHERE alert = @alertId ORDER BY seq";
    private const string SelectSince = $"SELECT {Columns} FROM alert_change WHERE position > @position ORDER BY position";
    private const string SelectReasonsSince = "SELECT alert, from_state, to_state, reason FROM alert_change WHERE position > @position ORDER BY position";
    private const string SelectNext = "SELECT COALESCE(MAX(seq), 0) + 1 FROM alert_change WHERE alert = @alertId";
    private const string SelectLastPosition = "SELECT COALESCE(MAX(position), 0) FROM alert_change";

    private readonly StoreSession session;

    internal AlertChangeTable(StoreSession session) => this.session = session;

    /// <summary>Appends a change of a stored alert; an error when its number is taken.</summary>
    public void Append(AlertChange change) => session.Execute(Insert, Row.From(change));

    /// <summary>The changes of an alert in their order.</summary>
    public IReadOnlyList<AlertChange> Of(string alertId) => session.Rows<Row>(SelectOf, new { alertId }).ConvertAll(row => row.ToChange());

    /// <summary>The number of an alert's next change, from 1.</summary>
    public int NextSequence(string alertId) => session.Value<int>(SelectNext, new { alertId });

    /// <summary>The changes of all alerts behind a position, in their order; from 0 on, all.</summary>
    public IReadOnlyList<AlertChange> Since(long position) => session.Rows<Row>(SelectSince, new { position }).ConvertAll(row => row.ToChange());

    /// <summary>Which alerts changed behind a position, and how, in the order of the changes; without what each rests on.</summary>
    public IReadOnlyList<(string AlertId, AlertState From, AlertState To, AlertChangeReason Reason)> ReasonsSince(long position) => session.Rows<Row>(SelectReasonsSince, new { position })
        .ConvertAll(row => (row.Alert, Words<AlertState>.Parse(row.FromState), Words<AlertState>.Parse(row.ToState), Words<AlertChangeReason>.Parse(row.Reason)));

    /// <summary>The position of the last change, 0 before any. A notice keeps it to know what it has told.</summary>
    public long LastPosition() => session.Value<long>(SelectLastPosition);

    private sealed class Row
    {
        public string Alert { get; init; } = "";

        public int Seq { get; init; }

        public LocalDate Date { get; init; }

        public string FromState { get; init; } = "";

        public string ToState { get; init; } = "";

        public string Reason { get; init; } = "";

        public string Severity { get; init; } = "";

        public string Text { get; init; } = "";

        public string? Evidence { get; init; }

        public static Row From(AlertChange change) => new()
        {
            Alert = change.AlertId,
            Seq = change.Sequence,
            Date = change.Date,
            FromState = Words<AlertState>.Of(change.From),
            ToState = Words<AlertState>.Of(change.To),
            Reason = Words<AlertChangeReason>.Of(change.Reason),
            Severity = Words<Severity>.Of(change.Severity),
            Text = change.Text,
            Evidence = change.Evidence is { } evidence ? JsonText.Write(evidence) : null,
        };

        public AlertChange ToChange() => new(
            Alert,
            Seq,
            Date,
            Words<AlertState>.Parse(FromState),
            Words<AlertState>.Parse(ToState),
            Words<AlertChangeReason>.Parse(Reason),
            Words<Severity>.Parse(Severity),
            Text,
            Evidence is { } text ? JsonText.Read<Evidence>(text) : null);
    }
}
