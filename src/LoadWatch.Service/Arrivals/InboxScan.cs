using System.IO.Enumeration;
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

    private static readonly EnumerationOptions Options = new()
    {
        RecurseSubdirectories = true,
        MaxRecursionDepth = 16,
        IgnoreInaccessible = true,
        AttributesToSkip = FileAttributes.ReparsePoint | FileAttributes.Hidden | FileAttributes.System,
        ReturnSpecialDirectories = false,
    };

    /// <summary>Looks at each file, in the order in which the system lists them; false when the folder itself cannot be listed.</summary>
    /// <param name="each">Gets the path below the inbox, <c>/</c> between folders, and the absolute one. They are gone with the call: a folder may hold a
    /// million files that nothing has to be kept of.</param>
    /// <param name="eachFolder">Gets each folder that is looked into, or would be if it could, by its absolute path.</param>
    public static bool TryEach(Inbox inbox, SeenPath each, Action<string>? eachFolder = null)
    {
        try
        {
            if (!Directory.Exists(inbox.Path))
            {
                return false;
            }

            using var files = new Walk(Path.TrimEndingDirectorySeparator(inbox.Path), each, eachFolder);
            while (files.MoveNext())
            {
            }

            return true;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return false;
        }
    }

    /// <summary>Whether any file is in it; false also when the folder itself cannot be listed.</summary>
    public static bool HoldsFiles(Inbox inbox)
    {
        try
        {
            using var files = new Walk(Path.TrimEndingDirectorySeparator(inbox.Path), (_, _) => { }, endsAtFirst: true);
            return Directory.Exists(inbox.Path) && files.MoveNext();
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return false;
        }
    }

    /// <summary>False for hidden files, lock files of office programs and names of copies under way.</summary>
    public static bool IsFinished(ReadOnlySpan<char> name)
    {
        foreach (var ending in Unfinished)
        {
            if (name.EndsWith(ending, StringComparison.OrdinalIgnoreCase))
            {
                return false;
            }
        }

        return !name.StartsWith(".") && !name.StartsWith("~$");
    }

    /// <summary>Everything happens while it walks; it lists nothing.</summary>
    private sealed class Walk(string root, SeenPath each, Action<string>? eachFolder = null, bool endsAtFirst = false) : FileSystemEnumerator<bool>(root, Options)
    {
        private char[] path = new char[1024];

        protected override bool ShouldIncludeEntry(ref FileSystemEntry entry)
        {
            if (!entry.IsDirectory && IsFinished(entry.FileName))
            {
                Look(ref entry);
                return endsAtFirst;
            }

            return false;
        }

        protected override bool ShouldRecurseIntoEntry(ref FileSystemEntry entry)
        {
            if (entry.FileName.StartsWith("."))
            {
                return false;
            }

            eachFolder?.Invoke(entry.ToFullPath());
            return true;
        }

        protected override bool TransformEntry(ref FileSystemEntry entry) => false;

        /// <summary>The full path is written once; the path below the inbox is its end.</summary>
        private void Look(ref FileSystemEntry entry)
        {
            var length = entry.Directory.Length + 1 + entry.FileName.Length;
            if (path.Length < length)
            {
                path = new char[2 * length];
            }

            entry.Directory.CopyTo(path);
            path[entry.Directory.Length] = Path.DirectorySeparatorChar;
            entry.FileName.CopyTo(path.AsSpan(entry.Directory.Length + 1));
            var full = path.AsSpan(0, length);
            ReadOnlySpan<char> below = full[(entry.RootDirectory.Length + (Path.EndsInDirectorySeparator(entry.RootDirectory) ? 0 : 1))..];
            if (Path.DirectorySeparatorChar == '\\')
            {
                below = below.ToString().Replace('\\', '/');
            }

            each(below, full);
        }
    }
}

/// <param name="path">Below the inbox, <c>/</c> between folders.</param>
/// <param name="fullPath">Absolute.</param>
public delegate void SeenPath(ReadOnlySpan<char> path, ReadOnlySpan<char> fullPath);
