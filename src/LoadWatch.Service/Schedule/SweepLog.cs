using LoadWatch.Delivery.Pictures;
using LoadWatch.Recordings;
using LoadWatch.Service.Health;
using LoadWatch.Service.Pipeline;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Schedule;

/// <summary>What a sweep that ended well leaves in the log: what happened, not what stands.</summary>
internal static class SweepLog
{
    public static void Write(ILogger log, ServiceRecord state, SweepReport report)
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

        WriteInboxes(log, state, report);
        report.Undelivered.ForEach(undelivered => LogMessages.DeliveryFailed(log, OneLine.Of(undelivered)));
        report.GivenUp.ForEach(given => LogMessages.DeliveryGivenUp(log, OneLine.Of(given)));
        if (PictureProbe.OfMachine.KnownTrouble is { } trouble && state.IsFirstWithoutPictures())
        {
            LogMessages.PicturesMissing(log, trouble);
        }
    }

    private static void WriteInboxes(ILogger log, ServiceRecord state, SweepReport report)
    {
        var (gone, back) = state.InboxChanges(report.Looks);
        foreach (var look in gone)
        {
            LogMessages.InboxMissing(log, OneLine.Of(look.Inbox.Name), OneLine.Of(look.Away!));
        }

        foreach (var inbox in back)
        {
            LogMessages.InboxBack(log, OneLine.Of(inbox));
        }

        foreach (var look in report.Looks.Where(look => look.IsReplaced))
        {
            LogMessages.InboxReplaced(log, OneLine.Of(look.Inbox.Name));
        }
    }
}
