using LoadWatch.Findings;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Alerts;

/// <summary>What limits and plan say of a person's rules on an evaluation date.</summary>
/// <param name="Limits">In force for the person; null: nothing is said of them.</param>
/// <param name="Plan">Of the date.</param>
public sealed record Watching(RuleLimits? Limits, DayPlan Plan)
{
    /// <summary>Every rule is on, and no limit was ever changed.</summary>
    public static Watching Everything { get; } = new(null, DayPlan.None);

    /// <summary>How late the person's recordings usually come in; asked only where a finding rests on recordings that are missing.</summary>
    public Func<Lateness> Lateness { get; init; } = () => Alerts.Lateness.Unknown;

    /// <summary>Names the limits of a rule; null where nothing is said of them.</summary>
    public string? HashOf(string rule) => Limits is { } limits ? RuleBook.LimitsHash(rule, limits) : null;

    /// <summary>Why the rule of an alert may say nothing of it any more although it is not over.</summary>
    public QuietReason? WhyQuiet(Alert alert) => Limits is { } limits ? RuleBook.WhyQuiet(alert.Key.Rule, limits, Plan, alert.LimitsHash) : null;

    /// <summary>
    /// A finding as it is told, and from when on: what rests on recordings that are missing says how late they usually come, and is not raised before they had
    /// that time.
    /// </summary>
    public (Finding Finding, LocalDate From) Told(Finding finding)
    {
        if (Limits is not { } limits || RuleBook.Of(finding.Rule)?.Record.WaitedDays(finding, limits) is not { } waited || Lateness() is not { Days: > 0 } late)
        {
            return (finding, finding.Since);
        }

        return (Late(finding, late), finding.Since.PlusDays(Math.Max(0, late.Days - waited)));
    }

    private static Finding Late(Finding finding, Lateness late) => finding with
    {
        Text = $"{finding.Text} Files usually come within {Wording.Days(late.Days)}.",
        Evidence = finding.Evidence with
        {
            Inputs =
            [
                .. finding.Evidence.Inputs,
                new("lateness", late.Days, "days", FormattableString.Invariant($"within which {late.Dates} dates with a recording of the last {Alerts.Lateness.LookBackDays} days usually had one, the {Alerts.Lateness.Quantile} quantile")),
            ],
        },
    };
}
