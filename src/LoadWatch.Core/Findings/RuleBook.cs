namespace LoadWatch.Findings;

/// <summary>Every rule, in the order in which they are described.</summary>
public static class RuleBook
{
    public static IReadOnlyList<IRule> All { get; } =
    [
        new LoadRatioRule(),
        new WeeklyJumpRule(),
        new SessionSpikeRule(),
        new MonotonyRule(),
        new HardDaysRule(),
        new FallingLoadRule(),
        new StimulusGapRule(),
        new StimulusLowRule(),
        new FallingCapacityRule(),
        new SilenceRule(),
        new NotUsableRule(),
        new FunctionTestRule(),
    ];

    /// <summary>The findings of every date by the rules that are on, sorted by date, name of the rule (ordinal), region and quantity.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject) =>
        All.Where(rule => rule.IsEnabled(subject.Limits))
            .SelectMany(rule => rule.Evaluate(subject))
            .OrderBy(finding => finding.Date)
            .ThenBy(finding => finding.Rule, StringComparer.Ordinal)
            .ThenBy(finding => finding.Region)
            .ThenBy(finding => finding.Quantity, StringComparer.Ordinal)
            .ToList();
}
