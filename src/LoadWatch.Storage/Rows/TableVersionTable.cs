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

    private const string SelectSeen = """
        SELECT s.inbox, s.path, s.sha, s.since, c.layout, c.named_by_folder, a.person AS owner
        FROM table_content c JOIN sighting s ON s.sha = c.sha JOIN arrival a ON a.sha = c.sha
        """;

    private const string SelectApplied = "SELECT scope, path, sha, since, owner FROM table_version";
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

    /// <summary>Every version of every table, under each of its names, in the order in which they count.</summary>
    public IReadOnlyList<TableVersion> Seen() => InOrder(session.Rows<SeenRow>(SelectSeen).Select(row => row.ToVersion()));

    /// <summary>Those whose rows are in, in the order in which they were taken.</summary>
    public IReadOnlyList<TableVersion> Applied() => InOrder(session.Rows<AppliedRow>(SelectApplied)
        .Select(row => new TableVersion(row.Scope, row.Path, row.Sha, row.Since, row.Owner)));

    public void SetApplied(string scope, IReadOnlyList<TableVersion> versions)
    {
        session.Execute(DeleteApplied, new { scope });
        session.ExecuteEach(InsertApplied, versions);
    }

    /// <summary>Asks for the rows of every table anew, from all of its versions; those that stand stay until then.</summary>
    public void ReplayAll() => session.Execute(Outdate);

    private static List<TableVersion> InOrder(IEnumerable<TableVersion> versions) =>
    [
        .. versions
            .OrderBy(version => version.Scope, StringComparer.Ordinal)
            .ThenBy(version => version.Since)
            .ThenBy(version => version.Path, StringComparer.Ordinal)
            .ThenBy(version => version.Sha, StringComparer.Ordinal),
    ];

    private sealed class SeenRow
    {
        public string Inbox { get; init; } = "";

        public string Path { get; init; } = "";

        public string Sha { get; init; } = "";

        public Instant Since { get; init; }

        public string Layout { get; init; } = "";

        public long NamedByFolder { get; init; }

        public string? Owner { get; init; }

        public TableVersion ToVersion() => new(NamedByFolder == 1 ? $"{Inbox}/{Folder}|{Layout}" : $"{Inbox}/{Path}", Path, Sha, Since, Owner);

        private string Folder => Path[..(Path.LastIndexOf('/') + 1)];
    }

    private sealed class AppliedRow
    {
        public string Scope { get; init; } = "";

        public string Path { get; init; } = "";

        public string Sha { get; init; } = "";

        public Instant Since { get; init; }

        public string? Owner { get; init; }
    }
}
