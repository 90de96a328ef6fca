using LoadWatch.Findings;
using LoadWatch.Rows;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>Table <c>table_row</c>: the rows of every table as its latest version tells them. Derived: rebuilt from the versions in the archive.</summary>
public sealed class RowTable
{
    private const string Columns = "scope, subject, key, kind, layout, person, date, since, content";

    private const string Upsert = $"""
        INSERT INTO table_row ({Columns}, until)
        VALUES (@Scope, @Subject, @Key, @Kind, @Layout, @Person, @Date, @Since, @Content, @Until)
        ON CONFLICT (scope, kind, subject, key) DO UPDATE SET
            layout = excluded.layout, person = excluded.person, date = excluded.date, since = excluded.since, content = excluded.content,
            until = excluded.until
        """;

    private const string Delete = "DELETE FROM table_row WHERE scope = @Scope AND kind = @Kind AND subject = @Subject AND key = @Key";
    private const string SelectOfScope = $"SELECT {Columns} FROM table_row WHERE scope = @scope";
    private const string SelectOfPerson = $"SELECT {Columns} FROM table_row WHERE person = @person AND kind = @kind AND date >= @from AND date <= @to";
    private const string SelectOfKind = $"SELECT {Columns} FROM table_row WHERE kind = @kind";
    private const string SelectStanding = $"SELECT {Columns} FROM table_row WHERE person = @person AND kind = @kind AND until = @always";
    private const string SelectFirst = "SELECT MIN(date) AS date FROM table_row WHERE person = @person AND kind IN ('sessions', 'sets')";
    private const string InPlan = "FROM table_row WHERE kind = 'plan' AND until >= @from AND date <= @to";
    private const string SelectSubjects = $"SELECT DISTINCT subject {InPlan} AND person IS NULL ORDER BY subject";

    // By their dates, which are part of their keys: a line that says an earlier end in a later table must not be missed.
    private const string SelectPlan = $"""
        SELECT {Columns} FROM table_row
        WHERE kind = 'plan' AND date IN (SELECT date {InPlan}) AND (person = @person OR person IS NULL AND subject IN @subjects)
        """;

    private const string SelectOfNobody = $"SELECT {Columns} FROM table_row WHERE person IS NULL AND kind NOT IN ('plan', 'answers')";

    private readonly StoreSession session;

    internal RowTable(StoreSession session) => this.session = session;

    /// <summary>Every row of a table, sorted by kind, date, subject and key.</summary>
    public IReadOnlyList<StoredRow> OfScope(string scope) => Select(SelectOfScope, new { scope });

    /// <summary>A person's rows of a kind in force: of equal keys told by several tables, for sessions and sets of one layout, the one seen later. Of dates in the range, both ends included; sorted by date and key.</summary>
    public IReadOnlyList<StoredRow> OfPerson(string person, RowKind kind, LocalDate? from = null, LocalDate? to = null) => InForce(
        Select(SelectOfPerson, new { person, kind = Words<RowKind>.Of(kind), from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue }),
        row => row.Person);

    /// <summary>A person's rows of a kind in force that hold until another says otherwise: reference values.</summary>
    public IReadOnlyList<StoredRow> StandingOf(string person, RowKind kind) => InForce(
        Select(SelectStanding, new { person, kind = Words<RowKind>.Of(kind), always = LocalDate.MaxIsoValue }), row => row.Person);

    /// <summary>The first date of a person's sessions and sets, or null.</summary>
    public LocalDate? FirstOfPerson(string person) => session.Row<FirstRow>(SelectFirst, new { person })?.Date;

    /// <summary>Lines of the plan in force that speak for dates in the range, both ends included: those of a person, and those whose subject is meant.</summary>
    /// <param name="isMeant">Whether a subject that is no person's means the person, too; it may be empty.</param>
    public IReadOnlyList<StoredRow> Plan(string person, Func<string, bool> isMeant, LocalDate from, LocalDate to)
    {
        var subjects = session.Rows<string>(SelectSubjects, new { from, to }).FindAll(subject => isMeant(subject));
        return [.. InForce(Select(SelectPlan, new { person, subjects, from, to }), row => row.Person ?? $"?{row.Subject}").Where(row => UntilOf(row) >= from)];
    }

