using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>Finds the files that a sweep has to look into: all that are new or whose stamp differs from the one they were taken with, and all that are still to go.</summary>
public static class Inboxes
{
    /// <summary>
    /// Changed files in the order of the inboxes and, within each, of their paths. Inboxes that are not available are reported, and nothing of them is forgotten.
    /// </summary>
    public static IReadOnlyList<(FoundFile File, FileStamp Stamp)> Changed(
        WorkingConfiguration configuration, Store store, InboxLooks looks, KnownFiles known, Instant now, SweepReport report)
    {
        var found = looks.Run(configuration, store, known, report.Advanced);
        report.Take(found);
        Remember(store, found, now);
        return [.. found.SelectMany(look => look.Changed)];
    }

    /// <summary>Lists one inbox. Runs on a thread of its own, since it may never return.</summary>
    /// <param name="progress">Called for every file.</param>
    /// <returns>Null when the folder cannot be listed.</returns>
    public static InboxLook? Look(Inbox inbox, KnownInbox known, Action progress)
    {
        var listing = new InboxListing(inbox, known, progress);
        return InboxScan.TryEach(inbox, listing.AddFile, listing.AddFolder) ? listing.Look : null;
    }

    /// <summary>Which folder each inbox is; written only where that changed.</summary>
    private static void Remember(Store store, IReadOnlyList<InboxLook> looks, Instant now)
    {
        var changed = store.Read(session => looks.Where(look => look.Root is not null && session.InboxRoots.Of(look.Inbox.Name) != look.Root).ToList());
        if (changed.Count > 0)
        {
            store.Write(session => changed.ForEach(look => Remember(session, look, now)));
        }
    }

    private static void Remember(StoreSession session, InboxLook look, Instant now)
    {
        session.InboxRoots.Put(look.Inbox.Name, look.Root!);
        if (look.IsReplaced)
        {
            session.Audits.Add("inbox_replaced", look.Inbox.Name, now);
        }
    }

    /// <summary>Makes one sub-folder per person in every inbox that can be written, so that a new user sees where files go.</summary>
    /// <returns>The folders that were made.</returns>
    public static IReadOnlyList<string> MakePersonFolders(WorkingConfiguration configuration) =>
        [.. configuration.Inboxes.Where(inbox => Directory.Exists(inbox.Path)).SelectMany(inbox => MakePersonFolders(inbox, configuration))];

    /// <inheritdoc cref="MakePersonFolders(WorkingConfiguration)"/>
    public static IReadOnlyList<string> MakePersonFolders(Inbox inbox, WorkingConfiguration configuration)
    {
        var made = new List<string>();
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
}
