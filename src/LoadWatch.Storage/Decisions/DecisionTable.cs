using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Decisions;

/// <summary>
/// Table <c>decision</c>: appended to, never changed. Of several about one subject the latest is in force; one that was withdrawn never is.
/// </summary>
public sealed class DecisionTable
{
    private const string Columns = "id, made, kind, person, alert, detail";
    private const string Insert = $"INSERT INTO decision ({Columns}, about_from) VALUES (@Id, @Made, @Kind, @Person, @Alert, @Detail, @AboutFrom)";
    private const string SelectAll = $"SELECT {Columns} FROM decision";
    private const string SelectOfAlert = $"SELECT {Columns} FROM decision WHERE alert = @alertId OR kind = 'withdraw'";
    private const string SelectOfPerson = $"SELECT {Columns} FROM decision WHERE person = @person";
    private const string SelectOfDates = $"""
        {SelectOfPerson} AND (
            kind IN ('ill', 'injured', 'away', 'returning', 'withdraw')
            OR kind IN ('rest', 'match') AND about_from >= @from AND about_from <= @to)
        """;

    private const string SelectAssigned = $"SELECT {Columns} FROM decision WHERE kind IN ('assign', 'withdraw')";

    private readonly StoreSession session;

    internal DecisionTable(StoreSession session) => this.session = session;

    /// <summary>Appends a decision; an error when there is one of the same kind, subject and row at the very same moment.</summary>
    public void Add(Decision decision) => session.Execute(Insert, Row.From(decision));

    /// <summary>Every decision in the order of their moments; of one moment in the order of their first dates, withdrawals last.</summary>
    public IReadOnlyList<Decision> All() => Select(SelectAll);

    /// <summary>All that are in force by themselves, neither withdrawn nor a withdrawal; sorted as above.</summary>
    public IReadOnlyList<Decision> InForce() => InForce(Select(SelectAll));

    /// <summary>Those of a person in force; sorted as above.</summary>
    public IReadOnlyList<Decision> InForce(string person) => InForce(OfPerson(person));

    /// <summary>Those in force about a person's dates: every absence and return, since an open one may go on, and rest and matches that begin in the range; sorted as above.</summary>
    public IReadOnlyList<Decision> OfDates(string person, LocalDate from, LocalDate to) => InForce(Select(SelectOfDates, new { person, from, to }));

    /// <summary>Every decision about a person's alerts, dates and arrivals, withdrawals too; sorted as above.</summary>
    public IReadOnlyList<Decision> OfPerson(string person) => Select(SelectOfPerson, new { person });

    /// <summary>Decisions about an alert, withdrawals too; sorted as above.</summary>
    public IReadOnlyList<Decision> OfAlert(string alertId) =>
        About(Select(SelectOfAlert, new { alertId }), decision => decision.Kind is DecisionKind.Acknowledge or DecisionKind.Shelve);

    /// <summary>Decisions about an arrival, withdrawals too, in the order of their moments: the last one in force names its owner.</summary>
    public IReadOnlyList<Decision> OfArrival(string sha) =>
        About(Select(SelectAssigned), decision => decision.Kind == DecisionKind.Assign && decision.Subject == sha);

    /// <summary>The decision in force for each arrival that has one, by SHA-256.</summary>
    public IReadOnlyDictionary<string, Decision> Assigned() => InForce(Select(SelectAssigned))
        .GroupBy(decision => decision.Subject, StringComparer.Ordinal)
        .ToDictionary(same => same.Key, same => same.Last(), StringComparer.Ordinal);

    /// <summary>The arrivals whose every assignment was withdrawn, by SHA-256, with the last of them.</summary>
    public IReadOnlyDictionary<string, Decision> AssignedNoMore()
    {
        var all = Select(SelectAssigned);
        var held = InForce(all).Select(decision => decision.Subject).ToHashSet(StringComparer.Ordinal);
        return all.Where(decision => decision.Kind == DecisionKind.Assign && !held.Contains(decision.Subject))
            .GroupBy(decision => decision.Subject, StringComparer.Ordinal)
            .ToDictionary(same => same.Key, same => same.Last(), StringComparer.Ordinal);
    }

    /// <summary>Those neither withdrawn nor a withdrawal, of decisions with their withdrawals.</summary>
    public static IReadOnlyList<Decision> InForce(IReadOnlyList<Decision> decisions)
    {
        var withdrawn = decisions.Where(decision => decision.Kind == DecisionKind.Withdraw).Select(decision => decision.Subject).ToHashSet(StringComparer.Ordinal);
        return [.. decisions.Where(decision => decision.Kind != DecisionKind.Withdraw && !withdrawn.Contains(decision.Id))];
    }

    private static List<Decision> About(List<Decision> decisions, Func<Decision, bool> isMeant)
    {
        var own = decisions.Where(isMeant).Select(decision => decision.Id).ToHashSet(StringComparer.Ordinal);
        return decisions.FindAll(decision => own.Contains(decision.Kind == DecisionKind.Withdraw ? decision.Subject : decision.Id));
    }

    private List<Decision> Select(string sql, object? values = null) =>
    [
        .. session.Rows<Row>(sql, values)
            .Select(row => row.ToDecision())
            .OrderBy(decision => decision.Made)
            .ThenBy(decision => decision.Kind == DecisionKind.Withdraw)
            .ThenBy(decision => decision.From ?? LocalDate.MinIsoValue)
            .ThenBy(decision => decision.Kind)
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

        public LocalDate? AboutFrom { get; init; }

        public static Row From(Decision decision)
        {
            var detail = new DetailText(
                decision.Kind == DecisionKind.Assign ? decision.Subject : null,
                decision.By,
                decision.Note,
                decision.Kind == DecisionKind.Withdraw ? decision.Subject : null,
                decision.From,
                decision.Until,
                decision.Via);
            return new Row
            {
                Id = decision.Id,
                Made = decision.Made,
                Kind = Words<DecisionKind>.Of(decision.Kind),
                Person = decision.Person,
                Alert = decision.Kind is DecisionKind.Acknowledge or DecisionKind.Shelve ? decision.Subject : null,
                Detail = JsonText.Write(detail),
                AboutFrom = decision.From,
            };
        }

        public Decision ToDecision()
        {
            var kind = Words<DecisionKind>.Parse(Kind);
            var detail = JsonText.Read<DetailText>(Detail);
            var subject = kind switch
            {
                DecisionKind.Acknowledge or DecisionKind.Shelve => Alert,
                DecisionKind.Assign => detail.Arrival,
                DecisionKind.Withdraw => detail.Decision,
                _ => Person,
            };
            return new Decision(kind, subject ?? throw new InvalidDataException($"decision {Id} is about nothing"), Person, Made, detail.By, detail.Note)
            {
                From = detail.From,
                Until = detail.Until,
                Via = detail.Via,
            };
        }
    }

    private sealed record DetailText(string? Arrival, string? By, string? Note, string? Decision, LocalDate? From, LocalDate? Until, string? Via);
}
