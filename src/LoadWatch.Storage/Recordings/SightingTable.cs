using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Storage.Recordings;

/// <summary>Table <c>sighting</c>: under which names each content was seen; its latest rows are the cache that spares hashing.</summary>
public sealed class SightingTable
{
    private const string Columns = "inbox, path, sha, first_seen, size, mtime, file_id, latest, since";

    private const string Outdate = "UPDATE sighting SET latest = 0 WHERE inbox = @inbox AND path = @path AND sha <> @sha AND latest = 1";

    private const string Insert = $"""
        INSERT INTO sighting ({Columns})
        VALUES (@inbox, @path, @sha, @firstSeen, @Size, @ModifiedUnixMs, @FileId, 1, @firstSeen)
        ON CONFLICT (inbox, path, sha) DO UPDATE SET
            size = excluded.size, mtime = excluded.mtime, file_id = excluded.file_id,
            since = CASE WHEN sighting.latest = 1 THEN sighting.since ELSE excluded.since END, latest = 1
        """;

    private const string Delete = "DELETE FROM sighting WHERE inbox = @Inbox AND path = @Path AND sha = @Sha";
    private const string CountLatestOf = "SELECT COUNT(*) FROM sighting WHERE inbox = @inbox AND latest = 1";

    // The empty text keeps the index out of it: going through the table in its own order is faster than through a million places of it.
    private const string SelectStamps = "SELECT path, size, mtime, file_id FROM sighting WHERE inbox || '' = @inbox AND latest = 1";
    private const string SelectStored = """
        SELECT s.sha, a.person, s.inbox, s.path FROM sighting s JOIN arrival a ON a.sha = s.sha WHERE a.state = 'stored' ORDER BY s.sha
        """;

    private const string SelectOfPath = $"SELECT {Columns} FROM sighting WHERE path = @path";
    private const string SelectOf = $"SELECT {Columns} FROM sighting WHERE sha = @sha";

    private const string SelectNameSakes = """
        SELECT DISTINCT other.sha FROM sighting own
        JOIN sighting other ON other.inbox = own.inbox AND other.path = own.path AND other.sha <> own.sha
        WHERE own.sha = @sha
        """;

    private const string SelectHolders = """
        SELECT s.inbox, s.path, s.sha, s.first_seen, s.size, s.mtime, s.file_id, s.latest, s.since
        FROM sighting s JOIN arrival a ON a.sha = s.sha
        WHERE s.inbox = @inbox AND s.path = @path AND a.state = 'stored'
        """;

    private const string SelectInboxesOfLatest = """
        SELECT DISTINCT s.inbox FROM recording r JOIN sighting s ON s.sha = r.sha
        WHERE r.person = @person AND r.start = (SELECT MAX(last.start) FROM recording last WHERE last.person = @person)
        ORDER BY s.inbox
        """;

    // Files by their contents, an archive's members by the archive in which they came first; not what has followed another content under its name, which has brought
    // some of it before. Of rows of a table it is known of each when it came.
    private const string SelectFirstOfDates = """
        SELECT r.start, r.local_offset_seconds, NULL AS date, MIN(s.first_seen) AS first_seen
        FROM recording r JOIN arrival a ON a.sha = r.sha JOIN sighting s ON s.sha = a.object_sha
        WHERE r.person = @person AND r.start >= @start AND (a.object_sha <> a.sha OR NOT EXISTS (
            SELECT 1 FROM sighting other WHERE other.inbox = s.inbox AND other.path = s.path AND other.sha <> s.sha))
        GROUP BY r.sha, r.part, r.start, r.local_offset_seconds
        UNION ALL
        SELECT NULL, 0, date, MIN(since) FROM table_row WHERE person = @person AND kind IN ('sessions', 'sets') AND date >= @from GROUP BY date
        """;

    private const string SelectNewest = "SELECT first_seen FROM sighting ORDER BY first_seen DESC LIMIT 1";

    private const string SelectOldestWaiting = """
        SELECT s.first_seen FROM arrival a JOIN sighting s ON s.sha = a.object_sha
        WHERE a.state = 'waiting' ORDER BY s.first_seen LIMIT 1
        """;

    private readonly StoreSession session;

    internal SightingTable(StoreSession session) => this.session = session;

    /// <summary>Number of names in an inbox.</summary>
    public int CountLatest(string inbox) => session.Value<int>(CountLatestOf, new { inbox });

    /// <summary>Goes through the names of an inbox with the stamps of their newest contents, in no order: there may be a million.</summary>
    public void EachLatest(string inbox, Action<string, FileStamp> each) => session.EachRow(
        SelectStamps, new { inbox }, row => each(row.GetString(0), new FileStamp(row.GetInt64(1), row.GetInt64(2), row.GetString(3))));

