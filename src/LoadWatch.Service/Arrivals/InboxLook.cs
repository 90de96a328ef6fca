using LoadWatch.Service.Configuration;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Inboxes;

namespace LoadWatch.Service.Arrivals;

/// <summary>What one look into an inbox found.</summary>
/// <param name="Root">The folder as it is now; null where the inbox is not available.</param>
/// <param name="Away">Why the inbox is not available, in plain words; null where it is.</param>
/// <param name="Seen">Files in it, count.</param>
/// <param name="Changed">Files that are new, changed, or still to go, in ordinal order of their paths.</param>
/// <param name="Unreadable">Names that are not UTF-8, as far as they can be shown: the system cannot be asked for them.</param>
public sealed record InboxLook(
    Inbox Inbox, InboxRoot? Root, string? Away, int Seen, IReadOnlyList<(FoundFile File, FileStamp Stamp)> Changed, IReadOnlyList<string> Unreadable)
{
    /// <summary>Whether another folder than before stands there, and is looked into all the same.</summary>
    public bool IsReplaced { get; init; }

    /// <summary>Folders that this service has no right to look into.</summary>
    public IReadOnlyList<string> Closed { get; init; } = [];

    public static InboxLook NotAvailable(Inbox inbox, string reason) => new(inbox, null, reason, 0, [], []);
}
