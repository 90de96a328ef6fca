using LoadWatch.Service.Commands;
using LoadWatch.Service.Health;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using Quartz;

namespace LoadWatch.Service.Schedule;

/// <summary>
/// Wakes the scan when a folder stirs, at most once every few seconds; the scan finds everything without it. It also wakes a scan that is overdue: the
/// scheduler goes by the wall clock, and one that is set back would let it wait.
/// </summary>
public sealed class InboxWatcher(
    Workplace workplace,
    ISchedulerFactory schedulers,
    SupervisedSweep sweep,
    SweepHeartbeat sweeps,
    WatchHeartbeat heartbeat,
    TimeProvider clock,
    ILogger<InboxWatcher> log) : BackgroundService
{
    private static readonly TimeSpan Pause = TimeSpan.FromSeconds(5);

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        using var events = new FolderEvents(reason => LogMessages.WatchingFailed(log, reason));
        var scheduler = await schedulers.GetScheduler(stoppingToken);
        using var timer = new PeriodicTimer(Pause, clock);
        try
        {
            while (await timer.WaitForNextTickAsync(stoppingToken))
            {
                heartbeat.Beat();
                events.Follow(Folders());

                // What stirs during a sweep waits for its end: every trigger would be a sweep of its own.
                if (!sweep.IsRunning && (events.HaveStirred() | IsOverdue()))
                {
                    await scheduler.TriggerJob(ServiceHost.SweepKey, stoppingToken);
                }
            }
        }
        catch (OperationCanceledException) when (stoppingToken.IsCancellationRequested)
        {
            // The service stops.
        }
    }

    /// <summary>The folders as the last scan found them: one that did not answer the scan is not asked here.</summary>
    private IEnumerable<WatchedFolder> Folders() => workplace.Configuration.Inboxes
        .Select(inbox => workplace.Looks.RootOf(inbox.Name))
        .Where(root => root is not null)
        .Select(root => new WatchedFolder(root!.Path, root.FolderId));

    private bool IsOverdue() => sweeps.Since > workplace.Configuration.ScanEvery.ToTimeSpan() + Pause;
}
