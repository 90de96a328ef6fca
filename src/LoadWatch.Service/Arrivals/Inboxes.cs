using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the files that a sweep has to look into: all that are new or whose stamp differs from the one they were taken with, and all that are still to go.</summary>
public static class Inboxes
{
    /// <summary>Changed files in the order of the inboxes and, within each, of their paths.</summary>
    public static IReadOnlyList<(FoundFile File, FileStamp Stamp)> Changed(WorkingConfiguration configuration, Store store, KnownFiles known, SweepReport report)
    {
        var changed = new List<(FoundFile File, FileStamp Stamp)>();
        foreach (var inbox in configuration.Inboxes)
        {
            var ofInbox = new List<(FoundFile File, FileStamp Stamp)>();
            if (!Look(inbox, known.Of(inbox.Name, store), ofInbox, report))
            {
                report.MissingInboxes.Add(inbox.Name);
                continue;
            }

            changed.AddRange(ofInbox.OrderBy(found => found.File.Path, StringComparer.Ordinal));
        }

        return changed;
    }

    private static bool Look(Inbox inbox, KnownInbox known, List<(FoundFile File, FileStamp Stamp)> changed, SweepReport report)
    {
        var seen = 0;
        var isThere = InboxScan.TryEach(inbox, (path, fullPath) =>
        {
            seen++;

            // No stamp: gone again, or a pipe or link that intake never takes.
            if (SafeFile.StampOf(fullPath) is { } stamp && (IsToGo(inbox) || !known.Has(path, stamp)))
            {
                changed.Add((new FoundFile(inbox, path.ToString(), fullPath.ToString()), stamp));
            }
        });
        report.Seen += isThere ? seen : 0;
        return isThere;
    }

    /// <summary>Makes one sub-folder per person in every inbox that can be written, so that a new user sees where files go.</summary>
    /// <returns>The folders that were made.</returns>
    public static IReadOnlyList<string> MakePersonFolders(WorkingConfiguration configuration)
    {
        var made = new List<string>();
        foreach (var inbox in configuration.Inboxes.Where(inbox => Directory.Exists(inbox.Path)))
        {
            try
            {
                foreach (var folder in Missing(inbox, configuration))
                {
                    made.Add(Directory.CreateDirectory(folder).FullName);
                    LetInWhoMayDrop(inbox.Path, folder);
                }
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                // A read-only share: its owner makes the folders.
            }
        }

        return made;
    }

    /// <summary>A folder written in another case is the person's folder too.</summary>
    private static List<string> Missing(Inbox inbox, WorkingConfiguration configuration)
    {
        var there = Directory.EnumerateDirectories(inbox.Path).Select(Path.GetFileName).ToHashSet(StringComparer.OrdinalIgnoreCase);
        return configuration.People.Values
            .Where(person => !there.Contains(person.Id))
            .Select(person => Path.Combine(inbox.Path, person.Id))
            .ToList();
    }

    /// <summary>This process keeps what it makes to itself (I-12); an inbox is for others, so its folders are as open as it is.</summary>
    private static void LetInWhoMayDrop(string inbox, string folder)
    {
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(folder, File.GetUnixFileMode(inbox));
        }
    }

    /// <summary>What still stands in such an inbox is taken again, known or not: the process may have ended between its effects and its removal.</summary>
    private static bool IsToGo(Inbox inbox) => inbox.Take == TakeMode.Move;
}
