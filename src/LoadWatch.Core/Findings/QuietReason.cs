namespace LoadWatch.Findings;

/// <summary>Why a rule says nothing of somebody any more although nothing says that it is over.</summary>
public enum QuietReason
{
    /// <summary>The limits in force turn the rule off.</summary>
    RuleOff,

    /// <summary>Plan or answers turn it off for a while (<see cref="PlanMutes"/>).</summary>
    SuppressedByPlan,

    /// <summary>It is watched by other limits than before.</summary>
    LimitsChanged,
}
