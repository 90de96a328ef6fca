using LoadWatch.Service.Commands;
using Quartz;

namespace LoadWatch.Service.Schedule;

/// <summary>The scheduler's hold on a sweep: one at a time.</summary>
[DisallowConcurrentExecution]
public sealed class SweepJob(SupervisedSweep sweep, Workplace workplace, TimeProvider clock) : IJob
{
    /// <summary>A failed sweep is tried again in this time, also where the inboxes are looked into less often: a full disk has room again, a share is back.</summary>
    private static readonly TimeSpan Again = TimeSpan.FromSeconds(30);

    public async ValueTask Execute(IJobExecutionContext context, CancellationToken cancellationToken = default)
    {
        if (!sweep.Run(cancellationToken) && !cancellationToken.IsCancellationRequested && workplace.Configuration.ScanEvery.ToTimeSpan() > 2 * Again)
        {
            await context.Scheduler.ScheduleJob(TriggerBuilder.Create().ForJob(ServiceHost.SweepKey).StartAt(clock.GetUtcNow() + Again).Build(), cancellationToken: cancellationToken);
        }
    }
}
