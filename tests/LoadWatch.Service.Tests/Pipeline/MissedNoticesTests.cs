using LoadWatch.Notices;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class MissedNoticesTests : IDisposable
{
    private static readonly LocalDate Date = new(2026, 3, 1);

    private readonly MailWorkplace place = new();

    public void Dispose() => place.Dispose();

    /// <summary>Else nothing would ever end it: who is told nothing more is sent nothing that could get through.</summary>
    [Fact]
    public void WhatDidNotReachSomebodyWhoIsToldNothingMoreIsNoTrouble()
    {
        using var store = Store.Open(DataFolder.Open(place.At("data")));
        Miss(store, "gone");
        Assert.Empty(All(store));
        Miss(store, "staff");
        Assert.Equal(["staff"], All(store).Select(missed => missed.Contact));
    }

    [Fact]
    public void MailOfAContactWhoHasNoAddressAnyMoreIsNoTrouble()
    {
        using var quiet = new MailWorkplace(address: "");
        using var store = Store.Open(DataFolder.Open(place.At("data")));
        Miss(store, "staff");

        Assert.Empty(store.Read(session => MissedNotices.All(session, quiet.Read()).ToList()));
    }

    [Fact]
    public void TheAddressesAreThoseOfContactsAndAdministrators()
    {
        File.WriteAllText(
            place.At("loadwatch.json"),
            $$"""{ "time_zone": "UTC", "contacts": [ { "id": "staff", "mail": "ada@example.org" }, { "id": "desk" } ], "administrators": [ { "id": "root", "mail": "root@example.org" } ], "mail": { {{MailWorkplace.Sound}} } }""");

        var mailboxes = Mailboxes.Of(place.Read());

        Assert.Equal(["ada@example.org"], mailboxes["staff"]);
        Assert.Equal(["root@example.org"], mailboxes["root"]);
        Assert.Empty(mailboxes["desk"]);
    }

    private List<MissedDelivery> All(Store store) => store.Read(session => MissedNotices.All(session, place.Read()).ToList());

    private static void Miss(Store store, string contact)
    {
        var notice = new Notice($"{contact}|brief|2026-03-01", contact, Date, "Morning brief", "Text.", "<p>Text.</p>", NoticeReason.BriefDue);
        var way = new Storage.Notices.Delivery("mail", $"{contact}@example.org");
        store.Write(session =>
        {
            session.Notices.Add(notice, 0, [way]);
            session.Notices.MarkGivenUp(notice.Key, way, "550 nobody here", DeliveryState.Failed, Date.AtMidnight().InUtc().ToInstant());
        });
    }
}
