using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>
/// Holds one person's alerts against the findings of an evaluation date (I-14). Pure; a second time for the same date changes nothing.
/// </summary>
public static class AlertReview
{
    /// <summary>
    /// A finding without an alert raises one; an active alert without its finding returns. An alert that was judged on a later date is left alone.
    /// </summary>
    /// <param name="current">The person's alerts that are not normal, one for each key; normal ones are passed over.</param>
    /// <param name="lastSequence">The last sequence written for an alert id, 0 for none.</param>
    /// <param name="findings">Findings of the evaluation date, as known now; those of other people or dates are passed over.</param>
    /// <param name="heldOn">Whether, as known now, the finding holds on a date: tells a correction from a return.</param>
    public static AlertReviewResult Review(
        string person,
        LocalDate evaluationDate,
        IReadOnlyList<Alert> current,
        Func<string, int> lastSequence,
        IReadOnlyList<Finding> findings,
        Func<FindingKey, LocalDate, bool> heldOn)
    {
        var held = findings.Where(finding => finding.Person == person && finding.Date == evaluationDate).ToDictionary(finding => finding.Key);
        var standing = current.Where(alert => alert.Key.Person == person && alert.State != AlertState.Normal).ToList();
        var known = standing.Select(alert => alert.Key).ToHashSet();
        return Gather([
            .. standing.Select(alert => Judge(alert, evaluationDate, held.GetValueOrDefault(alert.Key), lastSequence, heldOn)),
            .. held.Values.Where(finding => !known.Contains(finding.Key)).Select(finding => RaiseNew(finding, lastSequence)),
        ]);
    }

    /// <summary>Somebody confirms having seen the alert; nothing changes where there is nothing to acknowledge.</summary>
    /// <param name="date">The date of the confirmation.</param>
    public static AlertReviewResult Acknowledge(Alert alert, LocalDate date, Func<string, int> lastSequence) =>
        Gather([Step(alert, AlertSignal.Acknowledge, date, evidence: null, lastSequence)]);

    private static Reviewed Judge(
        Alert alert,
        LocalDate date,
        Finding? finding,
        Func<string, int> lastSequence,
        Func<FindingKey, LocalDate, bool> heldOn)
    {
        if (alert.Judged > date)
        {
            return new Reviewed(alert, null);
        }

        if (finding is null)
        {
            // Judged before on this very date: a later file undid it. Else what a later file settled counts only back at its raising.
            var signal = alert.Judged < date && heldOn(alert.Key, alert.Raised) ? AlertSignal.Return : AlertSignal.Correct;
            return Step(alert, signal, date, evidence: null, lastSequence);
        }

        var judged = alert with { Judged = date, Severity = finding.Severity, Text = finding.Text };
        return Step(judged, Signal(alert, finding), date, finding.Evidence, lastSequence);
    }

    private static AlertSignal Signal(Alert alert, Finding finding) => AlertLife.IsActive(alert.State)
        ? finding.Severity.CompareTo(alert.Severity) switch
        {
            > 0 => AlertSignal.SeverityRise,
            < 0 => AlertSignal.SeverityFall,
            _ => AlertSignal.Raise,
        }
        : AlertSignal.Raise;

    private static Reviewed RaiseNew(Finding finding, Func<string, int> lastSequence)
    {
        var alert = new Alert(finding.Key, finding.Date, finding.Date, AlertState.Normal, finding.Severity, finding.Text);
        return Step(alert, AlertSignal.Raise, finding.Date, finding.Evidence, lastSequence);
    }

    private static Reviewed Step(Alert alert, AlertSignal signal, LocalDate date, Evidence? evidence, Func<string, int> lastSequence)
    {
        if (AlertLife.Next(alert.State, signal) is not { } step)
        {
            return new Reviewed(alert, null);
        }

        var sequence = lastSequence(alert.Id) + 1;
        var change = new AlertChange(alert.Id, sequence, date, alert.State, step.To, step.Reason, alert.Severity, alert.Text, evidence);
        return new Reviewed(alert with { State = step.To }, change);
    }

    private static AlertReviewResult Gather(IEnumerable<Reviewed> reviewed)
    {
        var ordered = reviewed.OrderBy(one => one.Alert.Id, StringComparer.Ordinal).ToList();
        return new AlertReviewResult(
            ordered.Select(one => one.Alert).ToList(),
            ordered.Select(one => one.Change).OfType<AlertChange>().ToList());
    }

    private readonly record struct Reviewed(Alert Alert, AlertChange? Change);
}

/// <summary>What a review leaves behind, both in order of the alert's id.</summary>
/// <param name="Alerts">Every alert that was looked at and every new one, those that just became normal included.</param>
/// <param name="Changes">At most one for each alert.</param>
public sealed record AlertReviewResult(IReadOnlyList<Alert> Alerts, IReadOnlyList<AlertChange> Changes);
