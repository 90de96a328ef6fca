using LoadWatch.Days;
using LoadWatch.People;

namespace LoadWatch.Findings;

/// <summary>Every rule, in the order in which they are described.</summary>
public static class RuleBook
{
    /// <summary>For a load in arbitrary units.</summary>
    public static IReadOnlyList<IRule> All { get; } = For(LoadRatioRule.ArbitraryUnits);

    /// <param name="loadUnit">Unit of the group's load quantity.</param>
    public static IReadOnlyList<IRule> For(string loadUnit) => [new LoadRatioRule(loadUnit), new StimulusGapRule(), new SilenceRule()];

    /// <summary>The findings of every date, sorted by date, name of the rule (ordinal) and region.</summary>
    /// <param name="days">Unbroken days of the person, oldest first.</param>
    /// <param name="loadUnit">Unit of the group's load quantity, for texts and evidence.</param>
    public static IReadOnlyList<Finding> Evaluate(
        Person person,
        IReadOnlyList<Day> days,
        RuleLimits limits,
        string loadUnit = LoadRatioRule.ArbitraryUnits) =>
        For(loadUnit)
            .SelectMany(rule => rule.Evaluate(person, days, limits))
            .OrderBy(finding => finding.Date)
            .ThenBy(finding => finding.Rule, StringComparer.Ordinal)
            .ThenBy(finding => finding.Region)
            .ToList();
}
