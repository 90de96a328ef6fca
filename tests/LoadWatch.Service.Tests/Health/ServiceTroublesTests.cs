using LoadWatch.Service.Health;
using NodaTime;

namespace LoadWatch.Service.Tests.Health;

/// <summary>A status is judged by what it says; every bound is a choice of this project.</summary>
public sealed class ServiceTroublesTests
{
    private const long Megabyte = 1024 * 1024;
    private static readonly Instant Now = Instant.FromUtc(2026, 6, 15, 6, 0);

    private static readonly ServiceStatus Well = new()
    {
        Version = "1.0.0",
        Schema = 1,
        Process = 1,
        Started = "2026-06-14T00:00:00Z",
        Written = "2026-06-15T06:00:00Z",
        ScanSeconds = 60,
        LastDone = "2026-06-15T05:59:30Z",
        Inboxes = [new InboxStatus("main", "2026-06-15T05:59:30Z", "8.1:42", 7, null)],
        DiskFreeBytes = 2000 * Megabyte,
    };

    public static TheoryData<string, ServiceStatus, bool?> Statuses => new()
    {
        { "well", Well, null },
        { "inbox-main", Well with { Inboxes = [new InboxStatus("main", "2026-06-15T05:59:30Z", null, 0, "there is no such folder")] }, true },
        { "inbox-main", Well with { Inboxes = [new InboxStatus("main", "2026-06-15T05:59:30Z", null, 0, "there is no such folder", "2026-06-15T05:50:01Z")] }, false },
        { "inbox-main", Well with { Inboxes = [new InboxStatus("main", "2026-06-15T05:59:30Z", null, 0, "there is no such folder", "2026-06-15T05:50:00Z")] }, true },
        { "disk-scarce", Well with { DiskFreeBytes = (1024 * Megabyte) - 1 }, false },
        { "disk-scarce", Well with { DiskFreeBytes = 200 * Megabyte }, false },
        { "disk-full", Well with { DiskFreeBytes = (200 * Megabyte) - 1 }, true },
        { "well", Well with { DiskFreeBytes = null }, null },
        { "well", Well with { WalBytes = 256 * Megabyte }, null },
        { "log-of-database", Well with { WalBytes = (256 * Megabyte) + 1 }, false },
        { "well", Well with { MailTriedSince = "2026-06-15T05:00:01Z" }, null },
        { "mail-not-leaving", Well with { MailTriedSince = "2026-06-15T05:00:00Z" }, true },
        { "deliveries-missed", Well with { Undelivered = 1 }, false },
        { "well", Well with { PeopleBehind = 3, BehindSince = "2026-06-15T05:00:01Z" }, null },
        { "people-behind", Well with { PeopleBehind = 3, BehindSince = "2026-06-15T05:00:00Z" }, false },
        { "people-behind", Well with { PeopleBehind = 3, BehindSince = "2026-06-14T06:00:00Z" }, true },
        { "configuration", Well with { ConfigurationFault = "loadwatch.json:3: no such key" }, false },
        { "arrivals-waiting", Well with { Waiting = 2, OldestWaiting = "2026-06-15T04:59:59Z" }, false },
        { "unreadable-files", Well with { Unreadable = 1 }, false },
        { "sweeps-fail", Well with { Sweep = new SweepStatus("2026-06-15T05:59:00Z", null, "running", "the disk is full", "2026-06-15T05:50:01Z") }, false },
        { "sweeps-fail", Well with { Sweep = new SweepStatus("2026-06-15T05:59:00Z", "2026-06-15T05:59:00Z", "failed", "the disk is full", "2026-06-15T05:50:00Z") }, true },
        { "clock-behind", Well with { ClockFault = "The clock is behind.", ClockFaultSince = "2026-06-15T05:50:01Z" }, false },
        { "clock-behind", Well with { ClockFault = "The clock is behind.", ClockFaultSince = "2026-06-15T05:50:00Z" }, true },
    };

    [Theory]
    [MemberData(nameof(Statuses))]
    public void WhatIsWrongIsToldWithItsWeight(string name, ServiceStatus status, bool? critical)
    {
        var troubles = ServiceTroubles.Of(status, Now);
        Assert.Equal(critical is null ? [] : [(name, critical.Value)], troubles.Select(trouble => (trouble.Name, trouble.Critical)));
        Assert.All(troubles, trouble => Assert.False(char.IsLower(trouble.Sentence[0]), trouble.Sentence));
    }

    [Fact]
    public void TheGraverStandsFirst()
    {
        var both = Well with { Unreadable = 1, DiskFreeBytes = 0 };
        Assert.Equal(["disk-full", "unreadable-files"], ServiceTroubles.Of(both, Now).Select(trouble => trouble.Name));
    }

    [Theory]
    [InlineData("2026-06-15T05:59:30Z", "2026-06-15T06:00:00Z", null, 0)]
    [InlineData("2026-06-15T05:49:00Z", "2026-06-15T06:00:00Z", null, 0)]
    [InlineData("2026-06-15T05:48:59Z", "2026-06-15T06:00:00Z", null, 2)]
    [InlineData("2026-06-15T05:48:59Z", "2026-06-15T06:00:00Z", 12, 0)]
    [InlineData("2026-06-15T05:59:30Z", "2026-06-15T06:00:00Z", 1, 0)]
    [InlineData("2026-06-15T05:58:30Z", "2026-06-15T06:00:00Z", 1, 2)]
    [InlineData("2026-06-15T05:55:30Z", "2026-06-15T05:54:59Z", null, 2)]
    [InlineData(null, "2026-06-15T06:00:00Z", null, 2)]
    public void SilenceIsCritical(string? lastDone, string written, int? maxAgeMinutes, int code)
    {
        var verdict = Judge(Well with { LastDone = lastDone, Written = written }, maxAgeMinutes);
        Assert.Equal(code, verdict.Code);
        Assert.DoesNotContain('\n', verdict.Sentence);
    }

