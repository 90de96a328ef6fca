using LoadWatch.Delivery;
using LoadWatch.Notices;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class DeliveriesTests : IDisposable
{
    private const string Ada = "ada@example.org";
    private const string Ben = "ben@example.org";

    private static readonly Instant Start = Instant.FromUtc(2026, 3, 1, 6, 30);

    private readonly DirectoryInfo temporary = Directory.CreateTempSubdirectory("loadwatch-deliveries-");
    private readonly Store store;
    private ILookup<string, string> mailboxes = new[] { Ada, Ben }.ToLookup(_ => "staff");

    public DeliveriesTests() => store = Store.Open(DataFolder.Open(Path.Combine(temporary.FullName, "data")));

    // Tried at minutes 0, 1, 3, 8, 18, 38 and then every 30: the first one from minute 480 on is 488.
    [Fact]
    public void AServerGoneForEightHoursCostsNothingButTime()
    {
        Decide(1, Ada, Ben);
        Decide(2, Ada);
        var now = Start;
        var channel = new ScriptedChannel("mail", _ => now < Start + Duration.FromHours(8) ? ChannelOutcome.TryAgain("no route") : ChannelOutcome.Delivered);

        for (; Pending().Count > 0; now += Duration.FromMinutes(1))
        {
            Run(now, channel);
        }

        Assert.Equal(Start + Duration.FromMinutes(488), now - Duration.FromMinutes(1));
        Assert.Equal(3 * 21, channel.Attempts.Count);
        Assert.Equal([("staff|brief|2026-03-01", Ada), ("staff|brief|2026-03-01", Ben), ("staff|brief|2026-03-02", Ada)], channel.Attempts[^3..]);
        Assert.Empty(Missed());
    }

    [Fact]
    public void AfterFiveDaysADeliveryIsGivenUpAndReported()
    {
        Decide(1, Ada);
        var channel = new ScriptedChannel("mail", _ => ChannelOutcome.TryAgain("no route"));
        var reports = Enumerable.Range(0, 6 * 24 * 2).Select(half => (Half: half, Report: Run(Start + Duration.FromMinutes(30 * half), channel))).ToList();

        var given = Assert.Single(reports, sweep => sweep.Report.GivenUp.Count > 0);

        Assert.Equal(5 * 24 * 2, given.Half);
        Assert.Equal(["mail of staff|brief|2026-03-01: no route"], given.Report.GivenUp);
        Assert.Equal([new MissedDelivery("staff", "mail", new LocalDate(2026, 3, 1), Start, DeliveryState.Expired, "no route")], Missed());
    }

    [Fact]
    public void ARefusedRecipientKeepsNobodyElsesFromLeaving()
    {
        Decide(1, Ada, Ben);
        var channel = new ScriptedChannel("mail", recipient => recipient == Ada ? ChannelOutcome.Failed("550 nobody here") : ChannelOutcome.Delivered);

        var report = Run(Start, channel);
        Run(Start + Duration.FromDays(1), channel);

        Assert.Equal(2, channel.Attempts.Count);
        Assert.Empty(Pending());
        Assert.Equal(DeliveryState.Failed, Assert.Single(Missed()).State);
        Assert.DoesNotContain("@", string.Concat(report.GivenUp), StringComparison.Ordinal);
    }

    [Fact]
    public void ARefusedLoginIsTriedEveryQuarterOfAnHourAtTheMost()
    {
        Decide(1, Ada);
        var channel = new ScriptedChannel("mail", _ => ChannelOutcome.TryAgainSlowly("535"));

        for (var minute = 0; minute <= 60; minute++)
        {
            Run(Start + Duration.FromMinutes(minute), channel);
        }

        Assert.Equal(5, channel.Attempts.Count);
    }

    [Fact]
    public void MailThatIsNoLongerConfiguredIsKeptAndSaid()
    {
        Decide(1, Ada);

        var report = Run(Start);

        Assert.Equal(["mail of staff|brief|2026-03-01: mail is not configured"], report.Undelivered);
        Assert.Single(Pending());
    }

    [Fact]
    public void AMailThatWaitsIsWithdrawnFromAnAddressThatIsTheContactsNoLonger()
    {
        Decide(1, Ada, Ben);
        Run(Start, new ScriptedChannel("mail", _ => ChannelOutcome.TryAgain("no route")));
        var channel = new ScriptedChannel("mail", _ => ChannelOutcome.Delivered);
        mailboxes = new[] { "BEN@example.org", "new@example.org" }.ToLookup(_ => "staff");

        var report = Run(Start + Duration.FromHours(1), channel);

        Assert.Equal([("staff|brief|2026-03-01", Ben)], channel.Attempts);
        Assert.Equal(["mail of staff|brief|2026-03-01: its reader no longer has the address that it was decided for"], report.GivenUp);
        Assert.Empty(Pending());
    }

    [Fact]
    public void AMailIsWithdrawnWhenItsContactIsGoneThoughAnotherHasTheAddress()
    {
        Decide(1, Ada);
        var channel = new ScriptedChannel("mail", _ => ChannelOutcome.Delivered);
        mailboxes = new[] { Ada }.ToLookup(_ => "another");

        Run(Start, channel);

        Assert.Empty(channel.Attempts);
        var missed = Assert.Single(Missed());
        Assert.Equal(DeliveryState.Withdrawn, missed.State);
        Assert.Equal(
            "not delivered since Sunday 1 March 2026, withdrawn: its reader no longer has the address that it was decided for", MissedNotices.Sentence(missed));
    }

    [Fact]
    public void PageAndNoticeFileAreWrittenWhateverTheMailAddress()
    {
        Decide(1, new Storage.Notices.Delivery("page", "staff"), new Storage.Notices.Delivery("log", "staff"));
        mailboxes = Array.Empty<string>().ToLookup(_ => "");

        Run(Start, new ScriptedChannel("page", _ => ChannelOutcome.Delivered), new ScriptedChannel("log", _ => ChannelOutcome.Delivered));

        Assert.Empty(Pending());
    }

    [Fact]
    public void ChannelsOnDiskComeBeforeMail()
    {
        Decide(1, new Storage.Notices.Delivery("mail", Ada), new Storage.Notices.Delivery("page", "staff"));
        var order = new List<string>();
        var mail = new ScriptedChannel("mail", _ => Note("mail"));
        var page = new ScriptedChannel("page", _ => Note("page"));

        Run(Start, page, mail);

        Assert.Equal(["page", "mail"], order);

        ChannelOutcome Note(string name)
        {
            order.Add(name);
            return ChannelOutcome.Delivered;
        }
    }

    // A process that dies between the server's answer and the record sends again: the same notice to the same recipient, so under the same name.
    [Fact]
    public void WhatWasNotWrittenDownAsSentIsSentAgain()
    {
        Decide(1, Ada);
        var dying = new ScriptedChannel("mail", _ => throw new InvalidOperationException("the process dies here"));
        Assert.Throws<InvalidOperationException>(() => Run(Start, dying));
        var channel = new ScriptedChannel("mail", _ => ChannelOutcome.Delivered);

        Run(Start, channel);

        Assert.Equal(dying.Attempts, channel.Attempts);
        Assert.Empty(Pending());
    }

    public void Dispose()
    {
        store.Dispose();
        temporary.Delete(recursive: true);
    }

    private void Decide(int day, params string[] recipients) =>
        Decide(day, [.. recipients.Select(recipient => new Storage.Notices.Delivery("mail", recipient))]);

    private void Decide(int day, params Storage.Notices.Delivery[] ways)
    {
        var notice = new Notice($"staff|brief|2026-03-0{day}", "staff", new LocalDate(2026, 3, day), "Morning brief", "Text.", "<p>Text.</p>", NoticeReason.BriefDue);
        store.Write(session => session.Notices.Add(notice, 0, ways));
    }

    private SweepReport Run(Instant now, params INoticeChannel[] channels)
    {
        var report = new SweepReport();
        new Deliveries(store, channels, mailboxes, report).Run(now);
        return report;
    }

    private IReadOnlyList<PendingDelivery> Pending() => store.Read(session => session.Notices.PendingDeliveries());

    private IReadOnlyList<MissedDelivery> Missed() => store.Read(session => session.Notices.MissedDeliveries());
}
