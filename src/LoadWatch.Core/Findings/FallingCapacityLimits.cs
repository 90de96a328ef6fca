using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>falling_capacity</c>: the best of the last weeks is below the best of the weeks before.</summary>
public sealed record FallingCapacityLimits : IDelayedLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Length of each of the two stretches. A choice. Days.</summary>
    [Range(28, 84)]
    public int Days { get; init; } = 56;

    /// <summary>Sessions with the quantity wanted in each stretch. A choice. Count.</summary>
    [Range(2, 50)]
    public int SessionsWanted { get; init; } = 4;

    /// <summary>Fall of the top speed beyond its error. A choice: what a satellite receiver and a day's form blur. Percent.</summary>
    [Range(1.0, 50.0)]
    public double SpeedPercent { get; init; } = 7;

    /// <summary>Fall of the top power beyond its error. A choice. Percent.</summary>
    [Range(1.0, 50.0)]
    public double PowerPercent { get; init; } = 10;

    /// <summary>Fall of an estimated one-repetition maximum beyond its error: 10.6 to 13.5 % of the mean in direct tests. Percent.</summary>
    [Range(1.0, 50.0)]
    public double OneRepetitionMaxPercent { get; init; } = 14;

    /// <summary>Fall of critical power, or critical speed, that matters. A choice. Percent.</summary>
    [Range(1.0, 50.0)]
    public double CriticalPercent { get; init; } = 5;

    /// <summary>Fall of critical power, or critical speed, that its error leaves sure: both limits are to be passed. A choice. Combined standard errors.</summary>
    [Range(1.0, 10.0)]
    public double CriticalErrors { get; init; } = 2;

    /// <summary>Over when the fall is this share of the error, or less. A choice. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double ReturnShare { get; init; } = 0.7;

    /// <summary>Dates in a row, of those that can be read, on which it must be so before it is raised. A choice. Days.</summary>
    [Range(1, 14)]
    public int OnDays { get; init; } = 1;

    /// <summary>Dates in a row, of those that can be read, on which it must be so no more before it is over. A choice. Days.</summary>
    [Range(1, 14)]
    public int OffDays { get; init; } = 1;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
