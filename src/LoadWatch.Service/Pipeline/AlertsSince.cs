using LoadWatch.Alerts;
using LoadWatch.Notices;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>What became of alerts since a contact was told last.</summary>
internal sealed class AlertsSince
{
    private readonly ILookup<string, AlertChangeReason> reasons;
    private readonly ILookup<string, AlertNews> over;

    /// <param name="position">Of the last change of which the contact was told.</param>
    public AlertsSince(StoreSession session, long position)
    {
        reasons = session.Alerts.Changes.ReasonsSince(position).ToLookup(change => change.AlertId, change => change.Reason, StringComparer.Ordinal);
        over = reasons
            .Where(alert => alert.Any(IsEnd))
            .Select(alert => session.Alerts.Get(alert.Key))
            .OfType<Alert>()
            .Where(alert => alert.State is AlertState.Normal or AlertState.Returned)
            .OrderBy(alert => alert.Id, StringComparer.Ordinal)
            .ToLookup(alert => alert.Key.Person, alert => new AlertNews(alert, IsNew(alert.Id), ReturnedSince: true, reasons[alert.Id].Contains(AlertChangeReason.Corrected)), StringComparer.Ordinal);
    }

    /// <summary>Raised, raised again, or graver.</summary>
    public bool IsNew(string alert) => reasons[alert].Any(reason => reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain or AlertChangeReason.SeverityRose);

    /// <summary>The person's alerts that ended.</summary>
    public IEnumerable<AlertNews> Over(string person) => over[person];

    private static bool IsEnd(AlertChangeReason reason) => reason is AlertChangeReason.ReturnedToNormal or AlertChangeReason.Corrected;
}
