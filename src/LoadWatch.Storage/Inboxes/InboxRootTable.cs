namespace LoadWatch.Storage.Inboxes;

/// <summary>Table <c>inbox_root</c>: which folder an inbox was when it was looked into last, so that an empty mount point is not taken for it.</summary>
public sealed class InboxRootTable
{
    /// <summary>Of <c>held_entries</c>; 0 is nothing at all.</summary>
    private const int Files = 1;
    private const int FoldersAlone = 2;

    private const string Upsert = """
        INSERT INTO inbox_root (inbox, path, folder_id, held_entries) VALUES (@inbox, @Path, @FolderId, @held)
        ON CONFLICT (inbox) DO UPDATE SET path = excluded.path, folder_id = excluded.folder_id, held_entries = excluded.held_entries
        """;

    private const string Select = "SELECT path, folder_id, held_entries FROM inbox_root WHERE inbox = @inbox";

    private readonly StoreSession session;

    internal InboxRootTable(StoreSession session) => this.session = session;

    /// <summary>Null for an inbox that was never looked into.</summary>
    public InboxRoot? Of(string inbox) => session.Row<Row>(Select, new { inbox }) is { } row ? new InboxRoot(row.Path, row.FolderId, row.HeldEntries != 0, row.HeldEntries == Files) : null;

    public void Put(string inbox, InboxRoot root) => session.Execute(Upsert, new { inbox, root.Path, root.FolderId, held = root.HeldFiles ? Files : root.HeldEntries ? FoldersAlone : 0 });

    private sealed class Row
    {
        public string Path { get; init; } = "";

        public string FolderId { get; init; } = "";

        public long HeldEntries { get; init; }
    }
}

/// <param name="Path">Absolute, as configured then.</param>
/// <param name="FolderId">Device and inode: another one where the folder was made anew or something is mounted over it.</param>
/// <param name="HeldEntries">Whether anything lay in it, a folder of a person too.</param>
/// <param name="HeldFiles">Whether a file lay in it; true also where that is not looked at, since taking empties it.</param>
public sealed record InboxRoot(string Path, string FolderId, bool HeldEntries, bool HeldFiles);
