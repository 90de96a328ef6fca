namespace LoadWatch.Findings;

/// <summary>What the limits of every rule have.</summary>
public interface IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    bool Enabled { get; }
}

/// <summary>Limits of a rule with delays. A rule without them tells of an event, which needs none.</summary>
public interface IDelayedLimits : IRuleLimits
{
    /// <summary>Readable dates in a row with the condition before it is raised, 1 or more.</summary>
    int OnDays { get; }

    /// <summary>Readable dates in a row without it before it is over, 1 or more.</summary>
    int OffDays { get; }
}
