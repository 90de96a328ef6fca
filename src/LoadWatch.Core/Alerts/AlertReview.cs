using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>
/// Holds one person's alerts against the findings of an evaluation date (I-14). Pure; a second time for the same date changes nothing.
/// </summary>
public static class AlertReview
{
    /// <summary>Nobody shelves an alert for longer, days. A choice.</summary>
    public const int LongestShelvingDays = 60;

    /// <summary>
    /// A finding without an alert raises one, where it rests on recordings that are missing once they had their usual time (<see cref="Watching.Told"/>); an active
    /// alert without its finding returns. An alert that was judged on a later date is left alone. Shelving
    /// ends with the first evaluation on a day after its date, at once where severity rises (less was known when it was shelved), and with the alert. A choice.
    /// </summary>
    /// <param name="current">The person's alerts that are not normal, one for each key; normal ones are passed over.</param>
    /// <param name="lastSequence">The last sequence written for an alert id, 0 for none.</param>
    /// <param name="findings">Findings of the evaluation date, as known now; those of other people or dates, and notes, are passed over.</param>
    /// <param name="heldOn">Whether, as known now, the finding holds on a date: tells a correction from a return.</param>
    /// <param name="watching">What limits and plan say of the rules; null: every rule is on, by the limits that it always had.</param>
    public static AlertReviewResult Review(
        string person,
        LocalDate evaluationDate,
        IReadOnlyList<Alert> current,
        Func<string, int> lastSequence,
        IReadOnlyList<Finding> findings,
        Func<FindingKey, LocalDate, bool> heldOn,
        Watching? watching = null)
    {
        var watch = watching ?? Watching.Everything;
        var ofDate = findings.Where(finding => finding.Person == person && finding.Date == evaluationDate).ToList();
        var held = ofDate.Where(finding => finding.Severity > Severity.Note).Select(watch.Told).ToDictionary(told => told.Finding.Key);
        var suppressed = ofDate.Where(finding => finding.Severity == Severity.Suppressed).Select(finding => finding.Key).ToHashSet();
        var standing = current.Where(alert => alert.Key.Person == person && alert.State != AlertState.Normal).ToList();
        var known = standing.Select(alert => alert.Key).ToHashSet();
        return Gather([
            .. standing.Select(alert => alert.Judged > evaluationDate ? new Reviewed(alert)
                : held.TryGetValue(alert.Key, out var told) ? Held(alert, told, watch, lastSequence)
                : NotHeld(alert, evaluationDate, Why(alert, evaluationDate, suppressed, heldOn, watch), lastSequence)),
            .. held.Values.Where(told => !known.Contains(told.Finding.Key) && told.From <= evaluationDate).Select(told => RaiseNew(told.Finding, watch, lastSequence)),
        ]);
    }

    /// <summary>Somebody confirms having seen the alert; nothing changes where there is nothing to acknowledge.</summary>
    /// <param name="date">The date of the confirmation.</param>
    public static AlertReviewResult Acknowledge(Alert alert, LocalDate date, Func<string, int> lastSequence) =>
        Gather([Step(new Reviewed(alert), AlertSignal.Acknowledge, date, evidence: null, lastSequence)]);

    /// <summary>Somebody wants not to be told of an alert up to a date; nothing changes where it does not stand or is shelved up to that date already.</summary>
    /// <param name="until">Last date, inclusive.</param>
    /// <param name="date">The date of the wish.</param>
    public static AlertReviewResult Shelve(Alert alert, LocalDate until, LocalDate date, Func<string, int> lastSequence) =>
        Gather([AlertLife.IsActive(alert.State) ? Shelving(new Reviewed(alert), until, AlertChangeReason.Shelved, date, lastSequence) : new Reviewed(alert)]);

    /// <summary>The wish is taken back; nothing changes where the alert is not shelved.</summary>
    /// <param name="date">The date on which it is taken back.</param>
    public static AlertReviewResult Unshelve(Alert alert, LocalDate date, Func<string, int> lastSequence) =>
        Gather([Shelving(new Reviewed(alert), null, AlertChangeReason.Unshelved, date, lastSequence)]);

    /// <summary>What stands goes on; what has returned is raised again, but for what is to wait for recordings that may be late.</summary>
    private static Reviewed Held(Alert alert, (Finding Finding, LocalDate From) told, Watching watching, Func<string, int> lastSequence)
    {
        var finding = told.Finding;
        if (!AlertLife.IsActive(alert.State) && told.From > finding.Date)
        {
            return new Reviewed(alert);
        }

        var judged = alert with { Judged = finding.Date, Severity = finding.Severity, Text = finding.Text, LimitsHash = watching.HashOf(finding.Rule) };
        var resumed = Step(new Reviewed(judged), AlertSignal.Resume, finding.Date, evidence: null, lastSequence);
        var stepped = Step(resumed, Signal(alert, finding), finding.Date, finding.Evidence, lastSequence);
        return HasPassed(alert.ShelvedUntil, finding.Date) || finding.Severity > alert.Severity
            ? Shelving(stepped, null, AlertChangeReason.Unshelved, finding.Date, lastSequence)
            : stepped;
    }

