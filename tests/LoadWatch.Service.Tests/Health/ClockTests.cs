using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Health;

/// <summary>The wall clock can be wrong, and is set while the service runs.</summary>
public sealed class ClockTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData(-3600, -3600.0)]
    [InlineData(86400, 86400.0)]
    [InlineData(-315360000, -315360000.0)]
    [InlineData(300, null)]
    [InlineData(-300, null)]
    [InlineData(0, null)]
    public void AStepOfMoreThanFiveMinutesIsNoticedOnce(int seconds, double? jump)
    {
        var clock = new HandClock();
        var watch = new ClockWatch(clock);
        clock.Pass(30);
        Assert.Null(watch.Jump());
        clock.Pass(30);
        clock.Set(TimeSpan.FromSeconds(seconds));
        Assert.Equal(jump, watch.Jump()?.TotalSeconds);
        clock.Pass(30);
        Assert.Null(watch.Jump());
    }

    [Fact]
    public void AClockBeforeTheLastSweepIsAFault()
    {
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        new ClockGuard(workplace.Store).Note(WorkingFolder.Now);
        var guard = new ClockGuard(workplace.Store);
        Assert.Null(guard.FaultAt(WorkingFolder.Now + Duration.FromDays(3650)));
        Assert.Null(guard.FaultAt(WorkingFolder.Now - Duration.FromMinutes(5)));
        var fault = guard.FaultAt(Instant.FromUtc(1970, 1, 1, 0, 1));
        Assert.Contains("1970-01-01T00:01:00Z", fault, StringComparison.Ordinal);
        Assert.Contains("2026-06-15T06:00:00Z", fault, StringComparison.Ordinal);
    }

    [Fact]
    public void ANewFolderTakesAnyClock()
    {
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        Assert.Null(new ClockGuard(workplace.Store).FaultAt(Instant.FromUtc(1970, 1, 1, 0, 1)));
    }

    /// <summary>A clock that was ahead is mended by somebody who looks: a sweep by hand counts from its own moment.</summary>
    [Fact]
    public void AMomentNotedLaterByAnEarlierClockCounts()
    {
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        var guard = new ClockGuard(workplace.Store);
        guard.Note(WorkingFolder.Now + Duration.FromDays(30000));
        guard.Note(WorkingFolder.Now);
        Assert.Null(guard.FaultAt(WorkingFolder.Now));
        Assert.Null(new ClockGuard(workplace.Store).FaultAt(WorkingFolder.Now));
    }

    [Fact]
    public void AStepForthAndBackMailsNothingTwice()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        var tomorrow = WorkingFolder.Now + Duration.FromDays(1);
        int[] decided =
        [
            folder.Sweep().NoticesDecided,
            folder.Sweep(tomorrow).NoticesDecided,
            folder.Sweep().NoticesDecided,
            folder.Sweep(tomorrow).NoticesDecided,
            folder.Sweep(WorkingFolder.Now + Duration.FromHours(1)).NoticesDecided,
        ];
        Assert.Equal([1, 1, 0, 0, 0], decided);
    }
}
