using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>silence</c>: expected recordings did not come, by the rhythm of the person's own recordings. All a choice; missed sessions and extra days are fitted by simulation.</summary>
public sealed record SilenceLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Quantile of the person's own gaps between recorded days. 0 to 1.</summary>
    [Range(0.5, 1.0)]
    public double GapQuantile { get; init; } = 0.9;

    /// <summary>Days beyond that quantile. Days.</summary>
    [Range(0, 30)]
    public int ExtraDays { get; init; } = 3;

    /// <summary>Gaps wanted before a rhythm counts as known. Count.</summary>
    [Range(3, 100)]
    public int GapsWanted { get; init; } = 6;

    /// <summary>How far back gaps are looked at. Days.</summary>
    [Range(28, 400)]
    public int LookBackDays { get; init; } = 84;

    /// <summary>Where the plan expects recordings: planned sessions in a row without one. Count.</summary>
    [Range(1, 20)]
    public int PlannedMissed { get; init; } = 3;

    /// <summary>Days that a recording of a planned session may take to come in. Days.</summary>
    [Range(0, 14)]
    public int PlannedWaitDays { get; init; } = 2;

    /// <summary>Longer than this is silence whatever the person's own gaps were. Days.</summary>
    [Range(7, 400)]
    public int CeilingDays { get; init; } = 42;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
