using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the files that a sweep has to look into: all that are new or whose stamp differs from the one they were taken with, and all that are still to go.</summary>
public static class Inboxes
{
    /// <summary>Changed files in the order of the inboxes and their paths.</summary>
    public static IReadOnlyList<(FoundFile File, FileStamp Stamp)> Changed(WorkingConfiguration configuration, Store store, SweepReport report)
    {
        var changed = new List<(FoundFile, FileStamp)>();
        foreach (var inbox in configuration.Inboxes)
        {
            if (InboxScan.List(inbox) is not { } files)
            {
                report.MissingInboxes.Add(inbox.Name);
                continue;
            }

            var known = store.Read(session => session.Sightings.Latest(inbox.Name));
            report.Seen += files.Count;
            foreach (var file in files)
            {
                // No stamp: gone again, or a pipe or link that intake never takes.
                if (SafeFile.StampOf(file.FullPath) is { } stamp && (IsToGo(inbox) || !IsTaken(known, file, stamp)))
                {
                    changed.Add((file, stamp));
                }
            }
        }

        return changed;
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

    private static bool IsTaken(IReadOnlyDictionary<string, Sighting> known, FoundFile file, FileStamp stamp) =>
        known.TryGetValue(file.Path, out var last) && last.Stamp == stamp;
}
