using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>session_spike</c>: one session far beyond the longest of the days before.</summary>
public sealed record SessionSpikeLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>A run this fraction or more beyond the longest one raises a notice. The higher band of a cohort of runners; as a limit fitted by simulation. Fraction.</summary>
    [Range(0.05, 5.0)]
    public double RunNotice { get; init; } = 0.3;

    /// <summary>A run this fraction or more beyond the longest one raises a warning. Fitted by simulation. Fraction.</summary>
    [Range(0.05, 10.0)]
    public double RunWarning { get; init; } = 0.6;

    /// <summary>Runs with a distance wanted in the days before. A choice. Count.</summary>
    [Range(3, 60)]
    public int RunsWanted { get; init; } = 8;

    /// <summary>Any other session whose load lies this fraction or more beyond the largest one raises a notice. Fitted by simulation. Fraction.</summary>
    [Range(0.05, 5.0)]
    public double LoadNotice { get; init; } = 0.6;

    /// <summary>Any other session whose load lies this fraction or more beyond the largest one raises a warning. A choice. Fraction.</summary>
    [Range(0.05, 10.0)]
    public double LoadWarning { get; init; } = 1;

    /// <summary>Sessions with known load wanted in the days before. Fitted by simulation. Count.</summary>
    [Range(3, 120)]
    public int SessionsWanted { get; init; } = 4;

    /// <summary>The days before. Days.</summary>
    [Range(14, 90)]
    public int LookBackDays { get; init; } = 30;

    /// <summary>Known dates after the session's own on which it stands. A choice. Days.</summary>
    [Range(0, 14)]
    public int HoldDays { get; init; } = 3;
}
