using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Decisions;

/// <summary>Table <c>decision</c>: appended to, never changed. Of several about one subject the latest is in force.</summary>
public sealed class DecisionTable
{
    private const string Columns = "id, made, kind, person, alert, detail";
    private const string Insert = $"INSERT INTO decision ({Columns}) VALUES (@Id, @Made, @Kind, @Person, @Alert, @Detail)";
    private const string SelectAll = $"SELECT {Columns} FROM decision";
    private const string SelectOfAlert = $"SELECT {Columns} FROM decision WHERE alert = @alertId";
    private const string SelectAssigned = $"SELECT {Columns} FROM decision WHERE kind = 'assign'";

    private readonly StoreSession session;

    internal DecisionTable(StoreSession session) => this.session = session;

    /// <summary>Appends a decision; an error when there is one of the same kind and subject at the very same moment.</summary>
    public void Add(Decision decision) => session.Execute(Insert, Row.From(decision));

    /// <summary>Every decision in the order of their moments.</summary>
    public IReadOnlyList<Decision> All() => Select(SelectAll);

    /// <summary>Decisions about an alert in the order of their moments.</summary>
    public IReadOnlyList<Decision> OfAlert(string alertId) => Select(SelectOfAlert, new { alertId });

    /// <summary>Decisions about an arrival in the order of their moments: the last one names its owner.</summary>
    public IReadOnlyList<Decision> OfArrival(string sha) => Select(SelectAssigned).FindAll(decision => decision.Subject == sha);

    /// <summary>The decision in force for each arrival that has one, by SHA-256.</summary>
    public IReadOnlyDictionary<string, Decision> Assigned() => Select(SelectAssigned)
        .GroupBy(decision => decision.Subject, StringComparer.Ordinal)
        .ToDictionary(same => same.Key, same => same.Last(), StringComparer.Ordinal);

    private List<Decision> Select(string sql, object? values = null) =>
    [
        .. session.Rows<Row>(sql, values)
            .Select(row => row.ToDecision())
            .OrderBy(decision => decision.Made)
            .ThenBy(decision => decision.Id, StringComparer.Ordinal),
    ];

    private sealed class Row
    {
        public string Id { get; init; } = "";

        public Instant Made { get; init; }

        public string Kind { get; init; } = "";

        public string Person { get; init; } = "";

        public string? Alert { get; init; }

        public string Detail { get; init; } = "";

        public static Row From(Decision decision)
        {
            var isOfAlert = decision.Kind == DecisionKind.Acknowledge;
            return new Row
            {
                Id = decision.Id,
                Made = decision.Made,
                Kind = Words<DecisionKind>.Of(decision.Kind),
                Person = decision.Person,
                Alert = isOfAlert ? decision.Subject : null,
                Detail = JsonText.Write(new DetailText(isOfAlert ? null : decision.Subject, decision.By, decision.Note)),
            };
        }

        public Decision ToDecision()
        {
            var detail = JsonText.Read<DetailText>(Detail);
            var subject = Alert ?? detail.Arrival ?? throw new InvalidDataException($"decision {Id} is about nothing");
            return new Decision(Words<DecisionKind>.Parse(Kind), subject, Person, Made, detail.By, detail.Note);
        }
    }

    private sealed record DetailText(string? Arrival, string? By, string? Note);
}
