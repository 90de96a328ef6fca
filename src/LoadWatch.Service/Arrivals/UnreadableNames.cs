using System.IO.Enumeration;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
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

    /// <summary>Folders of such names, which the scan cannot go into.</summary>
    public static IReadOnlyList<string> OfFolders(Inbox inbox) => OperatingSystem.IsLinux()
        ?
        [
            .. new FileSystemEnumerable<string>(inbox.Path, (ref FileSystemEntry entry) => entry.ToFullPath(), InboxScan.Options)
            {
                ShouldIncludePredicate = (ref FileSystemEntry entry) => entry.FileName.Contains(Lost) && entry.IsDirectory,
            }.Where(IsOutOfReach).Select(path => Path.GetRelativePath(inbox.Path, path)).Order(StringComparer.Ordinal),
        ]
        : [];

    /// <summary>One line for all of an inbox.</summary>
    public static BriefLine Line(InboxLook look)
    {
        var more = look.Unreadable.Count == 1 ? "" : $", and {look.Unreadable.Count - 1} more like it in the inbox \"{look.Inbox.Name}\"";
        return new BriefLine(look.Unreadable[0], $"unreadable name: it is not UTF-8, so the file cannot be opened; rename it{more}");
    }

    private static bool IsOutOfReach(string path) => SafeFile.FolderId(path) is null;
}
