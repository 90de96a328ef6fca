using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Findings;

/// <summary>Limits of the rule <c>function_test</c>: falls that are more than the error of the test. From memory, not re-read; configurable for that reason.</summary>
public sealed record FunctionTestLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Fall of grip strength. Kilograms.</summary>
    [Range(0.5, 30.0)]
    public double GripKilograms { get; init; } = 5;

    /// <summary>More seconds for five chair stands. Seconds.</summary>
    [Range(0.5, 30.0)]
    public double ChairStandSeconds { get; init; } = 2.5;

    /// <summary>Fall of gait speed. Metres per second.</summary>
    [Range(0.02, 1.0)]
    public double GaitMetresPerSecond { get; init; } = 0.1;

    /// <summary>More seconds for the timed up and go. Seconds.</summary>
    [Range(0.5, 30.0)]
    public double UpAndGoSeconds { get; init; } = 3;

    /// <summary>Fewer points of the short physical performance battery. Points.</summary>
    [Range(1.0, 12.0)]
    public double PerformanceBatteryPoints { get; init; } = 1;

    /// <summary>How long a test tells about a person. Days.</summary>
    [Range(30, 1000)]
    public int HoldDays { get; init; } = 365;
}