    /// <summary>Goes through all names of stored contents, those of one content behind each other.</summary>
    /// <param name="each">Gets the content, its owner or null, the inbox and the path.</param>
    public void EachStored(Action<string, string?, string, string> each) => session.EachRow(
        SelectStored, null, row => each(row.GetString(0), row.IsDBNull(1) ? null : row.GetString(1), row.GetString(2), row.GetString(3)));

    /// <summary>Notes that a name holds a content now. The first moment of the pair stays; the stamp is the new one. A content that comes back counts anew from now on.</summary>
    public void Upsert(string inbox, string path, string sha, Instant firstSeen, FileStamp stamp)
    {
        session.Execute(Outdate, new { inbox, path, sha });
        session.Execute(Insert, new { inbox, path, sha, firstSeen, stamp.Size, stamp.ModifiedUnixMs, stamp.FileId });
    }

    /// <summary>Drops a name that a content no longer has.</summary>
    public void Forget(Sighting sighting) => session.Execute(Delete, new { sighting.Inbox, sighting.Path, sighting.Sha });

    /// <summary>Every content that was seen under a name, in whatever inbox.</summary>
    public IReadOnlyList<Sighting> OfPath(string path) => session.Rows<Row>(SelectOfPath, new { path }).ConvertAll(row => row.ToSighting());

    /// <summary>Every name of a content, sorted by path and inbox, ordinally: the first is the one shown (I-5).</summary>
    public IReadOnlyList<Sighting> Of(string sha) =>
    [
        .. session.Rows<Row>(SelectOf, new { sha })
            .Select(row => row.ToSighting())
            .OrderBy(sighting => sighting.Path, StringComparer.Ordinal)
            .ThenBy(sighting => sighting.Inbox, StringComparer.Ordinal),
    ];

    /// <summary>Every other content that was seen under a name of this one, in whatever order.</summary>
    public IReadOnlyList<string> NameSakes(string sha) => session.Rows<string>(SelectNameSakes, new { sha });

    /// <summary>
    /// The contents that hold the names of a content now, sorted; null where it holds one itself. Only stored contents hold a name: a broken, foreign or
    /// unjudged one corrects nothing.
    /// </summary>
    public IReadOnlyList<string>? Replaced(string sha)
    {
        var names = Of(sha);
        if (names.Count == 0 || names.Any(name => name.Latest))
        {
            return null;
        }

        var holders = names.Select(HolderOf).ToList();
        return holders.Contains(sha) ? null : [.. holders.OfType<string>().Distinct(StringComparer.Ordinal).Order(StringComparer.Ordinal)];
    }

    private string? HolderOf(Sighting name) => session.Rows<Row>(SelectHolders, new { inbox = name.Inbox, path = name.Path })
        .Select(row => row.ToSighting())
        .OrderByDescending(sighting => sighting.Latest)
        .ThenByDescending(sighting => sighting.Since)
        .ThenByDescending(sighting => sighting.Sha, StringComparer.Ordinal)
        .FirstOrDefault()?.Sha;

    /// <summary>The inboxes in which a person's latest recording was seen, sorted; empty without one.</summary>
    public IReadOnlyList<string> InboxesOfLatest(string person) => session.Rows<string>(SelectInboxesOfLatest, new { person });

    /// <summary>When each recording, and each date of a table's sessions and sets, of a person was seen first; in no order.</summary>
    /// <param name="from">First date, or the one before it.</param>
    public IReadOnlyList<FirstSight> FirstOfDates(string person, LocalDate from) => session
        .Rows<FirstRow>(SelectFirstOfDates, new { person, from, start = from.AtMidnight().InUtc().ToInstant() })
        .ConvertAll(row => new FirstSight(row.Date, row.Start, Offset.FromSeconds(row.LocalOffsetSeconds), row.FirstSeen));

    /// <summary>When a name was last seen with a content that was new there; null where nothing ever came.</summary>
    public Instant? Newest() => session.Row<MomentRow>(SelectNewest)?.FirstSeen;

    /// <summary>When the arrival came that has been waiting longest; null where none waits.</summary>
    public Instant? OldestWaiting() => session.Row<MomentRow>(SelectOldestWaiting)?.FirstSeen;

    private sealed class FirstRow
    {
        public Instant? Start { get; init; }

        public int LocalOffsetSeconds { get; init; }

        public LocalDate? Date { get; init; }

        public Instant FirstSeen { get; init; }
    }

    private sealed class MomentRow
    {
        public Instant FirstSeen { get; init; }
    }

    private sealed class Row
    {
        public string Inbox { get; init; } = "";

        public string Path { get; init; } = "";

        public string Sha { get; init; } = "";

        public Instant FirstSeen { get; init; }

        public long Size { get; init; }

        public long Mtime { get; init; }

        public string FileId { get; init; } = "";

        public long Latest { get; init; }

        public Instant Since { get; init; }

        public Sighting ToSighting() => new(Inbox, Path, Sha, FirstSeen, new FileStamp(Size, Mtime, FileId), Latest == 1, Since);
    }
}
