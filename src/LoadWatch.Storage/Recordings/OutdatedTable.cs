using LoadWatch.Recordings;
using LoadWatch.Storage.Dialects;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>An original with contents whose rows stand on a basis that has changed.</summary>
/// <param name="Person">Id of the contents' owner; of an archive file that of its members; empty where there is none.</param>
public sealed record OutdatedObject(string Person, string ObjectSha);

/// <summary>
/// Table <c>outdated</c>: contents to be decoded and judged again; their rows stand until then. What waits and what ends the process that decodes it is
/// never among them.
/// </summary>
public sealed class OutdatedTable
{
    // Nothing is marked twice; who it belongs to only sorts.
    private const string Mark = """
        INSERT INTO outdated (sha, object_sha, person)
        SELECT a.sha, a.object_sha, COALESCE(a.person, (SELECT MIN(m.person) FROM arrival m WHERE m.parent_sha = a.sha), '')
        FROM arrival a
        WHERE a.state <> 'waiting' AND (a.state <> 'refused' OR a.attempts < @most)
        """;

    private const string Once = " ON CONFLICT (sha) DO NOTHING";
    private const string MarkOne = Mark + " AND a.sha = @sha" + Once;
    private const string MarkEvery = Mark + Once;
    private const string MarkState = Mark + " AND a.state = @state" + Once;
    private const string MarkText = Mark + " AND COALESCE(a.kind, '') NOT IN ('fit', 'gzip', 'zip')" + Once;
    private const string MarkAsked = Mark + " AND a.sha IN (SELECT q.sha FROM content_question q)" + Once;

    private const string MarkRecordings =
        Mark + " AND a.sha IN (SELECT r.sha FROM recording r WHERE r.person = @person AND r.start >= @from AND r.start < @to)" + Once;

    private const string SelectNext = """
        SELECT DISTINCT person, object_sha FROM outdated
        WHERE (person, object_sha) > (@Person, @ObjectSha) ORDER BY person, object_sha LIMIT @count
        """;

    private const string SelectOfObject = "SELECT sha FROM outdated WHERE person = @Person AND object_sha = @ObjectSha ORDER BY sha";
    private const string Delete = "DELETE FROM outdated WHERE sha = @Sha";
    private const string CountAll = "SELECT COUNT(*) FROM outdated";

    private const string CountObjects = "SELECT COUNT(*) FROM (SELECT DISTINCT person, object_sha FROM outdated)";

    private const string CountPeople = """
        SELECT COUNT(*) FROM (
            SELECT o.person FROM outdated o WHERE o.person <> ''
            UNION SELECT r.person FROM outdated o JOIN recording r ON r.sha = o.sha)
        """;

    private static readonly OutdatedObject BeforeAll = new("", "");

    private readonly StoreSession session;

    internal OutdatedTable(StoreSession session) => this.session = session;

    public void Add(string sha) => session.Execute(MarkOne, new { sha, most = ArrivalTable.MostAttempts });

    public void AddAll() => session.Execute(MarkEvery, new { most = ArrivalTable.MostAttempts });

    public void AddInState(ArrivalState state) => session.Execute(MarkState, new { state = Words<ArrivalState>.Of(state), most = ArrivalTable.MostAttempts });

    /// <summary>Whatever layouts may read: all but FIT and archive files.</summary>
    public void AddText() => session.Execute(MarkText, new { most = ArrivalTable.MostAttempts });

    /// <summary>Contents about which staff are asked.</summary>
    public void AddAsked() => session.Execute(MarkAsked, new { most = ArrivalTable.MostAttempts });

    /// <summary>Contents with a recording of a person that starts between the moments, the second one excluded.</summary>
    /// <returns>Number of those that were not among them.</returns>
    public int AddRecordings(string person, Instant from, Instant to) =>
        session.Execute(MarkRecordings, new { person, from, to, most = ArrivalTable.MostAttempts });

    /// <summary>The next originals, sorted by person and content.</summary>
    /// <param name="after">The last one seen; null begins.</param>
    public IReadOnlyList<OutdatedObject> Next(OutdatedObject? after, int count)
    {
        var (person, objectSha) = after ?? BeforeAll;
        return session.Rows<Row>(SelectNext, new { Person = person, ObjectSha = objectSha, count }).ConvertAll(row => new OutdatedObject(row.Person, row.ObjectSha));
    }

    /// <summary>SHA-256 of each outdated content of an original.</summary>
    public IReadOnlyList<string> Of(OutdatedObject original) => session.Rows<string>(SelectOfObject, original);

    public void Done(IEnumerable<string> shas) => session.ExecuteEach(Delete, shas.Select(sha => new { Sha = sha }));

    public int Count() => session.Value<int>(CountAll);

    /// <summary>Number of originals, counted for each person.</summary>
    public int Objects() => session.Value<int>(CountObjects);

    /// <summary>Number of people of whom some content is outdated.</summary>
    public int People() => session.Value<int>(CountPeople);

    private sealed class Row
    {
        public string Person { get; init; } = "";

        public string ObjectSha { get; init; } = "";
    }
}
