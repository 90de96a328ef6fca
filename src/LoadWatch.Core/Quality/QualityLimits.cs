using System.ComponentModel.DataAnnotations;

namespace LoadWatch.Quality;

/// <summary>
/// From when on a heart rate is no reading of the person, each at its default. There is no standard, studies clean by limits of their own; the defaults are
/// assumptions. In print, beats were replaced that changed by more than 30 bpm from one to the next, and cleaning took bad data from 9.0 to 4.4 % of 126 hours
/// of football (Joosen 2013).
/// </summary>
public sealed record QualityLimits
{
    /// <summary>Largest change of heart rate within a second, bpm; a level that is jumped to and from again is cut. An assumption.</summary>
    [Range(1.0, 250.0)]
    public double HeartRateBpmPerSecond { get; init; } = 10;

    /// <summary>Largest change of heart rate within five seconds, bpm; likewise. An assumption.</summary>
    [Range(1.0, 250.0)]
    public double HeartRateBpmInFiveSeconds { get; init; } = 25;

    /// <summary>Longest time for which heart rate may show one value while power or speed varies, seconds. An assumption.</summary>
    [Range(30, 86_400)]
    public int HeartRateFlatSeconds { get; init; } = 60;

    /// <summary>How long heart rate must follow cadence or steps to be taken for them, seconds. An assumption.</summary>
    [Range(10, 86_400)]
    public int HeartRateOnCadenceSeconds { get; init; } = 30;

    /// <summary>How far above the person's maximum, anchored or by age, a heart rate may lie, bpm. An assumption.</summary>
    [Range(0, 250)]
    public int HeartRateAboveMaximumBpm { get; init; } = 15;
}
