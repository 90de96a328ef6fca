using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;

namespace LoadWatch.Notices;

/// <summary>
/// What a brief says about rules: the words of their records (<see cref="RuleRecord"/>), and plain ones for a rule that a former version had. <c>self</c> speaks to
/// the person.
/// </summary>
public static class RuleTexts
{
    private static readonly string[] Places = [.. RuleBook.All.Select(rule => rule.Name)];

    /// <summary>Where a rule stands among the reasons of one person: as in <see cref="RuleBook"/>, any other last.</summary>
    public static int Order(string rule) => Array.IndexOf(Places, rule) is >= 0 and var place ? place : Places.Length;

    /// <summary>Which reasons are named first where a brief cannot name everybody; less is graver.</summary>
    public static int Rank(string rule) => RuleBook.Of(rule)?.Record.Rank ?? Places.Length;

    /// <summary>After a count of people: <c>well above their usual</c>.</summary>
    public static string Counted(FindingKey key) => RuleBook.Of(key.Rule)?.Record.Counted(key) ?? $"with {Words(key.Rule)}";

    /// <summary>As the thing itself: <c>load well above the usual</c>.</summary>
    public static string Named(FindingKey key, bool self) => RuleBook.Of(key.Rule)?.Record.Named(key, self) ?? Words(key.Rule);

    /// <summary>After the word "Consider".</summary>
    public static string Consider(FindingKey key, bool self) =>
        RuleBook.Of(key.Rule)?.Record.Response(key, self) ?? "a look at the numbers behind it before changing anything.";

    /// <summary>Within which time a look makes a difference, a sentence; empty where that is not known.</summary>
    public static string TimeToRespond(string rule) => RuleBook.Of(rule)?.Record.TimeToRespond ?? "";

    /// <summary>Who decides, as the reader of this role is told.</summary>
    public static string Decides(string rule, ContactRole role) => (RuleBook.Of(rule)?.Record.Deciders ?? Deciders.CoachAndPerson).For(role);

    /// <summary>How an alert ended.</summary>
    /// <param name="limits">In force for the person.</param>
    /// <param name="plan">What plan and answers say of the last date: a rule that they turn off has not seen the end.</param>
    public static string Returned(AlertNews news, RuleLimits limits, DayPlan plan, bool self)
    {
        var key = news.Alert.Key;
        return (news.Ended, RuleBook.WhyQuiet(key.Rule, limits, plan, hashBefore: null)) switch
        {
            (AlertChangeReason.RuleSwitchedOff, _) or (_, QuietReason.RuleOff) => Quiet(key, QuietReason.RuleOff, plan, self),
            (AlertChangeReason.LimitsChanged, _) => Quiet(key, QuietReason.LimitsChanged, plan, self),
            (AlertChangeReason.SuppressedByPlan, _) => Quiet(key, QuietReason.SuppressedByPlan, plan, self),
            _ when news.Corrected => $"{Named(key, self)}: corrected by a later file",
            (_, { } reason) => Quiet(key, reason, plan, self),
            _ => RuleBook.Of(key.Rule)?.Record.Returned(key, limits, self) ?? $"{Words(key.Rule)}: back to usual",
        };
    }

    /// <summary>Why nothing is said any more of what nobody has seen end.</summary>
    public static string Quiet(FindingKey key, QuietReason reason, DayPlan plan, bool self) => reason switch
    {
        QuietReason.RuleOff => $"{Named(key, self)}: not watched any more, the rule is turned off",
        QuietReason.LimitsChanged => $"{Named(key, self)}: watched by other limits now",
        QuietReason.SuppressedByPlan => $"{Named(key, self)}: not watched {While(key.Rule, PlanMutes.Of(key.Rule, plan))}",
        _ => throw new ArgumentOutOfRangeException(nameof(reason)),
    };

    private static string While(string rule, PlannedState? state) => state switch
    {
        null => "up to now",
        PlannedState.LightWeek or PlannedState.OffSeason => "in light weeks and the off-season",
        _ => PlanMutes.Of(rule).Contains(PlannedState.Returning) ? "while away or returning" : "while away",
    };

    private static string Words(string rule) => rule.Replace('_', ' ');
}
