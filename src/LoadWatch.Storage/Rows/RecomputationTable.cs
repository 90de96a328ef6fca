using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>Recordings of a person whose date is in a range, both ends included, are to be computed again.</summary>
public sealed record Recomputation(string Person, LocalDate From, LocalDate To);

/// <summary>Table <c>recomputation</c>: what changed rows of tables left to do; done when its recordings are settled anew.</summary>
public sealed class RecomputationTable
{
    private const string Insert = "INSERT INTO recomputation (person, from_date, to_date) VALUES (@person, @from, @to) ON CONFLICT DO NOTHING";
    private const string Select = "SELECT person, from_date, to_date FROM recomputation ORDER BY person, from_date, to_date";
    private const string Delete = "DELETE FROM recomputation WHERE person = @Person AND from_date = @From AND to_date = @To";

    private readonly StoreSession session;

    internal RecomputationTable(StoreSession session) => this.session = session;

    public void Ask(string person, LocalDate from, LocalDate to) => session.Execute(Insert, new { person, from, to });

    public IReadOnlyList<Recomputation> All() => session.Rows<Row>(Select).ConvertAll(row => new Recomputation(row.Person, row.FromDate, row.ToDate));

    public void Done(IEnumerable<Recomputation> done) => session.ExecuteEach(Delete, done);

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public LocalDate FromDate { get; init; }

        public LocalDate ToDate { get; init; }
    }
}
