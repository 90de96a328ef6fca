using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using NodaTime;

namespace LoadWatch.Service.Schedule;

/// <summary>
/// One sweep of the service, and what follows from how it ends. The configuration is read anew before each, as one snapshot; a faulty one is reported and the
/// last good one kept.
/// </summary>
public sealed class SupervisedSweep(
    Workplace workplace,
    ConfigurationFile file,
    TimeProvider clock,
    Statuses statuses,
    ServiceRecord state,
    ClockGuard guard,
    SweepHeartbeat heartbeat,
    ServiceEnd end,
    IHostApplicationLifetime lifetime,
    ILogger<SupervisedSweep> log)
{
    private volatile bool running;

    public bool IsRunning => running;

    /// <returns>False where it failed of something that may pass.</returns>
    public bool Run(CancellationToken cancel)
    {
        running = true;
        try
        {
            var now = MachineClock.Now(clock);
            if (guard.FaultAt(now) is { } fault)
            {
                WaitForTheClock(now, fault);
            }
            else
            {
                Sweep(now, cancel);
            }
        }
        catch (DurabilityLostException e)
        {
            LogMessages.DurabilityLost(log, e);
            Stop(ExitCode.InputOutput);
        }
        catch (OperationCanceledException) when (cancel.IsCancellationRequested)
        {
            // The service stops between two commits; the next start goes on from there (I-4).
        }
        catch (Exception e)
        {
            return Fail(e);
        }
        finally
        {
            running = false;
            heartbeat.Beat();
        }

        return true;
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
        Tell(now, statuses.Write(MachineClock.Now(clock)));
    }

    private void Tell(Instant now, ServiceStatus status) =>
        new ServiceNotices(workplace.Configuration, now).Tell(workplace.Store, status, new SweepReport { Advanced = heartbeat.Beat });

    /// <summary>Where sweeps fail the reason may keep this from being told too; then the status file and the log do.</summary>
    private void TryToTell(Instant now, ServiceStatus status)
    {
        try
        {
            Tell(now, status);
        }
        catch (Exception e) when (e is System.Data.Common.DbException or IOException or UnauthorizedAccessException or DurabilityLostException)
        {
            LogMessages.NotTold(log, e.Message);
        }
    }

    private void WaitForTheClock(Instant now, string fault)
    {
        if (state.ClockIsBehind(now, fault) == now)
        {
            LogMessages.ClockBehind(log, fault);
        }

        TryToTell(now, statuses.Write(now));
    }

    /// <summary>What may pass is tried again by the next sweep; damage does not pass, by a new start neither.</summary>
    private bool Fail(Exception e)
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

        var now = MachineClock.Now(clock);
        TryToTell(now, statuses.Write(now));
        return failure.Trouble == StoreTrouble.Damaged;
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
