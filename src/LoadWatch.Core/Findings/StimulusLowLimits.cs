using System.ComponentModel.DataAnnotations;
using LoadWatch.Stimulus;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>stimulus_low</c>: too few heavy-or-fast days of a body region in 14 days. All a choice; share and floor are fitted by simulation.</summary>
public sealed record StimulusLowLimits : IDelayedLimits
{
    private static readonly IReadOnlyList<BodyRegion> LegsOnly = [BodyRegion.Legs];

    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Body regions that are watched: legs, trunk, arms.</summary>
    public IReadOnlyList<BodyRegion> Regions { get; init; } = LegsOnly;

    /// <summary>Share of the person's usual heavy-or-fast days in 14 days; fewer raise it. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double UsualShare { get; init; } = 0.35;

    /// <summary>Under <see cref="OlderFrom"/>: heavy-or-fast days in 14 days; fewer raise it. Days; 0: none.</summary>
    [Range(0, 14)]
    public int FloorDays { get; init; } = 2;

    /// <summary>Age from which <see cref="OlderFloorDays"/> counts. Years.</summary>
    [Range(40, 100)]
    public int OlderFrom { get; init; } = 60;

    /// <summary>From <see cref="OlderFrom"/>: the same. Days; 0: none.</summary>
    [Range(0, 14)]
    public int OlderFloorDays { get; init; } = 2;

    /// <summary>Days above the limit that end it, as far as the usual reaches so high. Days.</summary>
    [Range(0, 7)]
    public int ReturnExtraDays { get; init; } = 1;

    /// <summary>Off until the region has been covered for so long. Days.</summary>
    [Range(28, 365)]
    public int HistoryDays { get; init; } = 56;

    /// <summary>Share of the 14 days on which the region's stimulus was known; below it nothing changes. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double CoveredShare { get; init; } = 0.7;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. A choice. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 3;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
