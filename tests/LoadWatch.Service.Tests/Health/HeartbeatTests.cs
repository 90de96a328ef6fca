using LoadWatch.Service.Health;
using Microsoft.Extensions.Hosting.Systemd;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Tests.Health;

/// <summary>The watchdog speaks for the work, not for the process.</summary>
public sealed class HeartbeatTests : ISystemdNotifier, ILogger<Watchdog>
{
    private readonly HandClock clock = new();
    private readonly List<string> told = [];
    private readonly List<int> logged = [];

    bool ISystemdNotifier.IsEnabled => true;

    void ISystemdNotifier.Notify(ServiceState state) => told.Add(state.ToString());

    [Fact]
    public void AServiceThatGetsOnIsAlive()
    {
        var heartbeat = new Heartbeat("sweep", clock, TimeSpan.FromSeconds(100));
        using var watchdog = new Watchdog(this, [heartbeat], clock, this);
        clock.Pass(100);
        watchdog.Ping();
        heartbeat.Beat();
        clock.Pass(100);
        watchdog.Ping();
        Assert.Equal(["WATCHDOG=1", "WATCHDOG=1"], told);
        Assert.Empty(logged);
    }

    [Fact]
    public void AServiceThatHangsGoesSilentAndSaysSoOnce()
    {
        var heartbeat = new Heartbeat("sweep", clock, TimeSpan.FromSeconds(100));
        using var watchdog = new Watchdog(this, [heartbeat], clock, this);
        clock.Pass(101);
        watchdog.Ping();
        watchdog.Ping();
        Assert.Empty(told);
        Assert.Equal([9903], logged);
        heartbeat.Beat();
        watchdog.Ping();
        Assert.Equal(["WATCHDOG=1"], told);
    }

    /// <summary>Whichever loop hangs, the others do not speak for it.</summary>
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(2)]
    public void OneLoopThatHangsSilencesTheService(int hanging)
    {
        Heartbeat[] loops = [new SweepHeartbeat(clock, TimeSpan.FromSeconds(60)), new StatusHeartbeat(clock), new WatchHeartbeat(clock)];
        using var watchdog = new Watchdog(this, loops, clock, this);
        clock.Pass(3600);
        foreach (var loop in loops.Where((_, i) => i != hanging))
        {
            loop.Beat();
        }

        watchdog.Ping();
        Assert.Empty(told);
        loops[hanging].Beat();
        watchdog.Ping();
        Assert.Equal(["WATCHDOG=1"], told);
    }

    /// <summary>sd_watchdog_enabled(3): a positive number of microseconds; a process id that is not ours means that nothing is expected of us.</summary>
    [Theory]
    [InlineData("60000000", null, 60.0)]
    [InlineData("60000000", "1", null)]
    [InlineData("0", null, null)]
    [InlineData("", null, null)]
    [InlineData("-5", null, null)]
    [InlineData("sixty", null, null)]
    [InlineData(null, null, null)]
    public void WhatSystemdExpectsIsReadOrNothingIsExpected(string? microseconds, string? processId, double? seconds) =>
        Assert.Equal(seconds, Watchdog.WaitsAtMost(microseconds, processId)?.TotalSeconds);

    [Fact]
    public void APingIsExpectedOfTheProcessThatIsNamed() =>
        Assert.NotNull(Watchdog.WaitsAtMost("60000000", Environment.ProcessId.ToString()));

    IDisposable? ILogger.BeginScope<TState>(TState state) => null;

    bool ILogger.IsEnabled(LogLevel logLevel) => true;

    void ILogger.Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter) =>
        logged.Add(eventId.Id);
}
