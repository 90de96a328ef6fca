using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>hard_days</c>: too many hard days in a row, or too many matches close together. All a choice.</summary>
public sealed record HardDaysLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>A day is hard when its load exceeds the median training day by this factor. Dimensionless.</summary>
    [Range(1.0, 3.0)]
    public double MedianFactor { get; init; } = 1.3;

    /// <summary>It is over with a day at or below this multiple of the median; between the two factors a day neither counts nor ends it. Dimensionless.</summary>
    [Range(0.5, 3.0)]
    public double ReturnFactor { get; init; } = 1.2;

    /// <summary>Hard days in a row that raise it. Days.</summary>
    [Range(2, 10)]
    public int Days { get; init; } = 4;

    /// <summary>How far back training days are looked at for the median. Days.</summary>
    [Range(28, 112)]
    public int LookBackDays { get; init; } = 56;

    /// <summary>Training days with known load wanted for the median. Days.</summary>
    [Range(5, 56)]
    public int TrainingDaysWanted { get; init; } = 12;

    /// <summary>Match days that raise it. Days.</summary>
    [Range(2, 7)]
    public int Matches { get; init; } = 3;

    /// <summary>Over with so many match days within them, or fewer. Days.</summary>
    [Range(0, 6)]
    public int MatchesReturn { get; init; } = 1;

    /// <summary>Within so many days. Days.</summary>
    [Range(3, 21)]
    public int MatchDays { get; init; } = 8;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. A choice. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 1;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 2;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