    /// <summary>Everybody's rows of a kind in force, of groups too; sorted by date, subject and key.</summary>
    public IReadOnlyList<StoredRow> OfKind(RowKind kind) =>
        InForce(Select(SelectOfKind, new { kind = Words<RowKind>.Of(kind) }), row => row.Person ?? $"?{row.Subject}");

    /// <summary>Rows whose person is not in the roster; sorted as above.</summary>
    public IReadOnlyList<StoredRow> OfNobody() => Select(SelectOfNobody, null);

    /// <summary>Writes rows, each in place of the one of the same table, kind, subject and key.</summary>
    public void Put(IEnumerable<StoredRow> rows) => session.ExecuteEach(Upsert, rows.Select(Row.From));

    public void Remove(IEnumerable<StoredRow> rows) => session.ExecuteEach(Delete, rows.Select(Row.From));

    private static List<StoredRow> InForce(List<StoredRow> rows, Func<StoredRow, string?> owner) =>
    [
        .. rows
            .GroupBy(row => (Owner: owner(row), row.Key, Layout: IsOfItsLayout(row.Kind) ? row.Layout : ""))
            .Select(same => same.MaxBy(row => (row.Since, row.Scope), Later)!)
            .OrderBy(row => row.Date)
            .ThenBy(row => row.Subject, StringComparer.Ordinal)
            .ThenBy(row => row.Key, StringComparer.Ordinal),
    ];

    /// <summary>A rating and a tracking row of the first session of a date tell different things of it; two plans or answers of one key do not.</summary>
    private static bool IsOfItsLayout(RowKind kind) => kind is RowKind.Sessions or RowKind.Sets;

    private static Comparer<(Instant Since, string Scope)> Later { get; } = Comparer<(Instant Since, string Scope)>.Create((a, b) =>
        a.Since.CompareTo(b.Since) is var apart and not 0 ? apart : string.CompareOrdinal(a.Scope, b.Scope));

    /// <summary>The last date that a row speaks for.</summary>
    private static LocalDate UntilOf(StoredRow row) => row.Content switch
    {
        PlanRow { Until: { } until } when until > row.Date => until,
        TestRow test when FunctionTests.Of(test.Test) is null => LocalDate.MaxIsoValue,
        _ => row.Date,
    };

    private List<StoredRow> Select(string sql, object? values) =>
    [
        .. session.Rows<Row>(sql, values)
            .Select(row => row.ToRow())
            .OrderBy(row => row.Kind)
            .ThenBy(row => row.Date)
            .ThenBy(row => row.Subject, StringComparer.Ordinal)
            .ThenBy(row => row.Key, StringComparer.Ordinal),
    ];

    private sealed class FirstRow
    {
        public LocalDate? Date { get; init; }
    }

    private sealed class Row
    {
        public string Scope { get; init; } = "";

        public string Subject { get; init; } = "";

        public string Key { get; init; } = "";

        public string Kind { get; init; } = "";

        public string Layout { get; init; } = "";

        public string? Person { get; init; }

        public LocalDate Date { get; init; }

        public Instant Since { get; init; }

        public string Content { get; init; } = "";

        public LocalDate Until { get; init; }

        public static Row From(StoredRow row) => new()
        {
            Scope = row.Scope,
            Subject = row.Subject,
            Key = row.Key,
            Kind = Words<RowKind>.Of(row.Kind),
            Layout = row.Layout,
            Person = row.Person,
            Date = row.Date,
            Since = row.Since,
            Content = RowText.Write(row.Content),
            Until = UntilOf(row),
        };

        public StoredRow ToRow()
        {
            var kind = Words<RowKind>.Parse(Kind);
            return new StoredRow(Scope, kind, Layout, Subject, Person, Date, Key, Since, RowText.Read(kind, Content));
        }
    }
}
