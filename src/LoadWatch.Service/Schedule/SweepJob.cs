using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using NodaTime;
using Quartz;

namespace LoadWatch.Service.Schedule;

/// <summary>One sweep. The configuration is read anew before each, as one snapshot; a faulty one is reported and the last good one kept.</summary>
[DisallowConcurrentExecution]
public sealed class SweepJob(
    Workplace workplace,
    ConfigurationFile file,
    TimeProvider clock,
    Statuses statuses,
    ServiceRecord state,
    ClockGuard guard,
    SweepHeartbeat heartbeat,
    ServiceEnd end,
    IHostApplicationLifetime lifetime,
    ILogger<SweepJob> log) : IJob
{
    /// <summary>A failed sweep is tried again in this time, also where the inboxes are looked into less often.</summary>
    private static readonly TimeSpan Again = TimeSpan.FromSeconds(30);

    public ValueTask Execute(IJobExecutionContext context, CancellationToken cancellationToken = default)
    {
        try
        {
            var now = MachineClock.Now(clock);
            if (guard.FaultAt(now) is { } fault)
            {
                WaitForTheClock(now, fault);
            }
            else
            {
                Sweep(now, cancellationToken);
            }
        }
        catch (DurabilityLostException e)
        {
            LogMessages.DurabilityLost(log, e);
            Stop(ExitCode.InputOutput);
        }
        catch (OperationCanceledException) when (cancellationToken.IsCancellationRequested)
        {
            // The service stops between two commits; the next start goes on from there (I-4).
        }
        catch (Exception e)
        {
            Fail(e, context.Scheduler);
        }
        finally
        {
            heartbeat.Beat();
        }

        return ValueTask.CompletedTask;
    }

    private void Sweep(Instant now, CancellationToken cancel)
    {
        state.Began(now);
        var fault = AdoptConfiguration();
        var sweep = workplace.NewSweep(now);
        sweep.Report.Advanced = heartbeat.Beat;
        sweep.Run(cancel);
        guard.Note(now);
        if (state.Ended(MachineClock.Now(clock), sweep.Report, fault) is > 0 and var failures)
        {
            LogMessages.SweepsRecovered(log, failures);
        }

        SweepLog.Write(log, state, sweep.Report);
        var status = statuses.Write(MachineClock.Now(clock));
        workplace.Store.Write(session => new ServiceNotices(workplace.Configuration, now).Decide(session, status));
    }

    private void WaitForTheClock(Instant now, string fault)
    {
        if (state.ClockIsBehind(now, fault) == now)
        {
            LogMessages.ClockBehind(log, fault);
        }

        statuses.Write(now);
    }

    /// <summary>What may pass is tried again by the next sweep; damage does not pass, by a new start neither.</summary>
    private void Fail(Exception e, IScheduler scheduler)
    {
        var failure = SweepFailure.Of(e);
        var isNew = state.Failed(MachineClock.Now(clock), failure);
        switch (failure.Trouble)
        {
            case StoreTrouble.Damaged:
                LogMessages.DatabaseDamaged(log, e);
                Stop(ExitCode.Data);
                break;
            case StoreTrouble.Busy when isNew:
                LogMessages.DatabaseBusy(log);
                break;
            case not StoreTrouble.Busy when isNew:
                LogMessages.SweepFailed(log, e);
                break;
        }

        statuses.Write(MachineClock.Now(clock));
        RetrySoon(scheduler);
    }

    private void RetrySoon(IScheduler scheduler)
    {
        if (workplace.Configuration.ScanEvery.ToTimeSpan() > 2 * Again && !lifetime.ApplicationStopping.IsCancellationRequested)
        {
            var trigger = TriggerBuilder.Create().ForJob(ServiceHost.SweepKey).StartAt(clock.GetUtcNow() + Again).Build();
            _ = scheduler.ScheduleJob(trigger).AsTask();
        }
    }

    private void Stop(int code)
    {
        end.Fail(code);
        lifetime.StopApplication();
    }

    private string? AdoptConfiguration()
    {
        try
        {
            workplace.Adopt(ConfigurationReader.Read(file.Path));
            return null;
        }
        catch (ConfigurationException e)
        {
            if (state.IsNewFault(e.Message))
            {
                LogMessages.ConfigurationRefused(log, e.Faults.Count);
            }

            return e.Message;
        }
    }
}
