namespace LoadWatch.Findings;

/// <summary>What the limits of every rule have.</summary>
public interface IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    bool Enabled { get; }
}
