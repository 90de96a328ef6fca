using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>Something about a person's date that only staff can settle.</summary>
public sealed record Question(string Person, LocalDate Date, string Sentence);

/// <summary>Something about a content that only staff can settle.</summary>
public sealed record ContentQuestion(string Sha, string Sentence);

/// <summary>Tables <c>question</c> and <c>content_question</c>: what came out open when days were computed and contents were settled.</summary>
public sealed class QuestionTable
{
    private const string DeleteFrom = "DELETE FROM question WHERE person = @person AND date >= @from";
    private const string Insert = "INSERT INTO question (person, date, sentence) VALUES (@Person, @Date, @Sentence) ON CONFLICT DO NOTHING";
    private const string SelectSince = "SELECT person, date, sentence FROM question WHERE date >= @from ORDER BY person, date, sentence";

    private const string DeleteOfContent = "DELETE FROM content_question WHERE sha = @sha";
    private const string InsertOfContent = "INSERT INTO content_question (sha, sentence) VALUES (@sha, @sentence)";
    private const string SelectOfContents = "SELECT sha, sentence FROM content_question ORDER BY sha, sentence";

    private readonly StoreSession session;

    internal QuestionTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's questions in place of all from a date on.</summary>
    public void Replace(string person, LocalDate from, IEnumerable<Question> questions)
    {
        session.Execute(DeleteFrom, new { person, from });
        session.ExecuteEach(Insert, questions);
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
        session.Rows<Row>(SelectSince, new { from }).ConvertAll(row => new Question(row.Person, row.Date, row.Sentence));

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
    }
}
