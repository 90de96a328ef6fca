using LoadWatch.Service.Commands;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using Quartz;

namespace LoadWatch.Service.Schedule;

/// <summary>Wakes the scan when a folder stirs, at most once every few seconds. The scan finds everything without it.</summary>
public sealed class InboxWatcher(Workplace workplace, ISchedulerFactory schedulers, TimeProvider clock, ILogger<InboxWatcher> log) : BackgroundService
{
    private static readonly TimeSpan Pause = TimeSpan.FromSeconds(5);

    private volatile bool stirred;

    protected override async Task ExecuteAsync(CancellationToken stoppingToken)
    {
        var watchers = workplace.Configuration.Inboxes.Select(inbox => Watch(inbox.Path)).OfType<FileSystemWatcher>().ToList();
        try
        {
            var scheduler = await schedulers.GetScheduler(stoppingToken);
            using var timer = new PeriodicTimer(Pause, clock);
            while (await timer.WaitForNextTickAsync(stoppingToken))
            {
                if (stirred)
                {
                    stirred = false;
                    await scheduler.TriggerJob(new JobKey("sweep"), stoppingToken);
                }
            }
        }
        catch (OperationCanceledException) when (stoppingToken.IsCancellationRequested)
        {
            // The service stops.
        }
        finally
        {
            watchers.ForEach(watcher => watcher.Dispose());
        }
    }

    private FileSystemWatcher? Watch(string path)
    {
        try
        {
            var watcher = new FileSystemWatcher(path) { IncludeSubdirectories = true };
            watcher.Created += (_, _) => stirred = true;
            watcher.Changed += (_, _) => stirred = true;
            watcher.Renamed += (_, _) => stirred = true;
            watcher.Error += (_, _) => stirred = true;
            watcher.EnableRaisingEvents = true;
            return watcher;
        }
        catch (Exception e) when (e is IOException or ArgumentException or UnauthorizedAccessException)
        {
            Health.LogMessages.WatchingFailed(log, e.Message);
            return null;
        }
    }
}
