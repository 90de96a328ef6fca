using LoadWatch.Service.Configuration;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>What one walk through an inbox comes upon.</summary>
/// <param name="progress">Called for every file.</param>
internal sealed class InboxListing(Inbox inbox, KnownInbox known, Action progress)
{
    private readonly List<(FoundFile File, FileStamp Stamp)> changed = [];
    private readonly List<string> unreadable = [];
    private readonly List<string> closed = [];
    private int seen;

    public InboxLook Look => new(
        inbox, null, null, seen, [.. changed.OrderBy(found => found.File.Path, StringComparer.Ordinal)], [.. unreadable.Order(StringComparer.Ordinal)])
    {
        Closed = [.. closed.Order(StringComparer.Ordinal)],
    };

    public void AddFile(ReadOnlySpan<char> path, ReadOnlySpan<char> fullPath)
    {
        progress();
        if (path.SequenceEqual(inbox.Marker))
        {
            return;
        }

        seen++;
        var stamp = SafeFile.StampOf(fullPath);
        if (stamp is not null && (IsToGo || !known.Has(path, stamp)))
        {
            changed.Add((new FoundFile(inbox, path.ToString(), fullPath.ToString()), stamp));
        }

        // No stamp: gone again, or a pipe or link that intake never takes, or a name whose bytes were lost on the way into a string.
        if (stamp is null && UnreadableNames.IsOne(path))
        {
            unreadable.Add(path.ToString());
        }
    }

    public void AddFolder(string fullPath)
    {
        if (UnreadableNames.IsOneOfFolder(fullPath))
        {
            unreadable.Add(Below(fullPath));
        }
        else if (!SafeFile.MayEnter(fullPath))
        {
            closed.Add(Below(fullPath));
        }
    }

    /// <summary>What still stands in such an inbox is taken again, known or not: the process may have ended between its effects and its removal.</summary>
    private bool IsToGo => inbox.Take == TakeMode.Move;

    private string Below(string fullPath) => Path.GetRelativePath(inbox.Path, fullPath).Replace(Path.DirectorySeparatorChar, '/');
}
