using LoadWatch.Notices;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Names whose bytes are not UTF-8. The runtime puts a mark in place of each such byte, and then there is no file of the name it gives: it can be counted and
/// told, not opened.
/// </summary>
public static class UnreadableNames
{
    private const char Lost = '\uFFFD';

    public static bool IsOne(ReadOnlySpan<char> path) => path.Contains(Lost);

    /// <summary>Whether a folder is out of reach for its name, so that the scan cannot go into it.</summary>
    public static bool IsOneOfFolder(string path) => IsOne(path) && SafeFile.FolderId(path) is null;

    /// <summary>One line for all of an inbox.</summary>
    public static BriefLine Line(InboxLook look)
    {
        var more = look.Unreadable.Count == 1 ? "" : $", and {look.Unreadable.Count - 1} more like it in the inbox \"{look.Inbox.Name}\"";
        return new BriefLine(look.Unreadable[0], $"unreadable name: it is not UTF-8, so the file cannot be opened; rename it{more}");
    }
}
