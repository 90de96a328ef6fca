using LoadWatch.Alerts;
using LoadWatch.Delivery.Mail;
using LoadWatch.Findings;
using LoadWatch.Notices;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class MailBriefsTests : IDisposable
{
    private static readonly Instant Morning = Instant.FromUtc(2026, 3, 1, 6, 30);
    private static readonly Storage.Notices.Delivery Mail = new("mail", "ada@example.org");

    private readonly MailWorkplace place = new();
    private readonly Store store;

    public MailBriefsTests()
    {
        store = Store.Open(DataFolder.Open(place.At("data")));
        store.Write(session => session.Days.Replace("ann", new LocalDate(2025, 12, 1), MorningExamples.QuietDays("ann", 60)));
    }

    [Fact]
    public void ABriefGoesByEveryWayOfItsContactAndKeepsItsMoment()
    {
        Assert.Equal(1, Decide(Morning));

        Assert.Equal(["log", "mail", "page"], Pending().Select(pending => pending.Delivery.Channel));
        Assert.All(Pending(), pending => Assert.Equal(Morning, pending.Notice.Decided));
        Assert.Contains(Pending(), pending => pending.Delivery == Mail);
    }

    [Theory]
    [InlineData("initials", "- A. (warning, ")]
    [InlineData("none", "The page has the rest.")]
    public void WhatLeavesTheMachineHoldsTheNamesThatTheContactAsksFor(string names, string expected)
    {
        using var discreet = new MailWorkplace(contact: $", \"names\": \"{names}\"");
        Raise("ann");

        Decide(Morning, discreet);
        Raise("ben");
        Decide(Morning + Duration.FromHours(2), discreet);

        var mails = Pending().Where(pending => pending.Delivery == Mail).Select(pending => MailMessageWriter.Write(pending.Notice, "ada@example.org", "brief@example.org")).ToList();
        Assert.Equal(2, mails.Count);
        Assert.All(mails, mail => Assert.Contains(expected, mail.TextBody, StringComparison.Ordinal));
        Assert.All(mails, mail => Assert.DoesNotMatch("(?i)\\b(ann|ben)\\b", mail.TextBody + mail.HtmlBody));
        Assert.All(Pending(), pending => Assert.Contains("- Ann (warning, ", pending.Notice.Text, StringComparison.Ordinal));
        Assert.All(Pending(), pending => Assert.Contains("<h3>Ann</h3>", pending.Notice.Html, StringComparison.Ordinal));
    }

    [Fact]
    public void ATextWithFullNamesIsKeptOnce()
    {
        Decide(Morning);

        Assert.All(Pending(), pending => Assert.Null(pending.Notice.MailText));
    }

    [Fact]
    public void TheMailIsFrozenWithItsPicturesAndThePageStaysOutOfIt()
    {
        Raise("ann");
        Decide(Morning);

        var mail = Pending().Single(pending => pending.Delivery == Mail);
        Assert.Contains("<img src=\"data:image/png;base64,", mail.Notice.MailHtml, StringComparison.Ordinal);
        Assert.DoesNotContain("<svg", mail.Notice.MailHtml, StringComparison.Ordinal);
        var parts = MailMessageWriter.Write(mail.Notice, "ada@example.org", "brief@example.org").BodyParts;
        Assert.Equal(["text/plain", "text/html", "image/png"], parts.Select(part => part.ContentType.MimeType));
    }

    [Theory]
    [InlineData("coach", 0)]
    [InlineData("front_desk", 0)]
    [InlineData("physiotherapist", 0)]
    [InlineData("clinician", 1)]
    public void ATestOfFunctionChangesOnlyTheListOfTheClinician(string role, int updates)
    {
        using var desk = new MailWorkplace(contact: $", \"role\": \"{role}\"");
        Decide(Morning, desk);

        var test = MorningExamples.News("ann", FunctionTestRule.RuleName, null, Severity.Notice, AlertState.Unacknowledged, "chair stand fell", isNew: true);
        store.Write(session => session.Alerts.Put(test.Alert));

        Assert.Equal(updates, Decide(Morning + Duration.FromHours(2), desk));
    }

    [Fact]
    public void WithoutAnAddressThereIsNoMailAndNoUpdate()
    {
        using var quiet = new MailWorkplace(address: "");

        Decide(Morning, quiet);
        Raise("ann");

        Assert.Equal(0, Decide(Morning + Duration.FromHours(3), quiet));
        Assert.Equal(["log", "page"], Pending().Select(pending => pending.Delivery.Channel));
    }

    [Fact]
    public void AChangedListIsMailedOnceMoreThatDay()
    {
        Decide(Morning);
        Assert.Equal(0, Decide(Morning + Duration.FromHours(1)));

        Raise("ann");
        Assert.Equal(1, Decide(Morning + Duration.FromHours(2)));
        Raise("ben");
        Assert.Equal(0, Decide(Morning + Duration.FromHours(3)));

        var update = Pending().Single(pending => pending.Notice.Reason == NoticeReason.ListChanged);
        Assert.Equal(("staff|update|2026-03-01", Mail), (update.Notice.Key, update.Delivery));
        Assert.Contains("Since the morning brief 1 person came onto the list.", update.Notice.Text.ReplaceLineEndings(" "), StringComparison.Ordinal);
        Assert.DoesNotContain("Ann", update.Notice.Subject, StringComparison.Ordinal);
    }

    [Fact]
    public void TheNextDaysBriefStartsAnew()
    {
        Decide(Morning);
        Raise("ann");
        Decide(Morning + Duration.FromHours(2));

        Assert.Equal(1, Decide(Morning + Duration.FromDays(1)));
        Assert.Equal(0, Decide(Morning + Duration.FromHours(25)));
    }

    // The first import comes after an empty brief: it tells nobody at once.
    [Fact]
    public void ABriefThatKnewNobodysDaysIsNotUpdated()
    {
        store.Write(session => session.Days.Replace("ann", new LocalDate(2025, 12, 1), []));
        Decide(Morning);
        Raise("ann");

        Assert.Equal(0, Decide(Morning + Duration.FromHours(2)));
    }

    [Theory]
    [InlineData(DeliveryState.Failed, "refused for good")]
    [InlineData(DeliveryState.Expired, "given up after five days")]
    [InlineData(DeliveryState.Withdrawn, "withdrawn")]
    public void ANoticeThatDidNotGetThroughStandsInTheNextBriefUntilOneDoes(DeliveryState state, string expected)
    {
        Decide(Morning);
        store.Write(session => session.Notices.MarkGivenUp("staff|brief|2026-03-01", Mail, "550 nobody here", state, Morning));
        var next = Morning + Duration.FromDays(1);

        Decide(next);

        var question = new BriefLine("Mail to staff", $"Not delivered since Sunday 1 March 2026, {expected}: 550 nobody here.", OfDelivery: true);
        Assert.Equal([question], Questions(next));
        Assert.Contains("- Mail to staff: Not delivered since", store.Read(session => session.Notices.Get("staff|brief|2026-03-02")!).Text, StringComparison.Ordinal);
        store.Write(session => session.Notices.MarkDelivered("staff|brief|2026-03-02", Mail));
        Assert.Empty(Questions(next));
    }

    [Fact]
    public void ADeliveryStillTriedIsToldAfterADay()
    {
        Decide(Morning);
        store.Write(session => session.Notices.MarkTryAgain("staff|brief|2026-03-01", Mail, "no route", Morning, Morning + Duration.FromMinutes(1)));

        Assert.Empty(Questions(Morning + Duration.FromHours(23)));
        Assert.Equal("Not delivered since Sunday 1 March 2026, still tried: no route.", Assert.Single(Questions(Morning + Duration.FromHours(24))).Sentence);
    }

    public void Dispose()
    {
        store.Dispose();
        place.Dispose();
    }

    private int Decide(Instant now, MailWorkplace? other = null) => store.Write(new Briefs((other ?? place).Read(), now, [], []).Decide);

    private void Raise(string person) => store.Write(session => session.Alerts.Put(MorningExamples.LoadRatio(person).Alert));

    private IReadOnlyList<BriefLine> Questions(Instant now)
    {
        var configuration = place.Read();
        return store.Read(session => new Briefs(configuration, now, [], []).Build(session, configuration.Contacts[0])).Questions;
    }

    private IReadOnlyList<PendingDelivery> Pending() => store.Read(session => session.Notices.PendingDeliveries());
}
