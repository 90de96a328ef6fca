using LoadWatch.Notices;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Anna's ride was recorded by a watch of bo's: she seems silent, and he far beyond his usual, until a row of answers says whose it was.</summary>
public sealed class WrongWearerTests : IDisposable
{
    private const string Header = "date,person,answer,file";
    private const string Kept = "2026-01-01,cara,seen,";
    private const string Answer = "2026-06-15,anna,belongs_to,bo/late.fit";

    private static readonly byte[] Ride = Some.Fit(Nights.Date(1), 60, heartRate: 160);
    private static readonly Instant Later = WorkingFolder.Now + Duration.FromHours(2);
    private static readonly Instant NextMorning = WorkingFolder.Now + Duration.FromDays(1);

    private readonly WorkingFolder folder = new();

    public WrongWearerTests()
    {
        folder.Configure("""
            "mail": { "host": "127.0.0.1", "port": 1, "security": "none", "from": "brief@example.org", "timeout_seconds": 5 }
            """);
        folder.Edit("loadwatch.json", "\"id\": \"staff\"", "\"id\": \"staff\", \"mail\": \"kim@example.org\"");
        Fill(folder, "bo");
        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void BothPeoplesDaysAndAlertsArePutRightAndWhoeverWasToldIsToldAgain()
    {
        using var right = new WorkingFolder();
        Fill(right, "anna");
        right.Sweep();
        Assert.All(["anna silence unacknowledged", "bo session_spike unacknowledged"], alert => Assert.Contains(alert, Alerts()));
        var raised = Alerts().Count;

        folder.PutTable("answers.csv", 0, Header, Answer, Kept);
        folder.Sweep(Later);

        Assert.Equal("anna", folder.Arrival(Ride)!.Person);
        Assert.Equal(right.Export("days"), folder.Export("days"));
        Assert.Equal(right.Export("findings"), folder.Export("findings"));
        Assert.All(Alerts(), alert => Assert.EndsWith(" returned", alert, StringComparison.Ordinal));
        var update = Nights.InOneLine(Mailed(NoticeReason.ListChanged).Text);
        Assert.Equal(raised, Nights.Count(update, "corrected by a later file"));

        folder.Sweep(NextMorning);
        Assert.Equal(raised, Nights.Count(Nights.InOneLine(Mailed(NoticeReason.BriefDue, "staff|brief|2026-06-16").Text), "corrected by a later file"));
    }

    [Fact]
    public void TheRowThatGoesTakesItBack()
    {
        var before = (folder.Computed(), Alerts());
        folder.PutTable("answers.csv", 0, Header, Answer, Kept);
        folder.Sweep(Later);
        folder.PutTable("answers.csv", 0, Header, Kept);
        folder.Sweep(Later + Duration.FromHours(1));

        Assert.Equal((ArrivalState.Stored, "bo"), (folder.Arrival(Ride)!.State, folder.Arrival(Ride)!.Person));
        Assert.Equal(before.Item1, folder.Computed());
        Assert.Equal(before.Item2, Alerts().Where(alert => alert.EndsWith("unacknowledged", StringComparison.Ordinal)));
        Assert.Equal(0, folder.Sweep(Later + Duration.FromHours(2)).PeopleComputed);
    }

    private static void Fill(WorkingFolder folder, string owner)
    {
        folder.Fill(Some.Fortnight().Where(file => file.Path.StartsWith("anna/0", StringComparison.Ordinal)));
        folder.Fill(Enumerable.Range(0, 10).Select(ride => ($"bo/{ride}.fit", Some.Fit(Nights.Date(29 - (3 * ride)), heartRate: 110))));
        folder.Put($"{owner}/late.fit", Ride);
    }

    private List<string> Alerts() => folder.Read((_, session) => new[] { "anna", "bo", "cara" }
        .SelectMany(session.Alerts.All)
        .Select(alert => $"{alert.Key.Person} {alert.Key.Rule} {Export.Words.Of(alert.State)}")
        .Order(StringComparer.Ordinal)
        .ToList());

    private Notice Mailed(NoticeReason reason, string? key = null) => folder.Read((_, session) => session.Notices.PendingDeliveries())
        .Single(pending => pending.Delivery.Channel == "mail" && pending.Notice.Reason == reason && (key is null || pending.Notice.Key == key))
        .Notice;
}
