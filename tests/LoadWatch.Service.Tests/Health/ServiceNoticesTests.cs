using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Health;
using LoadWatch.Storage;
using LoadWatch.Storage.Notices;
using NodaTime;

namespace LoadWatch.Service.Tests.Health;

/// <summary>What those who look after the service are told, and how often.</summary>
public sealed class ServiceNoticesTests : IDisposable
{
    private static readonly Instant Morning = Instant.FromUtc(2026, 6, 15, 7, 0);
    private static readonly Trouble Away = new("inbox-main", true, "The inbox \"main\" is not available: there is no such folder.");

    private static readonly ServiceStatus Well = new()
    {
        Version = "1.0.0",
        Schema = 1,
        Process = 1,
        Written = "2026-06-15T07:00:00Z",
        ScanSeconds = 60,
        LastDone = "2026-06-15T06:59:30Z",
    };

    private readonly MailWorkplace place = new();
    private readonly Store store;
    private readonly WorkingConfiguration configuration;

    public ServiceNoticesTests()
    {
        var file = place.At("loadwatch.json");
        File.WriteAllText(file, File.ReadAllText(file).Replace("\"contacts\"", "\"administrators\": [{ \"id\": \"it\", \"mail\": \"it@example.org\" }], \"contacts\"", StringComparison.Ordinal));
        configuration = place.Read();
        store = Store.Open(DataFolder.Open(place.At("data")));
    }

    public void Dispose()
    {
        store.Dispose();
        place.Dispose();
    }

    [Fact]
    public void TheReportComesOnceADayAtItsTime()
    {
        Assert.Equal(0, Decide(Morning - Duration.FromSeconds(1), Well));
        Assert.Equal(1, Decide(Morning, Well));
        Assert.Equal(0, Decide(Morning + Duration.FromHours(1), Well));
        Assert.Equal(0, Decide(Morning - Duration.FromHours(1), Well));
        Assert.Equal(1, Decide(Morning + Duration.FromDays(1), Well));
        Assert.Equal(["log", "mail"], Pending("it|service|2026-06-15").Select(pending => pending.Delivery.Channel));
        var report = store.Read(session => session.Notices.Get("it|service|2026-06-15"))!;
        Assert.Equal("LoadWatch, Monday 15 June 2026: all well", report.Subject);
        Assert.Contains("When it does not come", report.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void ATroubleIsToldAtOnceAndOnceForAsLongAsItLasts()
    {
        var night = Morning - Duration.FromHours(8);
        Decide(night - Duration.FromMinutes(1), Well); // The report of that day, hours late on the first night.
        Assert.Equal(1, Decide(night, Well with { Troubles = [Away] }));
        Assert.Equal(0, Decide(night + Duration.FromMinutes(1), Well with { Troubles = [Away] }));
        Assert.Equal(0, Decide(night + Duration.FromHours(2), Well with { Troubles = [Away] }));
        var told = Assert.Single(Pending("it|trouble-inbox-main|2026-06-14"), pending => pending.Delivery.Channel == "mail").Notice;
        Assert.Contains("The inbox \"main\" is not available", told.Text, StringComparison.Ordinal);
        Assert.DoesNotContain("main", told.Subject, StringComparison.Ordinal);
    }

    [Fact]
    public void ATroubleThatComesBackOnAnotherDayIsToldAgain()
    {
        var night = Morning - Duration.FromHours(8);
        Decide(night, Well with { Troubles = [Away] });
        Decide(night + Duration.FromMinutes(1), Well);
        Assert.Equal(0, Decide(night + Duration.FromMinutes(2), Well with { Troubles = [Away] }));
        Decide(night + Duration.FromMinutes(3), Well);
        Assert.Equal(1, Decide(night + Duration.FromHours(2), Well with { Troubles = [Away] }));
    }

    [Fact]
    public void WhatIsNoMoreThanAWarningWaitsForTheReport()
    {
        var scarce = new Trouble("disk-scarce", false, "The disk of the data folder has 900 MB left.");
        Assert.Equal(0, Decide(Morning - Duration.FromHours(1), Well with { Troubles = [scarce] }));
        Decide(Morning, Well with { Troubles = [scarce] });
        var report = store.Read(session => session.Notices.Get("it|service|2026-06-15"))!;
        Assert.EndsWith("1 thing is not well", report.Subject, StringComparison.Ordinal);
        Assert.Contains("warning: The disk of the data folder has 900 MB left.", report.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void ThatMailDoesNotLeaveIsNotToldByMail()
    {
        Decide(Morning - Duration.FromHours(1), Well with { Troubles = [new Trouble("mail-not-leaving", true, "Mail has not been leaving.")] });
        Assert.Equal(["log"], Pending("it|trouble-mail-not-leaving|2026-06-15").Select(pending => pending.Delivery.Channel));
    }

    [Fact]
    public void HostileNamesStayText()
    {
        var hostile = new Trouble("inbox-x", true, "The inbox \"<script>alert(1)</script>\r\nBcc: all@example.org\" is not available.");
        Decide(Morning - Duration.FromHours(1), Well with { Troubles = [hostile] });
        var told = store.Read(session => session.Notices.Get("it|trouble-inbox-x|2026-06-15"))!;
        Assert.DoesNotContain("<script>", told.Html, StringComparison.Ordinal);
        Assert.DoesNotContain("\nBcc", told.Text, StringComparison.Ordinal);
    }

    private int Decide(Instant now, ServiceStatus status) => store.Write(session => new ServiceNotices(configuration, now).Decide(session, status));

    private IReadOnlyList<PendingDelivery> Pending(string key) =>
        [.. store.Read(session => session.Notices.PendingDeliveries()).Where(pending => pending.Notice.Key == key)];
}
