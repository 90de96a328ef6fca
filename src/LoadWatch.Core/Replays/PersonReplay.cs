using LoadWatch.Alerts;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Replays;

/// <summary>The alerts that a person would have had by some limits, night by night, if somebody had seen each of them by the next night.</summary>
/// <param name="Changes">In order.</param>
/// <param name="Standing">Active after the last night.</param>
public sealed record PersonReplay(string Person, IReadOnlyList<AlertChange> Changes, IReadOnlyList<Alert> Standing, IReadOnlyDictionary<string, FindingKey> Keys)
{
    public static PersonReplay Of(ReplayedPerson past, RuleLimits limits)
    {
        var findings = past.Findings(limits).ToLookup(finding => finding.Date);
        var held = findings.SelectMany(date => date).Where(finding => finding.Severity > Severity.Note).Select(finding => (finding.Key, finding.Date)).ToHashSet();
        var (alerts, sequences, changes) = (new Dictionary<string, Alert>(StringComparer.Ordinal), new Dictionary<string, int>(StringComparer.Ordinal), new List<AlertChange>());
        foreach (var day in past.Days)
        {
            Take(AlertReview.Review(
                past.Person.Id, day.Date, [.. alerts.Values.Where(alert => alert.State != AlertState.Normal)], Last, [.. findings[day.Date]], (key, date) => held.Contains((key, date)), new Watching(limits, day.Plan)));
            foreach (var alert in alerts.Values.Where(alert => !AlertLife.IsAcknowledged(alert.State)).OrderBy(alert => alert.Id, StringComparer.Ordinal).ToList())
            {
                Take(AlertReview.Acknowledge(alert, day.Date, Last));
            }
        }

        return new PersonReplay(
            past.Person.Id, changes, [.. alerts.Values.Where(alert => AlertLife.IsActive(alert.State)).OrderBy(alert => alert.Id, StringComparer.Ordinal)], alerts.ToDictionary(alert => alert.Key, alert => alert.Value.Key, StringComparer.Ordinal));

        int Last(string id) => sequences.GetValueOrDefault(id);

        void Take(AlertReviewResult review)
        {
            foreach (var alert in review.Alerts)
            {
                alerts[alert.Id] = alert;
            }

            foreach (var change in review.Changes)
            {
                sequences[change.AlertId] = change.Sequence;
                changes.Add(change);
            }
        }
    }

    /// <summary>What was really told, as it is stored: with late files, answers, and the limits of each day.</summary>
    /// <param name="alerts">All of the person.</param>
    /// <param name="changes">Of these, in order.</param>
    /// <param name="last">The last date.</param>
    public static PersonReplay Stored(string person, IReadOnlyList<Alert> alerts, IReadOnlyList<AlertChange> changes, LocalDate last)
    {
        var past = changes.Where(change => change.Date <= last).ToList();
        var states = past.GroupBy(change => change.AlertId, StringComparer.Ordinal).ToDictionary(alert => alert.Key, alert => alert.Last().To, StringComparer.Ordinal);
        return new(
            person,
            past,
            [.. alerts.Where(alert => states.TryGetValue(alert.Id, out var state) && AlertLife.IsActive(state)).OrderBy(alert => alert.Id, StringComparer.Ordinal)],
            alerts.ToDictionary(alert => alert.Id, alert => alert.Key, StringComparer.Ordinal));
    }

    /// <summary>How often something was raised from a date on.</summary>
    public IEnumerable<AlertChange> Raised(LocalDate from, LocalDate to) =>
        Changes.Where(change => change.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain && change.Date >= from && change.Date <= to);
}
