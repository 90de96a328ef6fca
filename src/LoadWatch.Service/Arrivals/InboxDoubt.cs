using LoadWatch.Service.Configuration;
using LoadWatch.Storage.Inboxes;

namespace LoadWatch.Service.Arrivals;

/// <summary>
/// Whether a folder is still the inbox that it was. Where a share is not mounted an empty folder stands in its place, and no event tells: taken for the
/// inbox it would read as "no files, all fine".
/// </summary>
public static class InboxDoubt
{
    /// <summary>Why what is there now is not looked into, or null.</summary>
    /// <param name="before">As it was looked into last; null for never.</param>
    /// <param name="isEmpty">Whether nothing at all lies in it.</param>
    /// <param name="lacksFiles">Whether no file lies in it; asked only where that decides.</param>
    /// <param name="filesAreKnown">Whether files of it were taken in.</param>
    public static string? Of(Inbox inbox, InboxRoot? before, string folderId, bool isEmpty, Func<bool> lacksFiles, bool filesAreKnown)
    {
        if (before is null || before.Path != inbox.Path || before.FolderId == folderId)
        {
            return null;
        }

        // An inbox that is emptied by taking, or was by its users, says nothing when it holds no file; the folders of people in it do.
        var isHollow = (isEmpty && before.HeldEntries) || (inbox.Take == TakeMode.Leave && filesAreKnown && before.HeldFiles && lacksFiles());
        return isHollow
            ? "its folder is another one than before and holds nothing: is its share mounted? Where it was made anew on purpose, the first file in it makes it the inbox"
            : null;
    }
}
