using System.Net;
using System.Text.RegularExpressions;
using CsCheck;
using LoadWatch.Alerts;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Pictures;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Tests;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests.Mail;

/// <summary>The HTML of a mail beside its plain text.</summary>
public sealed partial class MailRendererTests
{
    private const int NameColumns = 26;

    [Fact]
    public void EverySentenceOfTheHtmlStandsInTheText()
    {
        AssertSaysTheSame(SquadBrief());
        AssertSaysTheSame(ClassBrief());
        AssertSaysTheSame(EveryForm());
        AssertSaysTheSame(BusyDesk(BriefForm.ClassSheet, BriefForm.CallList));
    }

    [Fact]
    public void SoItIsOfAnyBrief() => Briefs().Sample(AssertSaysTheSame, iter: 30);

    [Fact]
    public void ASentenceThatTheTextLacksIsFound()
    {
        var brief = SquadBrief();
        var text = InOneLine(BriefText.Write(brief));

        Assert.Contains("Not in it.", Missing(MailRenderer.Render(brief with { FirstLine = "Not in it." }), text));
    }

    [Fact]
    public void ItHoldsNothingThatMailProgramsDrop()
    {
        var mail = MailRenderer.Render(SquadBrief());

        Assert.DoesNotMatch("(?i)<svg|<script|<link|<form|<iframe|var\\(|display: ?(grid|flex)|position:|@import|https?://|href=|cid:", mail);
    }

    [Fact]
    public void EverybodyToLookAtHasAPictureWithWords()
    {
        var brief = SquadBrief();
        var mail = MailRenderer.Render(brief);

        Assert.Equal(
            brief.Flagged.Select(person => (Convert.ToBase64String(PersonDrawing.Png(person.Picture!)), person.Picture!.Words)),
            Pictures().Matches(mail).Select(match => (match.Groups[1].Value, WebUtility.HtmlDecode(match.Groups[2].Value))));
    }

    [Fact]
    public void TheSameBriefGivesTheSameBytes() => Assert.Equal(MailRenderer.Render(SquadBrief()), MailRenderer.Render(SquadBrief()));

    [Fact]
    public void WithCountsOnlyNoRowAboutAnybodyIsLeft()
    {
        var mail = MailRenderer.Render(MailNames.Of(SquadBrief(), NamesShown.None, []));

        Assert.DoesNotMatch("<img|<table|<h3", mail);
        Assert.Contains("Morning brief for you, Sunday 1 March 2026", mail, StringComparison.Ordinal);
    }

    private static void AssertSaysTheSame(Brief brief) => Assert.Empty(Missing(MailRenderer.Render(brief), InOneLine(BriefText.Write(brief))));

    /// <summary>Texts and alternative texts of the HTML that the plain text does not hold; headings may be written in capitals there, and long names cut.</summary>
    private static List<string> Missing(string mail, string text)
    {
        var body = Head().Replace(mail, "");
        return [.. Alternatives().Matches(body).Select(match => match.Groups[1].Value)
            .Concat(AnyTag().Replace(body, "\n").Split('\n'))
            .Select(WebUtility.HtmlDecode)
            .Select(line => InOneLine(line!))
            .Where(line => line.Length > 0 && !text.Contains(line, StringComparison.OrdinalIgnoreCase) && !text.Contains(Cut(line), StringComparison.Ordinal))];
    }

    private static string Cut(string name) => name.TrimStart('*', ' ') is { Length: > NameColumns } full ? full[..(NameColumns - 1)] + "\u2026" : name;

    private static string InOneLine(string text) => Spaces().Replace(text, " ").Trim();

    private static Gen<Brief> Briefs() =>
        from people in Subjects().Array[0, 12]
        from role in Gen.OneOf(ContactRole.Coach, ContactRole.Clinician, ContactRole.FrontDesk)
        from asked in Gen.Int[0, 3]
        select BriefBuilder.Build(
            Contact(role),
            Today,
            [.. people.Select((subject, place) => subject with { Person = Person($"p{place}", $"Person {(char)('A' + place)}") })],
            [.. Enumerable.Range(0, asked).Select(place => new BriefLine($"file {place}.fit", "nobody is named as its owner"))]);

    private static Gen<BriefSubject> Subjects() =>
        from days in Gen.Int[0, 90]
        from unknown in Gen.Int[0, 20]
        from alert in Gen.OneOf<AlertNews[]>(
            [], [LoadRatio("p")], [StimulusGap("p")], [LoadRatio("p", isNew: false), StimulusGap("p", Severity.Warning, AlertState.Acknowledged)], [Over(LoadRatio("p"))], [Silence("p")])
        from remarks in Gen.OneOf<string[]>([], ["heart rate usable in 12 % of the time"])
        select Subject("p", "P", alert) with { Days = Trends("p", days, back => back < unknown ? null : back % 3 == 0 ? 0 : 60, back => back % 5 == 0 ? null : back % 4 == 0), Remarks = remarks };

    [GeneratedRegex("(?s)^.*</head>")]
    private static partial Regex Head();

    [GeneratedRegex("<[^>]*>")]
    private static partial Regex AnyTag();

    [GeneratedRegex(" alt=\"([^\"]*)\"")]
    private static partial Regex Alternatives();

    [GeneratedRegex("<img src=\"data:image/png;base64,([A-Za-z0-9+/=]+)\" width=\"340\" height=\"150\" alt=\"([^\"]{40,})\"")]
    private static partial Regex Pictures();

    [GeneratedRegex("\\s+")]
    private static partial Regex Spaces();
}