    [Fact]
    public void ASweepOfACommandIsNoServiceThatHangs()
    {
        var status = Well with { Started = null, Written = "2026-06-14T06:00:00Z", LastDone = "2026-06-14T06:00:00Z" };
        Assert.Equal(2, Judge(status, null).Code);
        Assert.Equal(0, Judge(status, 1500).Code);
    }

    [Fact]
    public void AServiceThatHasJustStartedIsWell() =>
        Assert.Equal(0, Judge(Well with { LastDone = null, Started = "2026-06-15T05:59:00Z" }, null).Code);

    [Theory]
    [InlineData("running", null, "2026-06-15T05:50:00Z", 1)]
    [InlineData("running", null, "2026-06-15T05:49:59Z", 2)]
    [InlineData("running", "2026-06-15T05:00:00Z", "2026-06-15T06:00:00Z", 2)]
    [InlineData("failed", null, "2026-06-15T06:00:00Z", 2)]
    public void AFirstSweepThatTakesLongAndGetsOnIsNoSilence(string result, string? failingSince, string lastCommit, int code)
    {
        var status = Well with
        {
            LastDone = null,
            LastCommit = lastCommit,
            Through = 700,
            Waiting = 300,
            Sweep = new SweepStatus("2026-06-15T00:00:00Z", null, result, null, failingSince),
        };
        var verdict = Judge(status, null);
        Assert.Equal(code, verdict.Code);
        Assert.Equal(code == 1, verdict.Sentence == "The first sweep has been under way since 2026-06-15T00:00:00Z and gets on: 700 arrivals are in, 300 wait.");
        Assert.Equal(code, Judge(status with { LastDone = "2026-06-14T00:00:00Z" }, null).Code);
    }

    [Fact]
    public void TheServiceRemembersSinceWhenAnInboxIsAway()
    {
        var inbox = new LoadWatch.Service.Configuration.Inbox("main", "/srv/inbox", LoadWatch.Service.Configuration.TakeMode.Leave);
        var away = new LoadWatch.Service.Pipeline.SweepReport();
        away.Take([LoadWatch.Service.Arrivals.InboxLook.NotAvailable(inbox, "there is no such folder")]);
        var service = new ServiceRecord(Now);
        service.Ended(Now, away, fault: null);
        service.Ended(Now + Duration.FromMinutes(5), away, fault: null);
        Assert.Equal("2026-06-15T06:00:00Z", service.In(Well).Inboxes[0].AwaySince);
        service.Ended(Now + Duration.FromMinutes(6), new LoadWatch.Service.Pipeline.SweepReport(), fault: null);
        service.Ended(Now + Duration.FromMinutes(7), away, fault: null);
        Assert.Equal("2026-06-15T06:07:00Z", service.In(Well).Inboxes[0].AwaySince);
        var command = new ServiceRecord(started: null);
        command.Ended(Now, away, fault: null);
        Assert.Null(command.In(Well).Inboxes[0].AwaySince);
    }

    [Theory]
    [InlineData(false, 1, "WARNING")]
    [InlineData(true, 2, "CRITICAL")]
    public void ATroubleIsWarningOrCritical(bool critical, int code, string word)
    {
        var verdict = Judge(Well with { Troubles = [new Trouble("one", critical, "One thing is wrong."), new Trouble("other", false, "Another is.")] }, null);
        Assert.Equal((code, word, "One thing is wrong. And 1 more."), (verdict.Code, verdict.Word, verdict.Sentence));
    }

    [Fact]
    public void WithoutAStatusNothingIsKnownUnlessSomethingIsBroken()
    {
        Assert.Equal(3, StatusVerdict.Of(null, [], Now, null).Code);
        Assert.Equal(2, StatusVerdict.Of(null, [new Trouble("database", true, "The database is damaged.")], Now, null).Code);
    }

    [Fact]
    public void ATornStatusIsNone()
    {
        var folder = Directory.CreateTempSubdirectory("loadwatch-status-");
        try
        {
            Assert.Null(StatusFile.Read(folder.FullName));
            Assert.True(StatusFile.Write(folder.FullName, Well));
            Assert.Equal(Well.LastDone, StatusFile.Read(folder.FullName)!.LastDone);
            var path = Path.Combine(folder.FullName, "status.json");
            File.WriteAllBytes(path, File.ReadAllBytes(path)[..50]);
            Assert.Null(StatusFile.Read(folder.FullName));
            Assert.False(StatusFile.Write(Path.Combine(folder.FullName, "none"), Well));
        }
        finally
        {
            folder.Delete(recursive: true);
        }
    }

    private static StatusVerdict Judge(ServiceStatus status, int? maxAgeMinutes) =>
        StatusVerdict.Of(status, [], Now, maxAgeMinutes is { } minutes ? Duration.FromMinutes(minutes) : null);
}
