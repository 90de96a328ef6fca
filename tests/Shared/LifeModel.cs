using CsCheck;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Tests;

/// <summary>
/// The life of one alert as facts alone: does it hold, was it seen, until when is it shelved, is its rule watched, since when does it stand, what was said of it last.
/// It knows neither the states nor their table.
/// </summary>
internal sealed class LifeModel(LocalDate first)
{
    private LocalDate date = first;
    private bool active;
    private bool acked = true;
    private bool suppressed;
    private bool outOfService;
    private bool warning;
    private LocalDate? shelved;
    private LocalDate? since;
    private AlertChangeReason? reason;

    public static Gen<LifeStep> AnyStep { get; } =
        Gen.Select(Gen.Enum<LifeStepKind>(), Gen.Bool, Gen.Int[0, 3], Gen.Bool, Gen.Bool, (kind, warning, days, crash, reopen) => new LifeStep(kind, warning, days, crash, reopen && crash));

    public LifeView Seen => new(
        active,
        acked,
        outOfService ? AlertWatch.OutOfService : suppressed ? AlertWatch.SuppressedByDesign : AlertWatch.Watched,
        shelved,
        since is null ? null : warning,
        since,
        reason);

    public void Take(LifeStep step)
    {
        date = step.IsNight ? date.PlusDays(1) : date;
        switch (step.Kind)
        {
            case LifeStepKind.NightWithFinding:
                Hold(step.Warning);
                break;
            case LifeStepKind.NightSuppressed when active && !suppressed:
                (suppressed, reason) = (true, AlertChangeReason.SuppressedByPlan);
                break;
            case LifeStepKind.NightMuted when active:
                EndUnseen();
                break;
            case LifeStepKind.NightRuleOff when active || !acked:
                (outOfService, suppressed, acked) = (true, false, true);
                End(AlertChangeReason.RuleSwitchedOff);
                break;
            case LifeStepKind.NightWithout or LifeStepKind.NightCorrected or LifeStepKind.NightOtherLimits when active && suppressed:
                EndUnseen();
                break;
            case LifeStepKind.NightWithout when active:
                End(AlertChangeReason.ReturnedToNormal);
                break;
            case LifeStepKind.NightCorrected when active:
                End(AlertChangeReason.Corrected);
                break;
            case LifeStepKind.NightOtherLimits when active:
                End(AlertChangeReason.LimitsChanged);
                break;
            case LifeStepKind.Acknowledge when !acked:
                (acked, reason) = (true, AlertChangeReason.Acknowledged);
                break;
            case LifeStepKind.Shelve when active && shelved != date.PlusDays(step.Days):
                (shelved, reason) = (date.PlusDays(step.Days), AlertChangeReason.Shelved);
                break;
            case LifeStepKind.Unshelve when shelved is not null:
                (shelved, reason) = (null, AlertChangeReason.Unshelved);
                break;
            default:
                break;
        }
    }

    private void Hold(bool graver)
    {
        var rises = active && graver && !warning;
        reason = (active, rises) switch
        {
            (false, _) => acked ? AlertChangeReason.Raised : AlertChangeReason.RaisedAgain,
            (_, true) => AlertChangeReason.SeverityRose,
            _ when warning && !graver => AlertChangeReason.SeverityFell,
            _ when suppressed => AlertChangeReason.WatchedAgain,
            _ => reason,
        };
        if (shelved is not null && (date >= shelved || rises))
        {
            (shelved, reason) = (null, AlertChangeReason.Unshelved);
        }

        since = active ? since : date;
        acked = active && acked && !rises;
        (active, warning, suppressed, outOfService) = (true, graver, false, false);
    }

    /// <summary>What stood suppressed was seen to end by nobody, and asks nobody to have seen it.</summary>
    private void EndUnseen()
    {
        (suppressed, acked) = (true, true);
        End(AlertChangeReason.SuppressedByPlan);
    }

