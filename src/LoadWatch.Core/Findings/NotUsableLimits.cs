using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>not_usable</c>: recordings came, but too little of them can be used. All a choice.</summary>
public sealed record NotUsableLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Sessions that raise a notice. Count.</summary>
    [Range(1, 20)]
    public int Sessions { get; init; } = 2;

    /// <summary>Within so many days. Days.</summary>
    [Range(1, 28)]
    public int Days { get; init; } = 7;

    /// <summary>Share of the sampled time with a usable reading below which a channel is of no use. 0 to 1.</summary>
    [Range(0.05, 1.0)]
    public double UsableShare { get; init; } = 0.5;
}
