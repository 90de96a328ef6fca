using LoadWatch.Alerts;
using LoadWatch.Notices;
using LoadWatch.Storage;

namespace LoadWatch.Service.Pipeline;

/// <summary>What became of alerts since a contact was told last.</summary>
internal sealed class AlertsSince
{
    private readonly ILookup<string, (AlertState From, AlertState To, AlertChangeReason Reason)> changes;
    private readonly ILookup<string, AlertNews> over;

    /// <param name="position">Of the last change of which the contact was told.</param>
    public AlertsSince(StoreSession session, long position)
    {
        changes = session.Alerts.Changes.ReasonsSince(position).ToLookup(change => change.AlertId, change => (change.From, change.To, change.Reason), StringComparer.Ordinal);
        over = changes
            .Where(alert => Ended(alert) is not null)
            .Select(alert => session.Alerts.Get(alert.Key))
            .OfType<Alert>()
            .Where(alert => alert.State is AlertState.Normal or AlertState.Returned)
            .OrderBy(alert => alert.Id, StringComparer.Ordinal)
            .ToLookup(alert => alert.Key.Person, Over, StringComparer.Ordinal);
    }

    /// <summary>Raised, raised again, or graver.</summary>
    public bool IsNew(string alert) => changes[alert].Any(change => change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain or AlertChangeReason.SeverityRose);

    /// <summary>The person's alerts that ended.</summary>
    public IEnumerable<AlertNews> OverOf(string person) => over[person];

    private AlertNews Over(Alert alert)
    {
        var ended = Ended(changes[alert.Id]);
        return new AlertNews(alert, IsNew(alert.Id), ReturnedSince: true, ended == AlertChangeReason.Corrected) { Ended = ended };
    }

    private static AlertChangeReason? Ended(IEnumerable<(AlertState From, AlertState To, AlertChangeReason Reason)> changes) => changes
        .Where(change => AlertLife.IsActive(change.From) && !AlertLife.IsActive(change.To))
        .Select(change => (AlertChangeReason?)change.Reason)
        .LastOrDefault();
}
