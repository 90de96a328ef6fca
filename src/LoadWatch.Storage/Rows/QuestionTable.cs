using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>Something about a person's date that only staff can settle.</summary>
/// <param name="Date">From which on it is asked.</param>
/// <param name="About">The date that it is about.</param>
public sealed record Question(string Person, LocalDate Date, string Sentence, LocalDate About);

/// <summary>Something about a content that only staff can settle.</summary>
public sealed record ContentQuestion(string Sha, string Sentence);

/// <summary>Tables <c>question</c> and <c>content_question</c>: what came out open when days were computed and contents were settled.</summary>
public sealed class QuestionTable
{
    private const string Delete = "DELETE FROM question WHERE person = @person AND (about >= @from AND about <= @to OR date < @oldest)";
    private const string Insert = "INSERT INTO question (person, date, sentence, about) VALUES (@Person, @Date, @Sentence, @About) ON CONFLICT DO NOTHING";
    private const string SelectSince = "SELECT person, date, sentence, about FROM question WHERE date >= @from ORDER BY person, date, sentence";

    private const string DeleteOfContent = "DELETE FROM content_question WHERE sha = @sha";
    private const string InsertOfContent = "INSERT INTO content_question (sha, sentence) VALUES (@sha, @sentence)";
    private const string SelectOfContents = "SELECT sha, sentence FROM content_question ORDER BY sha, sentence";

    private readonly StoreSession session;

    internal QuestionTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's questions in place of all about dates in a range, both ends included, and forgets those that were to be asked before a date.</summary>
    public void Replace(string person, LocalDate from, LocalDate to, IEnumerable<Question> questions, LocalDate oldest)
    {
        session.Execute(Delete, new { person, from, to, oldest });
        session.ExecuteEach(Insert, questions.Where(question => question.Date >= oldest));
    }

    /// <summary>Stores the questions about a content in place of all of it.</summary>
    public void Ask(string sha, IReadOnlyList<string> sentences)
    {
        session.Execute(DeleteOfContent, new { sha });
        session.ExecuteEach(InsertOfContent, sentences.Select(sentence => new { sha, sentence }));
    }

    /// <summary>Every question about a content, sorted by content and sentence.</summary>
    public IReadOnlyList<ContentQuestion> OfContents() => session.Rows<ContentRow>(SelectOfContents).ConvertAll(row => new ContentQuestion(row.Sha, row.Sentence));

    /// <summary>Everybody's questions of dates from one on, sorted by person, date and sentence.</summary>
    public IReadOnlyList<Question> Since(LocalDate from) =>
        session.Rows<Row>(SelectSince, new { from }).ConvertAll(row => new Question(row.Person, row.Date, row.Sentence, row.About));

    private sealed class ContentRow
    {
        public string Sha { get; init; } = "";

        public string Sentence { get; init; } = "";
    }

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public LocalDate Date { get; init; }

        public string Sentence { get; init; } = "";

        public LocalDate About { get; init; }
    }
}
