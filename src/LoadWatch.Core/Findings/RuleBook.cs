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

    /// <summary>Those that read loads, which hang on reference values; what counted as heavy or fast on its date stays so.</summary>
    public static IReadOnlyList<IRule> OfLoad { get; } =
        [.. All.Where(rule => rule is LoadRatioRule or WeeklyJumpRule or SessionSpikeRule or MonotonyRule or HardDaysRule or FallingLoadRule)];

    /// <summary>The findings of every date by the rules that are on, sorted by date, name of the rule (ordinal), region and quantity.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject) => Evaluate(subject, All);

    /// <summary>The same by some rules alone.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject, IReadOnlyList<IRule> rules) =>
        InOrder(rules.Where(rule => rule.IsEnabled(subject.Limits)).SelectMany(rule => rule.Evaluate(subject)));

    internal static IReadOnlyList<Finding> InOrder(IEnumerable<Finding> findings) =>
        findings
            .OrderBy(finding => finding.Date)
            .ThenBy(finding => finding.Rule, StringComparer.Ordinal)
            .ThenBy(finding => finding.Region)
            .ThenBy(finding => finding.Quantity, StringComparer.Ordinal)
            .ToList();
}
