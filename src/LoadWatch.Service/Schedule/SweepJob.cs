using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage;
using Microsoft.Extensions.Hosting;
using Microsoft.Extensions.Logging;
using Quartz;

namespace LoadWatch.Service.Schedule;

/// <summary>One sweep. The configuration is read anew before each, as one snapshot; a faulty one is reported and the last good one kept.</summary>
[DisallowConcurrentExecution]
public sealed class SweepJob(
    Workplace workplace,
    ConfigurationFile file,
    TimeProvider clock,
    StatusFile status,
    Heartbeat heartbeat,
    ServiceEnd end,
    IHostApplicationLifetime lifetime,
    ILogger<SweepJob> log) : IJob
{
    public ValueTask Execute(IJobExecutionContext context, CancellationToken cancellationToken = default)
    {
        try
        {
            var fault = AdoptConfiguration();
            var now = MachineClock.Now(clock);
            var sweep = workplace.NewSweep(now);
            sweep.Report.Advanced = heartbeat.Beat;
            sweep.Run(cancellationToken);
            Log(sweep.Report);
            status.Write(now, sweep.Report, fault);
        }
        catch (DurabilityLostException e)
        {
            LogMessages.DurabilityLost(log, e);
            end.Fail(ExitCode.InputOutput);
            lifetime.StopApplication();
        }
        catch (Exception e) when (!cancellationToken.IsCancellationRequested)
        {
            // The next scan tries again; the status file tells monitoring that this one failed.
            LogMessages.SweepFailed(log, e);
            status.WriteFailure(MachineClock.Now(clock), e);
        }
        catch (OperationCanceledException) when (cancellationToken.IsCancellationRequested)
        {
            // The service stops between two commits; the next start goes on from there (I-4).
        }
        finally
        {
            heartbeat.Beat();
        }

        return ValueTask.CompletedTask;
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
            LogMessages.ConfigurationRefused(log, e.Faults.Count);
            return e.Message;
        }
    }

    private void Log(SweepReport report)
    {
        var settled = report.Settled.Values.Sum();
        if (settled + report.AlertChanges + report.NoticesDecided > 0)
        {
            LogMessages.SweepDone(
                log,
                report.CountOf(ArrivalState.Stored),
                report.CountOf(ArrivalState.Aside),
                report.CountOf(ArrivalState.Held),
                report.CountOf(ArrivalState.Refused),
                report.AlertChanges,
                report.NoticesDecided);
        }

        foreach (var inbox in report.MissingInboxes)
        {
            LogMessages.InboxMissing(log, OneLine.Of(inbox));
        }

        foreach (var undelivered in report.Undelivered)
        {
            LogMessages.DeliveryFailed(log, OneLine.Of(undelivered));
        }

        foreach (var given in report.GivenUp)
        {
            LogMessages.DeliveryGivenUp(log, OneLine.Of(given));
        }
    }
}
