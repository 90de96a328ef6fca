using LoadWatch.Notices;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Storage.Tests.Notices;

public sealed class NoticeTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly Delivery Mail = new("mail", "coach@example.org");
    private static readonly Delivery File = new("file", "coach");

    [Fact]
    public void ANoticeIsReadAsItWasDecided()
    {
        var notice = Some.Notice("coach", Some.Date) with { MailText = "A. K.", MailHtml = "<p>A. K.</p>" };
        Assert.True(Add(notice));

        Assert.Equal(notice, Store.Read(session => session.Notices.Get(notice.Key)));
        Assert.True(Store.Read(session => session.Notices.Exists(notice.Key)));
        Assert.False(Store.Read(session => session.Notices.Exists("coach|brief|2026-03-02")));
    }

    [Fact]
    public void ASecondNoticeOfTheSameKeyDoesNothing()
    {
        Add(Some.Notice("coach", Some.Date), Mail);

        Assert.False(Add(Some.Notice("coach", Some.Date) with { Text = "Something else." }, File));

        var pending = Assert.Single(Store.Read(session => session.Notices.PendingDeliveries()));
        Assert.Equal(new PendingDelivery(Some.Notice("coach", Some.Date), Mail, 0, null), pending);
    }

    [Fact]
    public void TheLastBriefOfAContactTellsItsDateAndWhatItKnew()
    {
        Assert.Null(Store.Read(session => session.Notices.LastBrief("coach", Some.Date.PlusDays(9))));
        Store.Write(session =>
        {
            session.Notices.Add(Some.Notice("coach", Some.Date.PlusDays(1)), 7, []);
            session.Notices.Add(Some.Notice("coach", Some.Date), 3, []);
            session.Notices.Add(Some.Notice("doctor", Some.Date.PlusDays(5)), 9, []);
            session.Notices.Add(Some.Notice("coach", Some.Date.PlusDays(8)) with { Key = "coach|inbox_gone|2026-03-09" }, 11, []);
        });

        Assert.Equal(new LastBrief(Some.Date.PlusDays(1), 7), Store.Read(session => session.Notices.LastBrief("coach", Some.Date.PlusDays(9))));
        Assert.Equal(new LastBrief(Some.Date, 3), Store.Read(session => session.Notices.LastBrief("coach", Some.Date.PlusDays(1))));
    }

    [Fact]
    public void ADeliveredNoticeIsNoLongerPending()
    {
        var notice = Some.Notice("coach", Some.Date);
        Add(notice, Mail, File);

        Store.Write(session => session.Notices.MarkDelivered(notice.Key, File));

        Assert.Equal(Mail, Assert.Single(Store.Read(session => session.Notices.PendingDeliveries())).Delivery);
    }

    [Fact]
    public void AFailedDeliveryStaysPendingWithItsError()
    {
        var notice = Some.Notice("coach", Some.Date);
        Add(notice, Mail);

        Store.Write(session => session.Notices.MarkTryAgain(notice.Key, Mail, "450 try later", At(0), At(1)));
        Store.Write(session => session.Notices.MarkTryAgain(notice.Key, Mail, "no route", At(1), At(3)));

        Assert.Equal(
            new PendingDelivery(notice, Mail, 2, "no route") { FirstAttempt = At(0) },
            Assert.Single(Store.Read(session => session.Notices.PendingDeliveries())));
    }

    [Fact]
    public void ADeliveryIsDueAtOnceAndThenWhenItsTimeHasCome()
    {
        var notice = Some.Notice("coach", Some.Date);
        Add(notice, Mail, File);
        Assert.Equal(2, Due(At(0)).Count);

        Store.Write(session => session.Notices.MarkTryAgain(notice.Key, Mail, "450 try later", At(0), At(2)));

        Assert.Equal([File], Due(At(1)));
        Assert.Equal([File, Mail], Due(At(2)));
    }

    [Theory]
    [InlineData(DeliveryState.Failed)]
    [InlineData(DeliveryState.Expired)]
    [InlineData(DeliveryState.Withdrawn)]
    public void AGivenUpDeliveryIsNeverDueAndStaysOnRecord(DeliveryState state)
    {
        var notice = Some.Notice("coach", Some.Date);
        Add(notice, Mail);

        Store.Write(session => session.Notices.MarkGivenUp(notice.Key, Mail, "550 nobody here", state, At(5)));

        Assert.Empty(Due(At(9999)));
        Assert.Empty(Store.Read(session => session.Notices.PendingDeliveries()));
        Assert.Equal([new MissedDelivery("coach", "mail", Some.Date, At(5), state, "550 nobody here")], Missed());
    }

    [Fact]
    public void TheOldestMissedDeliveryOfAContactAndChannelIsTold()
    {
        var days = Enumerable.Range(0, 3).Select(day => Some.Notice("coach", Some.Date.PlusDays(day))).ToList();
        days.ForEach(notice => Add(notice, Mail, File));
        Add(Some.Notice("doctor", Some.Date), Mail);

        days.ForEach(notice => Store.Write(session => session.Notices.MarkTryAgain(notice.Key, Mail, "no route", At(0), At(1))));

        Assert.Equal([new MissedDelivery("coach", "mail", Some.Date, At(0), DeliveryState.Pending, "no route")], Missed());
    }

    [Fact]
    public void ALaterNoticeThatGotThroughEndsTheReport()
    {
        var first = Some.Notice("coach", Some.Date);
        var second = Some.Notice("coach", Some.Date.PlusDays(1));
        Add(first, Mail);
        Add(second, Mail);
        Store.Write(session => session.Notices.MarkGivenUp(first.Key, Mail, "550 nobody here", DeliveryState.Failed, At(0)));
        Assert.Single(Missed());

        Store.Write(session => session.Notices.MarkDelivered(second.Key, Mail));

        Assert.Empty(Missed());
    }

    [Fact]
    public void MailThatIsTriedAndReachesNobodyDoesNotLeave()
    {
        var (coach, doctor) = (Some.Notice("coach", Some.Date) with { Decided = At(0) }, Some.Notice("doctor", Some.Date) with { Decided = At(0) });
        Add(coach, Mail);
        Add(doctor, Mail);
        Assert.Null(MailTriedSince());
        Store.Write(session => session.Notices.MarkTryAgain(coach.Key, Mail, "no route", At(0), At(1)));
        Assert.Equal(At(0), MailTriedSince());
    }

    [Fact]
    public void OneMailboxThatTakesNothingIsNoSignThatMailDoesNotLeave()
    {
        var (coach, doctor) = (Some.Notice("coach", Some.Date) with { Decided = At(0) }, Some.Notice("doctor", Some.Date) with { Decided = At(0) });
        Add(coach, Mail);
        Add(doctor, Mail);
        Store.Write(session => session.Notices.MarkTryAgain(coach.Key, Mail, "mailbox full", At(0), At(1)));

        Store.Write(session => session.Notices.MarkDelivered(doctor.Key, Mail));

        Assert.Null(MailTriedSince());
        var next = Some.Notice("doctor", Some.Date.PlusDays(1)) with { Decided = At(20) };
        Add(next, Mail);
        Store.Write(session => session.Notices.MarkTryAgain(next.Key, Mail, "no route", At(20), At(21)));
        Assert.Equal(At(20), MailTriedSince());
    }

    [Fact]
    public void WhenANoticeWasDecidedAndWhomItFlaggedIsKept()
    {
        var notice = Some.Notice("coach", Some.Date) with { Decided = At(7), Flagged = "ann\nbob" };
        Add(notice);

        Assert.Equal(notice, Store.Read(session => session.Notices.Get(notice.Key)));
    }

    [Fact]
    public void PendingDeliveriesComeOldestNoticeFirst()
    {
        Add(Some.Notice("a", Some.Date.PlusDays(1)), Mail);
        Add(Some.Notice("b", Some.Date), Mail, File);

        Assert.Equal(
            ["b|brief|2026-03-01 file", "b|brief|2026-03-01 mail", "a|brief|2026-03-02 mail"],
            Store.Read(session => session.Notices.PendingDeliveries()).Select(pending => $"{pending.Notice.Key} {pending.Delivery.Channel}"));
    }

    [Theory]
    [InlineData("coach|brief|2026-03-02")]
    [InlineData("doctor|brief|2026-03-01")]
    [InlineData("coach|2026-03-01")]
    [InlineData("coach||2026-03-01")]
    public void AKeyThatIsNotThatOfTheNoticeIsRefused(string key) =>
        Assert.Throws<ArgumentException>(() => Add(Some.Notice("coach", Some.Date) with { Key = key }));

    private static Instant At(int minute) => Instant.FromUtc(2026, 3, 1, 5, 30) + Duration.FromMinutes(minute);

    private Instant? MailTriedSince() => Store.Read(session => session.Notices.Backlog()).MailTriedSince;

    private List<Delivery> Due(Instant now) => [.. Store.Read(session => session.Notices.DueDeliveries(now)).Select(pending => pending.Delivery)];

    private IReadOnlyList<MissedDelivery> Missed() => Store.Read(session => session.Notices.MissedDeliveries());

    private bool Add(Notice notice, params Delivery[] deliveries) => Store.Write(session => session.Notices.Add(notice, 0, deliveries));
}
