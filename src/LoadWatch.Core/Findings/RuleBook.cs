using System.Security.Cryptography;
using System.Text.Json;
using LoadWatch.Plans;

namespace LoadWatch.Findings;

/// <summary>Every rule, in the order in which they are described.</summary>
public static class RuleBook
{
    public static IReadOnlyList<IRule> All { get; } = Registered(
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
        new TestOverdueRule());

    /// <summary>A rule that does not say why it may ask for attention is refused.</summary>
    /// <exception cref="ArgumentException">A record has a blank part, or two rules share a name or a rank.</exception>
    public static IReadOnlyList<IRule> Registered(params IReadOnlyList<IRule> rules)
    {
        var faults = rules.SelectMany(rule => rule.Record.Missing(rule.Name).Select(field => $"{rule.Name} has no {field}"))
            .Concat(Twice(rules, rule => $"name {rule.Name}"))
            .Concat(Twice(rules, rule => $"rank {rule.Record.Rank}"))
            .ToList();
        return faults.Count == 0 ? rules : throw new ArgumentException(string.Join("; ", faults), nameof(rules));
    }

    private static IEnumerable<string> Twice(IReadOnlyList<IRule> rules, Func<IRule, string> of) =>
        rules.GroupBy(of, StringComparer.Ordinal).Where(same => same.Count() > 1).Select(same => $"{same.Key} stands twice");

    /// <summary>Those that read loads, which hang on reference values; what counted as heavy or fast on its date stays so.</summary>
    public static IReadOnlyList<IRule> OfLoad { get; } =
        [.. All.Where(rule => rule is LoadRatioRule or WeeklyJumpRule or SessionSpikeRule or MonotonyRule or HardDaysRule or FallingLoadRule)];

    /// <summary>Null for a name that no rule has: one of a former version.</summary>
    public static IRule? Of(string name) => All.FirstOrDefault(rule => rule.Name == name);

    /// <summary>Names the limits of one rule in force, 16 hex digits: equal if and only if every limit of the rule is. Empty for a name that no rule has.</summary>
    public static string LimitsHash(string rule, RuleLimits limits) => Of(rule)?.LimitsOf(limits) is { } own
        ? Convert.ToHexStringLower(SHA256.HashData(JsonSerializer.SerializeToUtf8Bytes(own, own.GetType())))[..16]
        : "";

    /// <summary>Why a rule that said something of somebody before says nothing on a date; null: because it is over, or later data undid it.</summary>
    /// <param name="limits">In force for the person.</param>
    /// <param name="plan">Of the date.</param>
    /// <param name="hashBefore"><see cref="LimitsHash"/> when it said so; null: not known.</param>
    public static QuietReason? WhyQuiet(string rule, RuleLimits limits, DayPlan plan, string? hashBefore) =>
        Of(rule)?.LimitsOf(limits) is not { Enabled: true } ? QuietReason.RuleOff
            : PlanMutes.Of(rule, plan) is not null ? QuietReason.SuppressedByPlan
            : hashBefore is not null && hashBefore != LimitsHash(rule, limits) ? QuietReason.LimitsChanged
            : null;

    /// <summary>The findings of every date by the rules that are on, sorted by date, name of the rule (ordinal), region and quantity.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject) => Evaluate(subject, All);

    /// <summary>The same by some rules alone.</summary>
    public static IReadOnlyList<Finding> Evaluate(RuleSubject subject, IReadOnlyList<IRule> rules) =>
        InOrder(rules.Where(rule => rule.LimitsOf(subject.Limits).Enabled).SelectMany(rule => rule.Evaluate(subject)));

    internal static IReadOnlyList<Finding> InOrder(IEnumerable<Finding> findings) =>
        findings
            .OrderBy(finding => finding.Date)
            .ThenBy(finding => finding.Rule, StringComparer.Ordinal)
            .ThenBy(finding => finding.Region)
            .ThenBy(finding => finding.Quantity, StringComparer.Ordinal)
            .ToList();
}
