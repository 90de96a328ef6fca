using LoadWatch.Service.Commands;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using NodaTime;

namespace LoadWatch.Service.Health;

/// <summary>Writes the status every half a minute, whatever the sweeps do; looks at the clock, keeps the database's log small, says once a day that it lives.</summary>
public sealed class StatusTimer(
    Workplace workplace, Statuses statuses, ServiceRecord state, StatusHeartbeat heartbeat, TimeProvider clock, ILogger<StatusTimer> log) : BackgroundService
{
    private static readonly TimeSpan Every = TimeSpan.FromSeconds(30);
    private const long LogToEmpty = 64L * 1024 * 1024;

    private readonly ClockWatch watch = new(clock);
    private LocalDate? told;

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        using var timer = new PeriodicTimer(Every, clock);
        try
        {
            do
            {
                Tick();
            }
            while (await timer.WaitForNextTickAsync(stoppingToken));
        }
        catch (OperationCanceledException) when (stoppingToken.IsCancellationRequested)
        {
            // The service stops.
        }
    }

    /// <summary>Never fails: what it cannot say now it says half a minute later.</summary>
    public void Tick()
    {
        heartbeat.Beat();
        try
        {
            if (watch.Jump() is { } jump)
            {
                LogMessages.ClockJumped(log, (long)jump.TotalSeconds);
            }

            var status = statuses.Write(MachineClock.Now(clock));
            SayDaily(status);
            if (status.WalBytes > LogToEmpty)
            {
                workplace.Store.Checkpoint();
            }
        }
        catch (Exception e)
        {
            LogMessages.StatusFailed(log, e);
        }
    }

    private void SayDaily(ServiceStatus status)
    {
        var today = MachineClock.Now(clock).InUtc().Date;
        if (told != today)
        {
            told = today;
            LogMessages.StillAtWork(log, state.Sweeps, status.LastDone, status.Troubles.Count);
        }
    }
}
