using LoadWatch.Recordings;
using LoadWatch.Storage.Dialects;

namespace LoadWatch.Storage.Recordings;

/// <summary>Table <c>arrival</c>: what came in, once for each content (I-1).</summary>
public sealed class ArrivalTable
{
    /// <summary>So many decodings that brought their process down refuse an arrival.</summary>
    public const int MostAttempts = 3;

    private const string Columns = "sha, parent_sha, object_sha, kind, state, reason, person, attempts, size";

    private const string Insert = """
        INSERT INTO arrival (sha, parent_sha, object_sha, state, attempts, size)
        VALUES (@sha, @parentSha, @objectSha, 'waiting', 0, @size)
        ON CONFLICT (sha) DO NOTHING
        """;

    private const string SelectOne = $"SELECT {Columns} FROM arrival WHERE sha = @sha";
    private const string SelectWaiting = $"SELECT {Columns} FROM arrival WHERE state = 'waiting' ORDER BY sha";
    private const string SelectInState = $"SELECT {Columns} FROM arrival WHERE state = @state ORDER BY sha";
    private const string SelectAll = $"SELECT {Columns} FROM arrival ORDER BY sha";
    private const string SelectStarting = $"SELECT {Columns} FROM arrival WHERE sha >= @digits AND sha < @beyond ORDER BY sha";
    private const string CountAll = "SELECT state, COUNT(*) AS number FROM arrival GROUP BY state";
    private const string CountOne = "SELECT COUNT(*) FROM arrival WHERE state = @state";
    private const string Update = "UPDATE arrival SET state = @state, kind = @kind, reason = @reason, person = @person, problems = @problems WHERE sha = @sha";
    private const string SelectProblems = "SELECT problems FROM arrival WHERE sha = @sha";
    private const string AddAttempt = "UPDATE arrival SET attempts = attempts + 1 WHERE sha = @sha";

    private readonly StoreSession session;

    internal ArrivalTable(StoreSession session) => this.session = session;

    /// <summary>Notes an arrival as waiting. False, and nothing changed, when its content is known.</summary>
    /// <param name="size">Bytes.</param>
    public bool AddWaiting(string sha, string? parentSha, string objectSha, long size) =>
        session.Execute(Insert, new { sha, parentSha, objectSha, size }) == 1;

    public Arrival? Get(string sha) => session.Row<Row>(SelectOne, new { sha })?.ToArrival();

    /// <summary>Every arrival not decoded yet, sorted by content.</summary>
    public IReadOnlyList<Arrival> Waiting() => Select(SelectWaiting + session.Dialect.ClaimClause);

    /// <summary>Every arrival in a state, sorted by content. What every sweep looks at asks for this, so that its cost does not grow with the stored ones.</summary>
    public IReadOnlyList<Arrival> InState(ArrivalState state) =>
        session.Rows<Row>(SelectInState, new { state = Words<ArrivalState>.Of(state) }).ConvertAll(row => row.ToArrival());

    /// <summary>Arrivals whose hash begins with the digits, sorted by content.</summary>
    /// <param name="digits">Lower-case hex digits.</param>
    public IReadOnlyList<Arrival> StartingWith(string digits) =>
        session.Rows<Row>(SelectStarting, new { digits, beyond = digits + "g" }).ConvertAll(row => row.ToArrival());

    /// <summary>Every arrival, sorted by content.</summary>
    public IReadOnlyList<Arrival> All() => Select(SelectAll);

    /// <summary>Number of arrivals in one state.</summary>
    public int Count(ArrivalState state) => (int)session.Value<long>(CountOne, new { state = Words<ArrivalState>.Of(state) });

    /// <summary>Number of arrivals by state, each state named.</summary>
    public IReadOnlyDictionary<ArrivalState, int> CountByState()
    {
        var counts = session.Rows<CountRow>(CountAll).ToDictionary(row => Words<ArrivalState>.Parse(row.State), row => row.Number);
        return Enum.GetValues<ArrivalState>().ToDictionary(state => state, state => counts.GetValueOrDefault(state));
    }

    /// <param name="problems">What is wrong with the content, the first that many of them; null: nothing.</param>
    /// <exception cref="InvalidOperationException">There is no such arrival.</exception>
    public void Settle(string sha, ArrivalState state, string? kind, string? reason, string? person, IReadOnlyList<string>? problems = null) =>
        OfOne(session.Execute(Update, new { sha, state = Words<ArrivalState>.Of(state), kind, reason, person, problems = JsonText.Write(problems ?? []) }), sha);

    /// <summary>What is wrong with an arrival, as it was settled; empty where there is no such arrival.</summary>
    public IReadOnlyList<string> Problems(string sha) =>
        session.Value<string>(SelectProblems, new { sha }) is { } problems ? JsonText.Read<List<string>>(problems) : [];

    /// <summary>Counts a decoding that brought its process down.</summary>
    /// <exception cref="InvalidOperationException">There is no such arrival.</exception>
    public void CountAttempt(string sha) => OfOne(session.Execute(AddAttempt, new { sha }), sha);

    private static void OfOne(int changed, string sha)
    {
        if (changed != 1)
        {
            throw new InvalidOperationException($"no arrival {sha[..Math.Min(12, sha.Length)]}");
        }
    }

    private List<Arrival> Select(string sql) => session.Rows<Row>(sql).ConvertAll(row => row.ToArrival());

    private sealed class CountRow
    {
        public string State { get; init; } = "";

        public int Number { get; init; }
    }

    private sealed class Row
    {
        public string Sha { get; init; } = "";

        public string? ParentSha { get; init; }

        public string ObjectSha { get; init; } = "";

        public string? Kind { get; init; }

        public string State { get; init; } = "";

        public string? Reason { get; init; }

        public string? Person { get; init; }

        public int Attempts { get; init; }

        public long Size { get; init; }

        public Arrival ToArrival() => new(Sha, ParentSha, ObjectSha, Kind, Words<ArrivalState>.Parse(State), Reason, Person, Attempts, Size);
    }
}
