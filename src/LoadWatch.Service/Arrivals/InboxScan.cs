using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Arrivals;

/// <summary>One file found by a scan.</summary>
/// <param name="Path">Below the inbox, <c>/</c> between folders.</param>
/// <param name="FullPath">Absolute.</param>
public sealed record FoundFile(Inbox Inbox, string Path, string FullPath);

/// <summary>Lists an inbox: the scan is the truth, events only wake it. Follows no links; names that mean "not finished" are passed over.</summary>
public static class InboxScan
{
    private static readonly string[] Unfinished = [".tmp", ".part", ".partial", ".crdownload", ".download"];

    internal static readonly EnumerationOptions Options = new()
    {
        RecurseSubdirectories = true,
        MaxRecursionDepth = 16,
        IgnoreInaccessible = true,
        AttributesToSkip = FileAttributes.ReparsePoint | FileAttributes.Hidden | FileAttributes.System,
        ReturnSpecialDirectories = false,
    };

    /// <summary>Files in ordinal order of their paths; null when the folder itself cannot be listed.</summary>
    public static IReadOnlyList<FoundFile>? List(Inbox inbox)
    {
        try
        {
            if (!Directory.Exists(inbox.Path))
            {
                return null;
            }

            return Directory.EnumerateFiles(inbox.Path, "*", Options)
                .Select(full => new FoundFile(inbox, Path.GetRelativePath(inbox.Path, full).Replace('\\', '/'), full))
                .Where(file => IsFinished(file.Path))
                .OrderBy(file => file.Path, StringComparer.Ordinal)
                .ToList();
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }

    /// <summary>False for hidden files and folders, lock files of office programs and names of copies under way.</summary>
    public static bool IsFinished(string path)
    {
        var name = path[(path.LastIndexOf('/') + 1)..];
        return !path.Split('/').Any(part => part.StartsWith('.'))
            && !name.StartsWith("~$", StringComparison.Ordinal)
            && !Unfinished.Any(ending => name.EndsWith(ending, StringComparison.OrdinalIgnoreCase));
    }
}
