
namespace LoadWatch.Findings;

/// <summary>One rule. Pure: the same days give the same findings.</summary>
public interface IRule
{
    /// <summary>Lower-case words joined by underscores; part of alert ids.</summary>
    string Name { get; }

    /// <summary>Why it may ask for attention.</summary>
    RuleRecord Record { get; }

    /// <summary>Its own among the limits.</summary>
    IRuleLimits LimitsOf(RuleLimits limits);

    /// <summary>
    /// The findings of every date of the subject on which the rule holds, in date order. Raise and return values make the run; an unknown
    /// stretch alone neither raises nor clears (I-6).
    /// </summary>
    IEnumerable<Finding> Evaluate(RuleSubject subject);
}
