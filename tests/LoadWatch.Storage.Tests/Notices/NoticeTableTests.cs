using LoadWatch.Notices;
using LoadWatch.Storage.Notices;

namespace LoadWatch.Storage.Tests.Notices;

public sealed class NoticeTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly Delivery Mail = new("mail", "coach@example.org");
    private static readonly Delivery File = new("file", "coach");

    [Fact]
    public void ANoticeIsReadAsItWasDecided()
    {
        var notice = Some.Notice("coach", Some.Date);
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

        Store.Write(session => session.Notices.MarkDelivered(notice.Key, File.Channel, File.Recipient));

        Assert.Equal(Mail, Assert.Single(Store.Read(session => session.Notices.PendingDeliveries())).Delivery);
    }

    [Fact]
    public void AFailedDeliveryStaysPendingWithItsError()
    {
        var notice = Some.Notice("coach", Some.Date);
        Add(notice, Mail);

        Store.Write(session => session.Notices.MarkFailed(notice.Key, Mail.Channel, Mail.Recipient, "450 try later"));
        Store.Write(session => session.Notices.MarkFailed(notice.Key, Mail.Channel, Mail.Recipient, "no route"));

        Assert.Equal(new PendingDelivery(notice, Mail, 2, "no route"), Assert.Single(Store.Read(session => session.Notices.PendingDeliveries())));
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

    private bool Add(Notice notice, params Delivery[] deliveries) => Store.Write(session => session.Notices.Add(notice, 0, deliveries));
}
