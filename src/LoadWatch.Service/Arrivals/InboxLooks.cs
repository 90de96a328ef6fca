using System.Collections.Concurrent;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Inboxes;

namespace LoadWatch.Service.Arrivals;

/// <summary>Looks into the inboxes, sweep after sweep; lives as long as the process, because a look that hangs does.</summary>
public sealed class InboxLooks(TimeSpan patience)
{
    /// <summary>A share that is being mounted on demand may need half a minute.</summary>
    public static readonly TimeSpan Patience = TimeSpan.FromSeconds(60);

    private readonly HangGuard guard = new(patience);
    private readonly ConcurrentDictionary<string, InboxRoot> roots = new(StringComparer.Ordinal);

    public InboxLooks()
        : this(Patience)
    {
    }

    /// <summary>The folder of an inbox as the last look found it; null where the inbox is not available.</summary>
    public InboxRoot? RootOf(string inbox) => roots.GetValueOrDefault(inbox);

    /// <param name="known">Files that were taken as they stand now.</param>
    /// <param name="advanced">Called while the looks get on.</param>
    /// <returns>One look an inbox, in their order.</returns>
    public IReadOnlyList<InboxLook> Run(WorkingConfiguration configuration, Store store, KnownFiles known, Action advanced)
    {
        var inboxes = configuration.Inboxes.ToDictionary(inbox => inbox.Name, StringComparer.Ordinal);
        var looks = guard.Run(
            [.. inboxes.Keys],
            (name, progress) => Look(inboxes[name], configuration, store, known, progress),
            advanced);
        return [.. configuration.Inboxes.Zip(looks).Select(pair => Noted(pair.Second ?? InboxLook.NotAvailable(pair.First, "it does not answer: its share or disk hangs")))];
    }

    private InboxLook Noted(InboxLook look)
    {
        if (look.Root is { } root)
        {
            roots[look.Inbox.Name] = root;
        }
        else
        {
            roots.TryRemove(look.Inbox.Name, out _);
        }

        return look;
    }

    private static InboxLook Look(Inbox inbox, WorkingConfiguration configuration, Store store, KnownFiles files, Action progress)
    {
        var before = store.Read(session => session.InboxRoots.Of(inbox.Name));
        var known = inbox.Take == TakeMode.Move ? new KnownInbox() : files.Of(inbox.Name, store);
        try
        {
            if (AwayNow(inbox, before, known, progress) is { } reason)
            {
                return InboxLook.NotAvailable(inbox, reason);
            }

            Inboxes.MakePersonFolders(inbox, configuration);
            InboxRemoval.PutBack(inbox);
            progress();
            var root = RootNow(inbox);
            return root is not null && Inboxes.Look(inbox, known, progress) is { } found
                ? found with { Root = root with { HeldFiles = root.HeldEntries && (inbox.Take == TakeMode.Move || found.Seen > 0) }, IsReplaced = before is not null && before.FolderId != root.FolderId }
                : InboxLook.NotAvailable(inbox, "its folder cannot be listed");
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return InboxLook.NotAvailable(inbox, "its folder cannot be listed");
        }
    }

    private static string? AwayNow(Inbox inbox, InboxRoot? before, KnownInbox known, Action progress)
    {
        if (RootNow(inbox) is not { } root)
        {
            return "there is no such folder";
        }

        progress();
        return inbox.Marker is { } marker && !Path.Exists(Path.Combine(inbox.Path, marker))
            ? $"its marker \"{marker}\" is not in it: is its share mounted?"
            : InboxDoubt.Of(inbox, before, root.FolderId, !root.HeldEntries, () => !InboxScan.HoldsFiles(inbox), known.Count > 0);
    }

    private static InboxRoot? RootNow(Inbox inbox) => SafeFile.FolderId(inbox.Path) is { } id
        ? new InboxRoot(inbox.Path, id, Directory.EnumerateFileSystemEntries(inbox.Path).Any(), HeldFiles: false)
        : null;
}
