using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>hard_days</c>: too many hard days in a row, or too many matches close together. All a choice.</summary>
public sealed record HardDaysLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>A day is hard when its load exceeds the median training day by this factor. Dimensionless.</summary>
    [Range(1.0, 3.0)]
    public double MedianFactor { get; init; } = 1.3;

    /// <summary>Hard days in a row that raise a notice. Days.</summary>
    [Range(2, 10)]
    public int Days { get; init; } = 4;

    /// <summary>How far back training days are looked at for the median. Days.</summary>
    [Range(28, 112)]
    public int LookBackDays { get; init; } = 56;

    /// <summary>Training days with known load wanted for the median. Days.</summary>
    [Range(5, 56)]
    public int TrainingDaysWanted { get; init; } = 12;

    /// <summary>Match days that raise a notice. Days.</summary>
    [Range(2, 7)]
    public int Matches { get; init; } = 3;

    /// <summary>Within so many days. Days.</summary>
    [Range(3, 21)]
    public int MatchDays { get; init; } = 8;
}
