using NodaTime;

namespace LoadWatch.Storage.Audits;

/// <summary>Table <c>audit</c>: what was done to the data and when, appended to, never changed.</summary>
public sealed class AuditTable
{
    private const string Insert = """
        INSERT INTO audit (seq, instant, what, detail)
        VALUES ((SELECT COALESCE(MAX(seq), 0) + 1 FROM audit), @instant, @what, @detail)
        """;

    private const string SelectAll = "SELECT seq, instant, what, detail FROM audit ORDER BY seq";

    private readonly StoreSession session;

    internal AuditTable(StoreSession session) => this.session = session;

    /// <param name="what">A word for the deed.</param>
    /// <param name="detail">People by id, arrivals by their first digits; no values (I-12).</param>
    public void Add(string what, string detail, Instant instant) => session.Execute(Insert, new { instant, what, detail });

    /// <summary>In the order in which it happened.</summary>
    public IReadOnlyList<AuditEntry> All() =>
        session.Rows<Row>(SelectAll).ConvertAll(row => new AuditEntry(row.Seq, row.Instant, row.What, row.Detail));

    private sealed class Row
    {
        public long Seq { get; init; }

        public Instant Instant { get; init; }

        public string What { get; init; } = "";

        public string Detail { get; init; } = "";
    }
}

/// <param name="Sequence">Counts from 1.</param>
public sealed record AuditEntry(long Sequence, Instant Instant, string What, string Detail);
