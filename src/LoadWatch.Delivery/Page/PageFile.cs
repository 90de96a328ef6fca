using System.Text;
using LoadWatch.Notices;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Delivery.Page;

/// <summary>
/// The page on disk: <c>ada.html</c> is always the newest, <c>ada-2026-03-01.html</c> the one of a decided notice. A reader meets the old page or the new
/// one, never half of one: it is written aside and renamed. <c>ada~past.html</c> lists those that are there; no id can hold the tilde. Only the page of a notice is flushed to the disk, since it counts as delivered; the newest one is
/// written again by the next sweep that follows a power cut.
/// </summary>
public sealed class PageFile(string folder) : INoticeChannel
{
    private const int NameAtMost = 100;

    public string Name => "page";

    public ChannelOutcome Deliver(Notice notice, string recipient)
    {
        if (!IsFileName(notice.ContactId))
        {
            return NoFileName;
        }

        return PrivateFolder.Use(folder, () =>
        {
            Replace(Path.Combine(folder, DatedName(notice.ContactId, notice.Date)), notice.Html, flush: true);
            if (!HasLater(folder, notice))
            {
                Replace(Path.Combine(folder, notice.ContactId + ".html"), notice.Html, flush: false);
            }

            WritePast(folder, notice.ContactId);
        });
    }

    /// <summary>Rewrites a contact's newest page.</summary>
    public static ChannelOutcome Write(string folder, string contactId, string html)
    {
        if (!IsFileName(contactId))
        {
            return NoFileName;
        }

        return PrivateFolder.Use(folder, sync: false, work: () =>
        {
            Replace(Path.Combine(folder, contactId + ".html"), html, flush: false);
            if (!File.Exists(Path.Combine(folder, PastName(contactId))))
            {
                WritePast(folder, contactId);
            }
        });
    }

    /// <summary>Name of the list of a contact's pages.</summary>
    internal static string PastName(string contactId) => $"{contactId}~past.html";

    private static void WritePast(string folder, string contactId) =>
        Replace(Path.Combine(folder, PastName(contactId)), PastPages.Render(folder, contactId), flush: false);

    private static ChannelOutcome NoFileName => ChannelOutcome.Failed(
        $"the contact's id cannot name a file: up to {NameAtMost} of the letters a to z, digits, dash, underscore and dot, "
        + "beginning with a letter or digit");

    private static string DatedName(string contactId, LocalDate date) => $"{contactId}-{LocalDatePattern.Iso.Format(date)}.html";

    /// <summary>A notice that got through late does not cover a younger page.</summary>
    private static bool HasLater(string folder, Notice notice) => Directory
        .EnumerateFiles(folder, $"{notice.ContactId}-????-??-??.html")
        .Any(path => string.CompareOrdinal(Path.GetFileName(path), DatedName(notice.ContactId, notice.Date)) > 0);

    private static void Replace(string path, string html, bool flush)
    {
        var aside = path + ".part";
        File.Delete(aside);
        using (var file = new FileStream(aside, PrivateFolder.Options(FileMode.CreateNew, FileAccess.Write)))
        {
            file.Write(Encoding.UTF8.GetBytes(html));
            file.Flush(flushToDisk: flush);
        }

        File.Move(aside, path, overwrite: true);
    }

    private static bool IsFileName(string id) =>
        id.Length is > 0 and <= NameAtMost
        && char.IsAsciiLetterOrDigit(id[0])
        && id.All(letter => char.IsAsciiLetterOrDigit(letter) || letter is '-' or '_' or '.');
}
