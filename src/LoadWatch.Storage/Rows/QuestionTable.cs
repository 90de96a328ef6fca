using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>Something about a person's date that only staff can settle.</summary>
public sealed record Question(string Person, LocalDate Date, string Sentence);

/// <summary>Table <c>question</c>: what came out open when a person's days were computed.</summary>
public sealed class QuestionTable
{
    private const string DeleteFrom = "DELETE FROM question WHERE person = @person AND date >= @from";
    private const string Insert = "INSERT INTO question (person, date, sentence) VALUES (@Person, @Date, @Sentence) ON CONFLICT DO NOTHING";
    private const string SelectSince = "SELECT person, date, sentence FROM question WHERE date >= @from ORDER BY person, date, sentence";

    private readonly StoreSession session;

    internal QuestionTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's questions in place of all from a date on.</summary>
    public void Replace(string person, LocalDate from, IEnumerable<Question> questions)
    {
        session.Execute(DeleteFrom, new { person, from });
        session.ExecuteEach(Insert, questions);
    }

    /// <summary>Everybody's questions of dates from one on, sorted by person, date and sentence.</summary>
    public IReadOnlyList<Question> Since(LocalDate from) =>
        session.Rows<Row>(SelectSince, new { from }).ConvertAll(row => new Question(row.Person, row.Date, row.Sentence));

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public LocalDate Date { get; init; }

        public string Sentence { get; init; } = "";
    }
}
