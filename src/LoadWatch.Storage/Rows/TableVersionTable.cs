using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>A content that is a version of a table.</summary>
/// <param name="Scope">The table: inbox and file name, or inbox, folder and layout.</param>
/// <param name="Path">The name under which it was seen, below its inbox.</param>
/// <param name="Since">When it was seen there, or seen there again after another content.</param>
/// <param name="Owner">Id of the person whose file it is, or null.</param>
public sealed record TableVersion(string Scope, string Path, string Sha, Instant Since, string? Owner);

/// <summary>Tables <c>table_content</c> and <c>table_version</c>: which contents are tables, and which versions have given their rows.</summary>
public sealed class TableVersionTable
{
    private const string UpsertContent = """
        INSERT INTO table_content (sha, layout, named_by_folder) VALUES (@sha, @layout, @namedByFolder)
        ON CONFLICT (sha) DO UPDATE SET layout = excluded.layout, named_by_folder = excluded.named_by_folder
        """;

    private const string DeleteContent = "DELETE FROM table_content WHERE sha = @sha";

    // A table named by its folder: the path without whatever follows its last slash, which is all that is no slash at its end.
    private const string AllSeen = """
        SELECT
            CASE c.named_by_folder
                WHEN 1 THEN s.inbox || '/' || rtrim(s.path, replace(s.path, '/', '')) || '|' || c.layout
                ELSE s.inbox || '/' || s.path
            END AS scope,
            s.path, s.sha, s.since, a.person AS owner
        FROM table_content c JOIN sighting s ON s.sha = c.sha JOIN arrival a ON a.sha = c.sha
        """;

    private const string AllApplied = "SELECT scope, path, sha, since, owner FROM table_version";
    private const string SelectSeen = $"SELECT * FROM ({AllSeen}) AS seen WHERE scope = @scope";
    private const string SelectApplied = $"{AllApplied} WHERE scope = @scope";

    private const string SelectChanged = $"""
        SELECT scope FROM ({AllSeen} EXCEPT {AllApplied}) AS more
        UNION SELECT scope FROM ({AllApplied} EXCEPT {AllSeen}) AS fewer
        ORDER BY scope
        """;

    private const string DeleteApplied = "DELETE FROM table_version WHERE scope = @scope";
    private const string InsertApplied = "INSERT INTO table_version (scope, path, sha, since, owner) VALUES (@Scope, @Path, @Sha, @Since, @Owner)";

    // Like no version that is seen, so that all of them are taken anew.
    private const string Outdate = "UPDATE table_version SET owner = '?'";

    private readonly StoreSession session;

    internal TableVersionTable(StoreSession session) => this.session = session;

    /// <summary>Notes that a stored content is a table.</summary>
    public void Note(string sha, string layout, bool namedByFolder) =>
        session.Execute(UpsertContent, new { sha, layout, namedByFolder = namedByFolder ? 1 : 0 });

    /// <summary>A content that is no table any more, as another layout reads it.</summary>
    public void Forget(string sha) => session.Execute(DeleteContent, new { sha });

    /// <summary>The tables of which other versions are seen than are applied, sorted.</summary>
    public IReadOnlyList<string> Changed() => session.Rows<string>(SelectChanged);

    /// <summary>Every version of a table, under each of its names, in the order in which they count.</summary>
    public IReadOnlyList<TableVersion> Seen(string scope) => InOrder(session.Rows<Row>(SelectSeen, new { scope }));

    /// <summary>Those whose rows are in, in the order in which they were taken.</summary>
    public IReadOnlyList<TableVersion> Applied(string scope) => InOrder(session.Rows<Row>(SelectApplied, new { scope }));

    public void SetApplied(string scope, IReadOnlyList<TableVersion> versions)
    {
        session.Execute(DeleteApplied, new { scope });
        session.ExecuteEach(InsertApplied, versions);
    }

    /// <summary>Asks for the rows of every table anew, from all of its versions; those that stand stay until then.</summary>
    public void ReplayAll() => session.Execute(Outdate);

    private static List<TableVersion> InOrder(IEnumerable<Row> rows) =>
    [
        .. rows
            .Select(row => new TableVersion(row.Scope, row.Path, row.Sha, row.Since, row.Owner))
            .OrderBy(version => version.Since)
            .ThenBy(version => version.Path, StringComparer.Ordinal)
            .ThenBy(version => version.Sha, StringComparer.Ordinal),
    ];

    private sealed class Row
    {
        public string Scope { get; init; } = "";

        public string Path { get; init; } = "";

        public string Sha { get; init; } = "";

        public Instant Since { get; init; }

        public string? Owner { get; init; }
    }
}