    /// <summary>What is suppressed goes on, as far as anybody can tell; everything else is over.</summary>
    private static Reviewed NotHeld(Alert alert, LocalDate date, AlertSignal why, Func<string, int> lastSequence) => why == AlertSignal.Suppress
        ? Step(new Reviewed(AlertLife.IsActive(alert.State) ? alert with { Judged = date } : alert), why, date, evidence: null, lastSequence)
        : Step(new Reviewed(alert with { ShelvedUntil = null }), why, date, evidence: null, lastSequence);

    /// <summary>
    /// Why a finding is not there. A rule that is off, or turned off by plan, says nothing, whatever came late; judged before on this very date, a later file undid
    /// it; else what changed counts only back at its last raising.
    /// </summary>
    private static AlertSignal Why(Alert alert, LocalDate date, HashSet<FindingKey> suppressed, Func<FindingKey, LocalDate, bool> heldOn, Watching watching) =>
        watching.WhyQuiet(alert) switch
        {
            QuietReason.RuleOff => AlertSignal.TakeOut,
            _ when suppressed.Contains(alert.Key) => AlertSignal.Suppress,
            QuietReason.SuppressedByPlan => AlertSignal.Mute,

            // Watched again, its rule counts anew: nobody has seen it end.
            _ when alert.Watch == AlertWatch.SuppressedByDesign => AlertSignal.Mute,
            _ when alert.Judged < date && heldOn(alert.Key, alert.StandsSince) => AlertSignal.Return,
            QuietReason.LimitsChanged => AlertSignal.ChangeLimits,
            _ => AlertSignal.Correct,
        };

    /// <summary>A date is evaluated on the day after it: that day is the first on which it can be told again.</summary>
    private static bool HasPassed(LocalDate? until, LocalDate evaluationDate) => evaluationDate >= until;

    private static AlertSignal Signal(Alert alert, Finding finding) => AlertLife.IsActive(alert.State)
        ? finding.Severity.CompareTo(alert.Severity) switch
        {
            > 0 => AlertSignal.SeverityRise,
            < 0 => AlertSignal.SeverityFall,
            _ => AlertSignal.Raise,
        }
        : AlertSignal.Raise;

    private static Reviewed RaiseNew(Finding finding, Watching watching, Func<string, int> lastSequence)
    {
        var alert = new Alert(finding.Key, finding.Date, finding.Date, AlertState.Normal, finding.Severity, finding.Text) { LimitsHash = watching.HashOf(finding.Rule) };
        return Step(new Reviewed(alert), AlertSignal.Raise, finding.Date, finding.Evidence, lastSequence);
    }

    private static Reviewed Step(Reviewed reviewed, AlertSignal signal, LocalDate date, Evidence? evidence, Func<string, int> lastSequence)
    {
        var alert = reviewed.Alert;
        if (AlertLife.Next(alert.State, alert.Watch, signal) is not { } step)
        {
            return reviewed;
        }

        var change = Change(alert, lastSequence(alert.Id) + 1 + reviewed.Changes.Length, date, step.To, step.Reason) with { Evidence = evidence };
        var since = step.Reason is AlertChangeReason.Raised or AlertChangeReason.RaisedAgain ? date : alert.StandsSince;
        return new Reviewed(alert with { State = step.To, Watch = step.Watch, StandsSince = since }, [.. reviewed.Changes, change]);
    }

    /// <summary>Sets or ends shelving behind what a review found already.</summary>
    private static Reviewed Shelving(Reviewed reviewed, LocalDate? until, AlertChangeReason reason, LocalDate date, Func<string, int> lastSequence)
    {
        var alert = reviewed.Alert;
        if (alert.ShelvedUntil == until)
        {
            return reviewed;
        }

        var change = Change(alert, lastSequence(alert.Id) + 1 + reviewed.Changes.Length, date, alert.State, reason);
        return new Reviewed(alert with { ShelvedUntil = until }, [.. reviewed.Changes, change]);
    }

    private static AlertChange Change(Alert alert, int sequence, LocalDate date, AlertState to, AlertChangeReason reason) =>
        new(alert.Id, sequence, date, alert.State, to, reason, alert.Severity, alert.Text, Evidence: null);

    private static AlertReviewResult Gather(IEnumerable<Reviewed> reviewed)
    {
        var ordered = reviewed.OrderBy(one => one.Alert.Id, StringComparer.Ordinal).ToList();
        return new AlertReviewResult([.. ordered.Select(one => one.Alert)], [.. ordered.SelectMany(one => one.Changes)]);
    }

    private readonly record struct Reviewed(Alert Alert, params AlertChange[] Changes);
}

/// <summary>What a review leaves behind, both in order of the alert's id.</summary>
/// <param name="Alerts">Every alert that was looked at and every new one, those that just became normal included.</param>
/// <param name="Changes">At most one for each alert, and one more each where its suppression and its shelving end.</param>
public sealed record AlertReviewResult(IReadOnlyList<Alert> Alerts, IReadOnlyList<AlertChange> Changes);
