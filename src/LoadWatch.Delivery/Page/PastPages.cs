using System.Globalization;
using System.Net;
using System.Text;
using System.Text.RegularExpressions;
using LoadWatch.Notices;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Delivery.Page;

/// <summary>The list of a contact's dated pages, the newest first, each with its first line. It says what is there: who removes old pages shortens it.</summary>
internal static partial class PastPages
{
    /// <summary>The first line stands in a page's head, within so many bytes.</summary>
    private const int HeadBytes = 4096;

    private static readonly LocalDatePattern Month = LocalDatePattern.Create("MMMM uuuu", CultureInfo.InvariantCulture);
    private static readonly LocalDatePattern Day = LocalDatePattern.Create("dddd d MMMM", CultureInfo.InvariantCulture);
    private static readonly LiquidTemplate Template = new("Page.past");

    /// <exception cref="IOException">The folder or a page cannot be read.</exception>
    public static string Render(string folder, string contactId)
    {
        var pages = Directory.EnumerateFiles(folder, $"{contactId}-????-??-??.html")
            .Select(path => (Path: path, Date: LocalDatePattern.Iso.Parse(Path.GetFileNameWithoutExtension(path)[(contactId.Length + 1)..])))
            .Where(page => page.Date.Success)
            .Select(page => (page.Path, Date: page.Date.Value))
            .OrderByDescending(page => page.Date);
        var months = pages
            .GroupBy(page => page.Date.ToYearMonth())
            .Select(month => new PastMonth(
                Month.Format(month.Key.OnDayOfMonth(1)),
                [.. month.Select(page => new PastBrief(Path.GetFileName(page.Path), Day.Format(page.Date), FirstLine(page.Path)))]));
        return Template.Render(new PastModel(contactId + ".html", [.. months]));
    }

    /// <summary>Null for a page of before the first line stood in its head.</summary>
    private static string? FirstLine(string path)
    {
        using var file = new FileStream(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite | FileShare.Delete);
        var head = new byte[HeadBytes];
        var length = file.ReadAtLeast(head, HeadBytes, throwOnEndOfStream: false);
        var found = Description().Match(Encoding.UTF8.GetString(head, 0, length));
        return found.Success ? OneLine.Of(WebUtility.HtmlDecode(found.Groups["line"].Value)) : null;
    }

    [GeneratedRegex("<meta name=\"description\" content=\"(?<line>[^\"<>]*)\">", RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture | RegexOptions.NonBacktracking)]
    private static partial Regex Description();
}

/// <param name="Newest">File of the contact's newest page.</param>
internal sealed record PastModel(string Newest, IReadOnlyList<PastMonth> Months);

internal sealed record PastMonth(string Heading, IReadOnlyList<PastBrief> Briefs);

/// <param name="Line">The brief's first line, or null.</param>
internal sealed record PastBrief(string File, string Date, string? Line);
