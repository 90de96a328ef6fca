using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>stimulus_low</c>: too few heavy-or-fast days of a body region in 14 days. All a choice.</summary>
public sealed record StimulusLowLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Share of the person's usual heavy-or-fast days in 14 days; fewer raise a notice. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double UsualShare { get; init; } = 0.5;

    /// <summary>Under <see cref="OlderFrom"/>: heavy-or-fast days in 14 days; fewer raise a notice. Days; 0: none.</summary>
    [Range(0, 14)]
    public int FloorDays { get; init; } = 2;

    /// <summary>Age from which <see cref="OlderFloorDays"/> counts. Years.</summary>
    [Range(40, 100)]
    public int OlderFrom { get; init; } = 60;

    /// <summary>From <see cref="OlderFrom"/>: the same. Days; 0: none.</summary>
    [Range(0, 14)]
    public int OlderFloorDays { get; init; } = 3;

    /// <summary>Off until the region has been covered for so long. Days.</summary>
    [Range(28, 365)]
    public int HistoryDays { get; init; } = 56;

    /// <summary>Share of the 14 days on which the region's stimulus was known; below it nothing changes. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double CoveredShare { get; init; } = 0.7;
}
