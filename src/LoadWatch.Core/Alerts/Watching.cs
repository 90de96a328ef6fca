using LoadWatch.Findings;
using LoadWatch.Plans;

namespace LoadWatch.Alerts;

/// <summary>What limits and plan say of a person's rules on an evaluation date.</summary>
/// <param name="Limits">In force for the person; null: nothing is said of them.</param>
/// <param name="Plan">Of the date.</param>
public sealed record Watching(RuleLimits? Limits, DayPlan Plan)
{
    /// <summary>Every rule is on, and no limit was ever changed.</summary>
    public static Watching Everything { get; } = new(null, DayPlan.None);

    /// <summary>Names the limits of a rule; null where nothing is said of them.</summary>
    public string? HashOf(string rule) => Limits is { } limits ? RuleBook.LimitsHash(rule, limits) : null;

    /// <summary>Why the rule of an alert may say nothing of it any more although it is not over.</summary>
    public QuietReason? WhyQuiet(Alert alert) => Limits is { } limits ? RuleBook.WhyQuiet(alert.Key.Rule, limits, Plan, alert.LimitsHash) : null;
}
