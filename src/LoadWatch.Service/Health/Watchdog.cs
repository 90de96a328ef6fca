using System.Globalization;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Hosting.Systemd;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Health;

/// <summary>
/// Tells systemd that the service is alive, but only while every one of its loops gets on: a process whose sweep, status or watch hangs goes silent and is
/// started anew. A sweep that fails is work all the same; the status file and the log report it.
/// </summary>
public sealed class Watchdog(ISystemdNotifier systemd, IEnumerable<Heartbeat> loops, TimeProvider clock, ILogger<Watchdog> log) : BackgroundService
{
    private static readonly ServiceState Alive = new("WATCHDOG=1");

    private bool silent;

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        if (WaitsAtMost(Environment.GetEnvironmentVariable("WATCHDOG_USEC"), Environment.GetEnvironmentVariable("WATCHDOG_PID")) is not { } patience)
        {
            return;
        }

        using var timer = new PeriodicTimer(patience / 2, clock);
        do
        {
            Ping();
        }
        while (await NextTick(timer, stoppingToken));
    }

    /// <summary>Pings once, or says once that it does not.</summary>
    public void Ping()
    {
        var stuck = loops.FirstOrDefault(loop => !loop.IsRecent);
        if (stuck is null)
        {
            silent = false;
            systemd.Notify(Alive);
        }
        else if (!silent)
        {
            silent = true;
            LogMessages.WorkStalled(log, stuck.Loop, (int)stuck.StallAfter.TotalSeconds);
        }
    }

    /// <summary>How long systemd waits for a ping, or null where it waits for none of this process.</summary>
    /// <param name="microseconds">What systemd put into <c>WATCHDOG_USEC</c>.</param>
    /// <param name="processId">What it put into <c>WATCHDOG_PID</c>; null means every process.</param>
    public static TimeSpan? WaitsAtMost(string? microseconds, string? processId)
    {
        var isOurs = processId is null || processId == Environment.ProcessId.ToString(CultureInfo.InvariantCulture);
        return isOurs && uint.TryParse(microseconds, NumberStyles.None, CultureInfo.InvariantCulture, out var wait) && wait > 1000
            ? TimeSpan.FromMicroseconds(wait)
            : null;
    }

    private static async Task<bool> NextTick(PeriodicTimer timer, CancellationToken cancel)
    {
        try
        {
            return await timer.WaitForNextTickAsync(cancel);
        }
        catch (OperationCanceledException)
        {
            return false;
        }
    }
}
