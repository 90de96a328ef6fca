using System.ComponentModel.DataAnnotations;
using System.Text.Json.Serialization;

namespace LoadWatch.Findings;

/// <summary>
/// Limits of the rule <c>function_test</c>: published cut-offs, and falls that are more than the error of the test. The cut-offs are those of EWGSOP2 (Cruz-Jentoft et al. 2019);
/// the errors are from memory, not re-read, and configurable for that reason.
/// </summary>
public sealed record FunctionTestLimits : IRuleLimits
{
    /// <summary>Whether the rule is watched at all.</summary>
    public bool Enabled { get; init; } = true;

    /// <summary>Published cut-off of grip strength for men; below it is told. Kilograms.</summary>
    [Range(1.0, 80.0)]
    public double GripCutOffMenKilograms { get; init; } = 27;

    /// <summary>Published cut-off of grip strength for women; below it is told. Kilograms.</summary>
    [Range(1.0, 80.0)]
    public double GripCutOffWomenKilograms { get; init; } = 16;

    /// <summary>Published cut-off of five chair stands; above it is told. From memory. Seconds.</summary>
    [Range(1.0, 120.0)]
    public double ChairStandCutOffSeconds { get; init; } = 15;

    /// <summary>Published cut-off of gait speed; at or below it is told. Metres per second.</summary>
    [Range(0.1, 3.0)]
    public double GaitCutOffMetresPerSecond { get; init; } = 0.8;

    /// <summary>Published cut-off of the timed up and go; at or above it is told. Seconds.</summary>
    [Range(1.0, 120.0)]
    public double UpAndGoCutOffSeconds { get; init; } = 20;

    /// <summary>Published cut-off of the short physical performance battery; at or below it is told. From memory. Points.</summary>
    [Range(0.0, 12.0)]
    public double PerformanceBatteryCutOffPoints { get; init; } = 8;

    /// <summary>Published cut-off of the 400 m walk; at or above it is told. From memory. Seconds.</summary>
    [Range(60.0, 1800.0)]
    [JsonPropertyName("walk_400_cut_off_seconds")]
    public double Walk400CutOffSeconds { get; init; } = 360;

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

    /// <summary>Share of a test's error by which a later one must be better than the limit to end it. A choice. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double ReturnShare { get; init; } = 0.2;

    /// <summary>How long a test tells about a person. Days.</summary>
    [Range(30, 1000)]
    public int HoldDays { get; init; } = 365;

    /// <summary>As what it is raised. A choice.</summary>
    public RaisedAs Severity { get; init; } = RaisedAs.Notice;
}