    private void End(AlertChangeReason why) => (active, shelved, reason) = (false, null, why);
}

internal enum LifeStepKind
{
    NightWithFinding,
    NightWithout,
    NightCorrected,
    NightSuppressed,
    NightMuted,
    NightRuleOff,
    NightOtherLimits,
    Acknowledge,
    Shelve,
    Unshelve,
}

/// <param name="Days">Of a shelving, beyond the day.</param>
/// <param name="Crash">The first try ends before its commit.</param>
/// <param name="Reopen">What is kept is read anew in between.</param>
internal sealed record LifeStep(LifeStepKind Kind, bool Warning, int Days, bool Crash, bool Reopen)
{
    private static readonly RuleLimits Usual = new();

    public bool IsNight => Kind < LifeStepKind.Acknowledge;

    /// <summary>What the product makes of the step.</summary>
    /// <param name="open">Alerts that are not normal.</param>
    public AlertReviewResult Do(IReadOnlyList<Alert> open, LocalDate date, Func<string, int> last) => Kind switch
    {
        LifeStepKind.Acknowledge => Each(open, alert => AlertReview.Acknowledge(alert, date, last)),
        LifeStepKind.Shelve => Each(open, alert => AlertReview.Shelve(alert, date.PlusDays(Days), date, last)),
        LifeStepKind.Unshelve => Each(open, alert => AlertReview.Unshelve(alert, date, last)),
        _ => AlertReview.Review("anna", date, open, last, [.. Findings(date)], (_, _) => Kind == LifeStepKind.NightWithout, Watching),
    };

    private Watching Watching => Kind switch
    {
        LifeStepKind.NightMuted or LifeStepKind.NightSuppressed => new(Usual, DayPlan.None with { Absence = AbsenceWord.Away }),
        LifeStepKind.NightRuleOff => new(Usual with { StimulusGap = new() { Enabled = false } }, DayPlan.None),
        LifeStepKind.NightOtherLimits => new(Usual with { StimulusGap = new() { NoticeDays = 9 } }, DayPlan.None),
        _ => new(Usual, DayPlan.None),
    };

    private IEnumerable<Finding> Findings(LocalDate date)
    {
        if (Kind is LifeStepKind.NightWithFinding or LifeStepKind.NightSuppressed)
        {
            var severity = Kind == LifeStepKind.NightSuppressed ? Severity.Suppressed : Warning ? Severity.Warning : Severity.Notice;
            yield return new Finding("anna", date, "stimulus_gap", BodyRegion.Legs, severity, date, 10, 10, "days", "no heavy leg work", new Evidence("days", "a choice", []));
        }
    }

    private static AlertReviewResult Each(IReadOnlyList<Alert> alerts, Func<Alert, AlertReviewResult> act)
    {
        var results = alerts.Select(act).ToList();
        return new([.. results.SelectMany(result => result.Alerts)], [.. results.SelectMany(result => result.Changes)]);
    }
}

/// <summary>What can be seen of the newest alert: an earlier one is over for good once another was raised.</summary>
/// <param name="Warning">Null before any, as the two behind it.</param>
/// <param name="Reason">Of its last change.</param>
internal sealed record LifeView(
    bool Active, bool Acknowledged, AlertWatch Watch, LocalDate? ShelvedUntil, bool? Warning, LocalDate? StandsSince, AlertChangeReason? Reason)
{
    /// <param name="lastReason">Of an alert's last change, by its id.</param>
    public static LifeView Of(IEnumerable<Alert> alerts, Func<string, AlertChangeReason> lastReason) => alerts.MaxBy(alert => alert.Raised) is { } alert
        ? new(AlertLife.IsActive(alert.State), AlertLife.IsAcknowledged(alert.State), alert.Watch, alert.ShelvedUntil, alert.Severity == Severity.Warning, alert.StandsSince, lastReason(alert.Id))
        : new(false, true, AlertWatch.Watched, null, null, null, null);
}
