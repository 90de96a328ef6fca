using System.Globalization;
using System.Net;
using System.Text.RegularExpressions;
using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Tests;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests.Page;

public sealed partial class PageRendererTests
{
    public static TheoryData<string> HostileNames =>
    [
        "<script>alert(1)</script>", "</title><script src=x></script>", "<img src=x onerror=alert(1)>", "\" onmouseover=\"alert(1)", "' autofocus onfocus='alert(1)",
        "<svg/onload=alert(1)>", "</svg><b>out", "</style><style>*{display:none}", "<!-- ", "--><i>", "]]><u>", "{{ Contact }}", "{% for x in Groups %}", "&lt;script&gt;",
        "&#60;script&#62;", "<a href=javascript:alert(1)>x</a>", "<iframe srcdoc='<p>'>", "<base href=//evil.example>", "<meta http-equiv=refresh content=0>",
        "name\r\n<h1>second</h1>\u2028\u202E\u0000", "=HYPERLINK(\"x\")", "`${alert(1)}`",
    ];

    [Theory]
    [MemberData(nameof(HostileNames))]
    public void ANameNeverBecomesMarkup(string hostile)
    {
        var benign = PageRenderer.Render(Named("Plain"));
        var page = PageRenderer.Render(Named(hostile));
        Assert.Equal(Tags(benign), Tags(page));
        Assert.DoesNotContain("<script", page, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain(page, letter => letter is '\0' or '\u202E' or '\u2028');
    }

    [Fact]
    public void ATemplateMarkInANameIsShownAsItIs()
    {
        var page = PageRenderer.Render(Named("{{ Contact }}"));
        Assert.Contains("<h3>{{ Contact }}</h3>", page, StringComparison.Ordinal);
    }

    [Fact]
    public void LettersOfAllScriptsStayReadable() =>
        Assert.Contains("<h3>Håkon Ωμέγα 山田</h3>", PageRenderer.Render(Named("Håkon Ωμέγα 山田")), StringComparison.Ordinal);

    [Fact]
    public void ThePageFetchesNothingAndRunsNothing()
    {
        foreach (var page in new[] { PageRenderer.Render(SquadBrief()), PageRenderer.Render(ClassBrief()) })
        {
            var own = page.Replace("<a href=\"ada~past.html\">", "", StringComparison.Ordinal).Replace("<a href=\"noel~past.html\">", "", StringComparison.Ordinal);
            Assert.DoesNotMatch("(?i)https?://|<script|<link|<iframe|<img|@import|url\\(|javascript:| on[a-z]+=| src=| href=", own);
            Assert.Contains("default-src 'none'", page, StringComparison.Ordinal);
        }
    }

    [Fact]
    public void EveryPersonStandsInTheTableOnceAndEveryFlaggedOneAbove()
    {
        var brief = SquadBrief();
        var page = PageRenderer.Render(brief);
        var table = RowNames().Matches(page).Select(match => match.Groups[1].Value).ToList();
        Assert.Equal(24, brief.Groups[0].Rows.Count);
        Assert.Equal(brief.Groups[0].Rows.Select(row => row.Name), table);
        Assert.Equal(brief.Flagged.Select(person => person.Name), PersonNames().Matches(page).Select(match => match.Groups[1].Value));
    }

    [Fact]
    public void TheSectionsComeInTheOrderOfTheMorning()
    {
        var headings = Headings().Matches(PageRenderer.Render(SquadBrief())).Select(match => match.Groups[1].Value);
        Assert.Equal(["To look at", "No longer to look at", "Needs an answer", "Everybody", "How to read this page", "Please mind"], headings);
    }

    [Fact]
    public void TheFirstLineIsTheHeadlineAndTheLineBelowIt()
    {
        var page = PageRenderer.Render(SquadBrief());
        Assert.Contains("<h1>4 of 24 to look at: 2 well above their usual, 1 without heavy or fast leg work, 1 silent.</h1>", page, StringComparison.Ordinal);
        Assert.Contains("<p class=\"lead\">1 person without a known day in the last week. 2 questions need an answer.</p>", page, StringComparison.Ordinal);
    }

    /// <summary>Both show the same sentences: whoever reads the text alone misses nothing but the drawings.</summary>
    [Fact]
    public void TextAndPageSayTheSameOfEverybodyToLookAt()
    {
        foreach (var brief in new[] { SquadBrief(), ClassBrief(), EveryForm() })
        {
            var text = Spaces().Replace(BriefText.Write(brief), " ");
            var page = Spaces().Replace(WebUtility.HtmlDecode(AnyTag().Replace(PageRenderer.Render(brief), "")), " ");
            var said = brief.Flagged.Select(person => person.Sentence)
                .Concat(brief.Returned.Concat(brief.Changed).Concat(brief.Questions).Concat(brief.Week?.Standing ?? []).Concat(brief.Week?.Lost ?? []).Select(line => line.Sentence))
                .Concat(brief.Week?.Groups.SelectMany(group => group.Sentences) ?? [])
                .Concat(brief.Calls?.Calls.Select(call => call.Why) ?? [])
                .Concat(brief.Sheets.SelectMany(sheet => sheet.People).Select(person => person.Note).OfType<string>())
                .Concat(brief.Sheets.Select(sheet => sheet.Heading))
                .ToList();
            Assert.NotEmpty(said);
            Assert.All(said, sentence => Assert.Contains(sentence, text, StringComparison.Ordinal));
            Assert.All(said, sentence => Assert.Contains(sentence, page, StringComparison.Ordinal));
        }
    }

    [Fact]
    public void ThePageOfAFrontDeskHoldsSheetAndCallsAlone()
    {
        var brief = EveryForm(BriefForm.CallList, BriefForm.ClassSheet);
        Assert.Equal(["Saturday strength class, class from 10:00 to 11:00", "To call", "Please mind"], Headings().Matches(PageRenderer.Render(brief)).Select(match => match.Groups[1].Value));
    }

    [Fact]
    public void AQuietPageHasNoEmptySections()
    {
        var page = PageRenderer.Render(BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann")], []));
        Assert.Equal(["Everybody", "How to read this page", "Please mind"], Headings().Matches(page).Select(match => match.Groups[1].Value));
        Assert.DoesNotContain("class=\"lead\"", page, StringComparison.Ordinal);
    }

    [Fact]
    public void EveryDrawingHasWordsOrIsHidden()
    {
        var drawings = Drawings().Matches(PageRenderer.Render(SquadBrief())).Select(match => match.Value).ToList();
        Assert.Equal(24 + 4 + 7, drawings.Count);
        Assert.All(drawings, tag => Assert.Matches("role=\"img\" aria-label=\"[^\"]{20,}\"|aria-hidden=\"true\"", tag));
    }

    [Fact]
    public void APictureSaysWhatItShowsAndWhichDaysTheyAre()
    {
        var brief = SquadBrief();
        var page = PageRenderer.Render(brief);
        Assert.All(brief.Flagged, person =>
        {
            Assert.Contains($"role=\"img\" aria-label=\"{person.Picture!.Words}\"><", page, StringComparison.Ordinal);
            Assert.Contains($"<figcaption>{person.Picture.Caption}</figcaption>", page, StringComparison.Ordinal);
        });
    }

    [Fact]
    public void TheFirstLineStandsInTheHeadForTheListOfPastPages() => Assert.Contains(
        "<meta name=\"description\" content=\"4 of 24 to look at: 2 well above their usual, 1 without heavy or fast leg work, 1 silent. ",
        PageRenderer.Render(SquadBrief())[..1200],
        StringComparison.Ordinal);

    [Fact]
    public void AnUnknownNumberIsSaidToBeUnknown()
    {
        var brief = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann") with { Days = [] }], []);
        var page = PageRenderer.Render(brief);
        Assert.Equal(6, Unknowns().Count(page));
        Assert.Contains("unknown on 28", page, StringComparison.Ordinal);
    }

    [Fact]
    public void TablesHaveCaptionsAndHeadedRowsAndColumns()
    {
        var page = PageRenderer.Render(SquadBrief());
        Assert.Contains("<caption>Rowing squad <span>24 people, load in AU</span></caption>", page, StringComparison.Ordinal);
        Assert.Equal(9, ColumnHeads().Count(page));
        Assert.Equal(24, RowNames().Count(page));
    }

    [Fact]
    public void ThePageIsTheSameInEveryCulture()
    {
        var before = CultureInfo.CurrentCulture;
        var expected = PageRenderer.Render(SquadBrief());
        try
        {
            CultureInfo.CurrentCulture = new CultureInfo("fi-FI");
            Assert.Equal(expected, PageRenderer.Render(SquadBrief()));
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void ThePageShowsDatesAndNoTimeOfDay()
    {
        var page = Style().Replace(PageRenderer.Render(SquadBrief()), "");
        Assert.Contains("<p>Sunday 1 March 2026</p>", page, StringComparison.Ordinal);
        Assert.Contains("Data up to Saturday 28 February 2026", page, StringComparison.Ordinal);
        Assert.DoesNotMatch("[0-9]{1,2}:[0-9]{2}", page);
    }

    /// <summary>The name in every place that takes one, and a sentence and a group beside it.</summary>
    private static Brief Named(string name)
    {
        var group = Squad with { Name = name, LoadQuantity = name };
        var flagged = Subject("a", name, LoadRatio("a") with { Alert = LoadRatio("a").Alert with { Text = name } });
        var returned = Subject("b", name, Over(LoadRatio("b"))) with { Remarks = [name] };
        var contact = Contact(ContactRole.Coach) with { Name = name };
        return BriefBuilder.Build(contact, Today, [flagged with { Group = group }, returned with { Group = group }], [new BriefLine(name, name)]);
    }

    private static IEnumerable<string> Tags(string page) => AnyTag().Matches(AriaLabel().Replace(page, "")).Select(match => match.Value);

    [GeneratedRegex("\\s+")]
    private static partial Regex Spaces();

    [GeneratedRegex("<[^>]*>")]
    private static partial Regex AnyTag();

    [GeneratedRegex("aria-label=\"[^\"]*\"")]
    private static partial Regex AriaLabel();

    [GeneratedRegex("<th scope=\"row\">([^<]+)")]
    private static partial Regex RowNames();

    [GeneratedRegex("<h3>([^<]+)</h3>")]
    private static partial Regex PersonNames();

    [GeneratedRegex("<h2[^>]*>([^<]+)</h2>")]
    private static partial Regex Headings();

    [GeneratedRegex("<svg[^>]*>")]
    private static partial Regex Drawings();

    [GeneratedRegex("<span class=\"unknown\">\\?<span class=\"heard\"> unknown</span></span>")]
    private static partial Regex Unknowns();

    [GeneratedRegex("<th scope=\"col\"")]
    private static partial Regex ColumnHeads();

    [GeneratedRegex("(?s)<style>.*?</style>")]
    private static partial Regex Style();
}
