using LoadWatch.Notices;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class WebhookBriefsTests : IDisposable
{
    private static readonly Instant Morning = Instant.FromUtc(2026, 3, 1, 6, 30);
    private static readonly Storage.Notices.Delivery Posted = new("webhook", "staff");

    private readonly MailWorkplace place = new(mail: null, address: "");
    private readonly Store store;

    public WebhookBriefsTests()
    {
        File.WriteAllText(place.At("mail.secret"), "0123456789abcdef0123456789abcdef");
        File.WriteAllText(
            place.At("loadwatch.json"),
            """{ "time_zone": "UTC", "contacts": [ { "id": "staff", "webhook": "https://chat.example.org/token", "names": "initials" } ], "webhook": { "secret_file": "mail.secret" } }""");
        store = Store.Open(DataFolder.Open(place.At("data")));
        store.Write(session => session.Days.Replace("ann", new LocalDate(2025, 12, 1), MorningExamples.QuietDays("ann", 60)));
    }

    [Fact]
    public void ABriefIsPostedToItsContactAndTheAddressIsKeptNowhere()
    {
        Decide(Morning);

        Assert.Equal([new("log", "staff"), new("page", "staff"), Posted], Pending().Select(pending => pending.Delivery));
    }

    [Fact]
    public void AChangedListIsPostedOnceMoreThatDay()
    {
        Decide(Morning);
        store.Write(session => session.Alerts.Put(MorningExamples.LoadRatio("ann").Alert));
        Decide(Morning + Duration.FromHours(2));

        var update = Pending().Single(pending => pending.Notice.Reason == NoticeReason.ListChanged);
        Assert.Equal(Posted, update.Delivery);
        Assert.Contains("- A. (warning, new): ", update.Notice.MailText, StringComparison.Ordinal);
        Assert.Null(update.Notice.MailHtml);
    }

    [Fact]
    public void TheChannelIsThereWhereSomebodyHasAnAddress()
    {
        Assert.Contains("webhook", Deliveries.Channels(place.Read()).Select(channel => channel.Name));
        using var none = new MailWorkplace();
        Assert.Equal(["page", "log", "mail"], Deliveries.Channels(none.Read()).Select(channel => channel.Name));
    }

    public void Dispose()
    {
        store.Dispose();
        place.Dispose();
    }

    private void Decide(Instant now) => store.Write(new Briefs(place.Read(), now, [], []).Decide);

    private List<PendingDelivery> Pending() => [.. store.Read(session => session.Notices.PendingDeliveries()).OrderBy(pending => pending.Delivery.Channel, StringComparer.Ordinal)];
}
