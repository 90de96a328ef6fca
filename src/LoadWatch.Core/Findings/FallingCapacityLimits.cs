using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>falling_capacity</c>: the best of the last weeks is below the best of the weeks before.</summary>
public sealed record FallingCapacityLimits : IRuleLimits
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
}
