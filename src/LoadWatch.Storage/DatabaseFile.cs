using LoadWatch.Storage.Files;

namespace LoadWatch.Storage;

/// <summary>
/// Notices that the file of the open database, or its write-ahead log, was deleted or replaced. The system keeps an open file alive without a name: commits
/// would still succeed, into nothing.
/// </summary>
internal sealed class DatabaseFile(string path)
{
    private readonly string? id = IdOf(path);
    private string? logId;

    /// <summary>Bytes of the write-ahead log, as of the last commit.</summary>
    public long LogBytes { get; private set; }

    /// <exception cref="DurabilityLostException">The name no longer leads to what is open.</exception>
    public void Check()
    {
        if (IdOf(path) != id || (logId is not null && IdOf(LogPath) != logId))
        {
            throw new DurabilityLostException($"{path} was deleted or replaced while it was in use");
        }
    }

    /// <summary>To be called after a commit: the log is there then, and stays while the database is open.</summary>
    public void NoteLog()
    {
        var log = SafeFile.StampOf(LogPath);
        logId ??= log?.FileId;
        LogBytes = log?.Size ?? 0;
    }

    private string LogPath => path + "-wal";

    private static string? IdOf(string path) => SafeFile.StampOf(path)?.FileId;
}
