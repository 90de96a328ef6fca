using System.Text.RegularExpressions;
using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Page;

/// <summary>The list of a contact's dated pages.</summary>
public sealed partial class PastPagesTests : IDisposable
{
    private readonly DirectoryInfo temporary = Directory.CreateTempSubdirectory("loadwatch-past-");

    [Fact]
    public void TheNewestComesFirstAndEachWithItsFirstLine()
    {
        Deliver("ada", new LocalDate(2026, 2, 28), Page("All quiet: 24 people."));
        Deliver("ada", new LocalDate(2026, 3, 2), Page("1 of 24 to look at."));
        Deliver("ada", new LocalDate(2026, 3, 1), Page("2 & 3 <b>."));

        Assert.Equal(
            [
                "March 2026",
                "ada-2026-03-02.html Monday 2 March 1 of 24 to look at.",
                "ada-2026-03-01.html Sunday 1 March 2 &amp; 3 &lt;b&gt;.",
                "February 2026",
                "ada-2026-02-28.html Saturday 28 February All quiet: 24 people.",
            ],
            Entries("ada"));
    }

    [Fact]
    public void APageWithoutAFirstLineIsListedAllTheSame()
    {
        Deliver("ada", new LocalDate(2026, 3, 1), "<p>of before");

        Assert.Equal(["March 2026", "ada-2026-03-01.html Sunday 1 March "], Entries("ada"));
    }

    [Fact]
    public void APageThatSomebodyRemovedIsNoLongerListed()
    {
        Deliver("ada", new LocalDate(2026, 3, 1), Page("one"));
        File.Delete(At("ada-2026-03-01.html"));
        Deliver("ada", new LocalDate(2026, 3, 2), Page("two"));

        Assert.Equal(["March 2026", "ada-2026-03-02.html Monday 2 March two"], Entries("ada"));
    }

    [Fact]
    public void AnotherContactsPagesAreNotListed()
    {
        Deliver("ada-mae", new LocalDate(2026, 3, 1), Page("theirs"));
        Deliver("ada-aaaa-bb-cc", new LocalDate(2026, 3, 1), Page("theirs"));
        Deliver("ada", new LocalDate(2026, 3, 1), Page("own"));

        Assert.Equal(["March 2026", "ada-2026-03-01.html Sunday 1 March own"], Entries("ada"));
    }

    [Fact]
    public void BeforeTheFirstBriefItSaysSo()
    {
        PageFile.Write(temporary.FullName, "ada", "<p>");

        Assert.Contains("<p>No brief was decided yet.</p>", File.ReadAllText(At("ada~past.html")), StringComparison.Ordinal);
    }

    [Fact]
    public void ThePageLeadsToItAndItLeadsBack()
    {
        Deliver("ada", new LocalDate(2026, 3, 1), PageRenderer.Render(MorningExamples.SquadBrief()));

        Assert.Contains("<a href=\"ada~past.html\">", File.ReadAllText(At("ada.html")), StringComparison.Ordinal);
        Assert.Contains("<a href=\"ada.html\">", File.ReadAllText(At("ada~past.html")), StringComparison.Ordinal);
        Assert.Equal(
            "ada-2026-03-01.html Sunday 1 March 4 of 24 to look at: 2 well above their usual, 1 without heavy or fast leg work, 1 silent. "
                + "1 person without a known day in the last week. 2 questions need an answer.",
            Entries("ada")[1]);
    }

    [Fact]
    public void ItFetchesNothingAndRunsNothing()
    {
        Deliver("ada", new LocalDate(2026, 3, 1), Page("one"));

        var list = File.ReadAllText(At("ada~past.html"));
        Assert.DoesNotMatch("(?i)https?://|<script|<link|<iframe|<img|@import|url\\(| src=", list);
        Assert.Contains("default-src 'none'", list, StringComparison.Ordinal);
    }

    public void Dispose() => temporary.Delete(recursive: true);

    private void Deliver(string contact, LocalDate date, string html)
    {
        var notice = new Notice($"{contact}|brief|{date:uuuu-MM-dd}", contact, date, "Morning brief", "text", html, NoticeReason.BriefDue);
        Assert.Equal(ChannelOutcome.Delivered, new PageFile(temporary.FullName).Deliver(notice, contact));
    }

    private static string Page(string firstLine) =>
        $"<html><head><meta name=\"description\" content=\"{System.Net.WebUtility.HtmlEncode(firstLine)}\"></head></html>";

    private string At(string name) => Path.Combine(temporary.FullName, name);

    /// <summary>Months, and links with their words.</summary>
    private List<string> Entries(string contact) =>
        [.. Parts().Matches(File.ReadAllText(At($"{contact}~past.html"))).Select(match => match.Groups[1].Success ? match.Groups[1].Value : $"{match.Groups[2].Value} {match.Groups[3].Value} {match.Groups[4].Value}")];

    [GeneratedRegex("<h2>([^<]*)</h2>|<li><a href=\"([^\"]*)\">([^<]*)</a>(?:<span>([^<]*)</span>)?</li>")]
    private static partial Regex Parts();
}
