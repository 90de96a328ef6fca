namespace LoadWatch.Service.Schedule;

/// <summary>Listens to folders. Events are hints: a handler only sets a flag, so that a flood of them costs nothing.</summary>
/// <param name="failed">Is told why a folder cannot be listened to; the scan finds its files all the same.</param>
public sealed class FolderEvents(Action<string> failed) : IDisposable
{
    private readonly Dictionary<WatchedFolder, FileSystemWatcher?> watchers = [];
    private int stirred;

    /// <summary>Listens to these folders from now on. One that is another folder than before under its path sends no event of it: it is listened to anew.</summary>
    public void Follow(IEnumerable<WatchedFolder> folders)
    {
        var wanted = folders.ToHashSet();
        foreach (var gone in watchers.Keys.Where(known => !wanted.Contains(known)).ToList())
        {
            watchers.Remove(gone, out var watcher);
            watcher?.Dispose();
        }

        foreach (var folder in wanted.Where(folder => !watchers.ContainsKey(folder)))
        {
            watchers[folder] = Watch(folder.Path);
        }
    }

    /// <summary>Whether any folder stirred since the last call.</summary>
    public bool HaveStirred() => Interlocked.Exchange(ref stirred, 0) == 1;

    public void Dispose()
    {
        foreach (var watcher in watchers.Values)
        {
            watcher?.Dispose();
        }

        watchers.Clear();
    }

    private void Stir() => Volatile.Write(ref stirred, 1);

    private FileSystemWatcher? Watch(string path)
    {
        try
        {
            var watcher = new FileSystemWatcher(path) { IncludeSubdirectories = true };
            watcher.Created += (_, _) => Stir();
            watcher.Changed += (_, _) => Stir();
            watcher.Renamed += (_, _) => Stir();
            watcher.Error += (_, _) => Stir();
            watcher.EnableRaisingEvents = true;
            return watcher;
        }
        catch (Exception e) when (e is IOException or ArgumentException or UnauthorizedAccessException)
        {
            failed(e.Message);
            return null;
        }
    }
}

/// <param name="FolderId">Device and inode.</param>
public sealed record WatchedFolder(string Path, string FolderId);
