using LoadWatch.Findings;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Findings;

/// <summary>Table <c>finding</c>: which rule held for whom on which date, with what it rests on (I-8).</summary>
public sealed class FindingTable
{
    private const string Columns = "person, date, rule, about, severity, since, value, limit_value, unit, text, evidence";

    private const string Insert = $"""
        INSERT INTO finding ({Columns})
        VALUES (@Person, @Date, @Rule, @About, @Severity, @Since, @Value, @LimitValue, @Unit, @Text, @Evidence)
        """;

    private const string Delete = "DELETE FROM finding WHERE person = @person AND date >= @from AND date <= @to";

    private const string SelectOfPerson =
        $"SELECT {Columns} FROM finding WHERE person = @person AND date >= @from AND date <= @to ORDER BY date, rule, about";

    private const string SelectUnraised =
        $"SELECT {Columns} FROM finding WHERE person = @person AND date = @date AND severity IN ('note', 'suppressed') ORDER BY rule, about";

    private const string CountHeld =
        "SELECT COUNT(*) FROM finding WHERE person = @person AND date = @date AND rule = @rule AND about = @about AND severity NOT IN ('note', 'suppressed')";

    private readonly StoreSession session;

    internal FindingTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's findings in place of all from a date on, up to another where one is given.</summary>
    /// <exception cref="ArgumentException">A finding is of somebody else, or not among those dates.</exception>
    public void Replace(string person, LocalDate from, IReadOnlyList<Finding> findings, LocalDate? to = null)
    {
        if (findings.FirstOrDefault(one => one.Date < from || one.Date > to || !string.Equals(one.Person, person, StringComparison.Ordinal)) is { } stray)
        {
            throw new ArgumentException($"{stray.Date} of {stray.Person} is not among the findings of {person} from {from}", nameof(findings));
        }

        session.Execute(Delete, new { person, from, to = to ?? LocalDate.MaxIsoValue });
        session.ExecuteEach(Insert, findings.Select(Row.From));
    }

    /// <summary>A person's findings in the range, both ends included, sorted by date, rule and what they are about.</summary>
    public IReadOnlyList<Finding> OfPerson(string person, LocalDate? from = null, LocalDate? to = null) =>
        session.Rows<Row>(SelectOfPerson, new { person, from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue })
            .ConvertAll(row => row.ToFinding());

    /// <summary>A person's notes of a date and what was suppressed on it, sorted by rule and what they are about.</summary>
    public IReadOnlyList<Finding> Unraised(string person, LocalDate date) => session.Rows<Row>(SelectUnraised, new { person, date }).ConvertAll(row => row.ToFinding());

    /// <summary>Whether the finding holds on a date; a note is none, nor what plan or answers suppress.</summary>
    public bool Held(FindingKey key, LocalDate date) =>
        session.Value<long>(CountHeld, new { person = key.Person, date, rule = key.Rule, about = AboutWord.Of(key.Region, key.Quantity) }) > 0;

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public LocalDate Date { get; init; }

        public string Rule { get; init; } = "";

        public string About { get; init; } = "";

        public string Severity { get; init; } = "";

        public LocalDate Since { get; init; }

        public double Value { get; init; }

        public double LimitValue { get; init; }

        public string Unit { get; init; } = "";

        public string Text { get; init; } = "";

        public string Evidence { get; init; } = "";

        public static Row From(Finding finding) => new()
        {
            Person = finding.Person,
            Date = finding.Date,
            Rule = finding.Rule,
            About = AboutWord.Of(finding.Region, finding.Quantity),
            Severity = Words<Severity>.Of(finding.Severity),
            Since = finding.Since,
            Value = finding.Value,
            LimitValue = finding.Limit,
            Unit = finding.Unit,
            Text = finding.Text,
            Evidence = JsonText.Write(finding.Evidence),
        };

        public Finding ToFinding() => new(
            Person,
            Date,
            Rule,
            AboutWord.Region(About),
            Words<Severity>.Parse(Severity),
            Since,
            Value,
            LimitValue,
            Unit,
            Text,
            JsonText.Read<Evidence>(Evidence))
        {
            Quantity = AboutWord.Quantity(About),
        };
    }
}
