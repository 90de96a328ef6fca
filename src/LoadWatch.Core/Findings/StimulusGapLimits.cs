using System.ComponentModel.DataAnnotations;
using LoadWatch.Stimulus;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>stimulus_gap</c>: too long without heavy or fast work of a body region. All a choice; the days to a notice are fitted by simulation.</summary>
public sealed record StimulusGapLimits : IRuleLimits
{
    private static readonly IReadOnlyList<BodyRegion> LegsOnly = [BodyRegion.Legs];

    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Body regions that are watched: legs, trunk, arms.</summary>
    public IReadOnlyList<BodyRegion> Regions { get; init; } = LegsOnly;

    /// <summary>Days without heavy or fast work that raise a notice. Days.</summary>
    [Range(2, 120)]
    public int NoticeDays { get; init; } = 12;

    /// <summary>Under <see cref="OlderFrom"/>: days that raise a warning. Days.</summary>
    [Range(2, 180)]
    public int WarningDays { get; init; } = 14;

    /// <summary>Age from which the person's own usual gap counts. Years.</summary>
    [Range(40, 100)]
    public int OlderFrom { get; init; } = 60;

    /// <summary>From <see cref="OlderFrom"/>: the notice comes at this multiple of the usual gap, if later. Dimensionless.</summary>
    [Range(1.0, 5.0)]
    public double OlderUsualGapFactor { get; init; } = 2;

    /// <summary>From <see cref="OlderFrom"/>: days that raise a warning at the earliest. Days.</summary>
    [Range(2, 180)]
    public int OlderWarningDays { get; init; } = 21;

    /// <summary>From <see cref="OlderFrom"/>: days from notice to warning at the least. Days.</summary>
    [Range(1, 60)]
    public int OlderWarningAfterNoticeDays { get; init; } = 7;

    /// <summary>Share of the gap's days on which the region's stimulus was known; below it nothing is raised. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double CoveredShare { get; init; } = 0.7;

    /// <summary>Whether enough of the days of a gap are known.</summary>
    public bool KnownEnough(int knownDays, int days) => knownDays >= Significant.Round(CoveredShare * days);
}
