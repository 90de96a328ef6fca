using System.Net;
using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using LoadWatch.Alerts;
using LoadWatch.Delivery.Mail;
using LoadWatch.Delivery.Page;
using LoadWatch.Delivery.Webhook;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Stimulus;
using LoadWatch.Tests;
using static LoadWatch.Tests.MorningExamples;

namespace LoadWatch.Delivery.Tests;

/// <summary>I-13, over everything that is sent: the whole page, mail, text and webhook of every form, every rule and every reader, without the cautions.</summary>
public sealed partial class PlainWordsTests
{
    public static TheoryData<string> Examples => ["squad", "class", "every form", "busy desk", "every rule", "every rule, over", "every rule, to oneself"];

    [Theory]
    [MemberData(nameof(Examples))]
    public void WhateverIsSentDescribesChangeOnly(string example)
    {
        foreach (var brief in Briefs(example))
        {
            foreach (var names in Enum.GetValues<NamesShown>())
            {
                var sent = MailNames.Of(brief, names, []);
                PlainWords.Hold(BriefText.Subject(sent));
                PlainWords.Hold(BriefText.Write(sent));
                PlainWords.Hold(Read(PageRenderer.Render(sent)));
                PlainWords.Hold(Read(MailRenderer.Render(sent)));
                PlainWords.Hold(Webhook(sent));
            }
        }
    }

    /// <summary>What the test above rests on: a brief with such a word is found, in each of its four shapes.</summary>
    [Fact]
    public void ABannedWordIsFoundWhereverItStands()
    {
        var brief = BriefBuilder.Build(Contact(ContactRole.Coach), Today, [Subject("a", "Ann", News("a", "load_ratio", null, Severity.Notice, AlertState.Unacknowledged, "an injury is likely", isNew: true))], []);

        Assert.All(
            [BriefText.Write(brief), Read(PageRenderer.Render(brief)), Read(MailRenderer.Render(brief)), Webhook(brief)],
            text => Assert.Equal("injury", PlainWords.FirstBanned(text)));
    }

    private static IEnumerable<Brief> Briefs(string example) => example switch
    {
        "squad" => [SquadBrief()],
        "class" => [ClassBrief()],
        "every form" => [EveryForm(), .. Enum.GetValues<BriefForm>().Select(form => EveryForm(form))],
        "busy desk" => [BusyDesk(BriefForm.Daily, BriefForm.CallList)],
        "every rule" => Enum.GetValues<ContactRole>().Select(role => OfEveryRule(role, NewsOf)),
        "every rule, over" => Enum.GetValues<ContactRole>().Select(role => OfEveryRule(role, rule => Over(NewsOf(rule)))),
        _ => RuleBook.All.Select(rule => BriefBuilder.Build(Oneself("a"), Today, [Subject("a", "Ann", NewsOf(rule))], [])),
    };

    private static Brief OfEveryRule(ContactRole role, Func<IRule, AlertNews> news) => BriefBuilder.Build(
        Contact(role), Today, [.. RuleBook.All.Select(rule => Subject(rule.Name, $"Person {rule.Name}", news(rule)))], []);

    private static AlertNews NewsOf(IRule rule) => News(
        "a", rule.Name, rule is StimulusGapRule or StimulusLowRule ? BodyRegion.Legs : null, Severity.Notice, AlertState.Unacknowledged, rule.Record.Says, isNew: true);

    /// <summary>What a reader sees or hears of a page: its texts and the words of its pictures.</summary>
    private static string Read(string html) => WebUtility.HtmlDecode(Tag().Replace(Style().Replace(html, " "), match => $" {string.Join(' ', Heard().Matches(match.Value).Select(heard => heard.Groups["words"].Value))} "));

    private static string Webhook(Brief brief)
    {
        var notice = new Notice("ada|brief|2026-03-01", "ada", Today, BriefText.Subject(brief), BriefText.Write(brief), "", NoticeReason.BriefDue);
        using var json = JsonDocument.Parse(Encoding.UTF8.GetString(WebhookBody.Of(notice)));
        return $"{json.RootElement.GetProperty("subject").GetString()} {json.RootElement.GetProperty("text").GetString()}";
    }

    [GeneratedRegex("<style.*?</style>", RegexOptions.Singleline)]
    private static partial Regex Style();

    [GeneratedRegex("<[^>]*>")]
    private static partial Regex Tag();

    [GeneratedRegex("(alt|aria-label|content)=\"(?<words>[^\"]*)\"", RegexOptions.ExplicitCapture)]
    private static partial Regex Heard();
}
