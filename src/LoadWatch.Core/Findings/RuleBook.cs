namespace LoadWatch.Findings;

/// <summary>Every rule, in the order in which they are described.</summary>
public static class RuleBook
{
    public static IReadOnlyList<IRule> All { get; } = [new LoadRatioRule(), new StimulusGapRule(), new SilenceRule()];

    /// <summary>The findings of every date, sorted by date, name of the rule (ordinal), region and quantity.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject) =>
        All.SelectMany(rule => rule.Evaluate(subject))
            .OrderBy(finding => finding.Date)
            .ThenBy(finding => finding.Rule, StringComparer.Ordinal)
            .ThenBy(finding => finding.Region)
            .ThenBy(finding => finding.Quantity, StringComparer.Ordinal)
            .ToList();
}
