using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>One set of strength work, or the rest between two, as recorded. Unknown is null.</summary>
/// <param name="Start">Start of the set.</param>
/// <param name="DurationSeconds">Length in seconds, 0 or more; of a hold, the seconds held.</param>
/// <param name="Active">True for work, false for the rest between sets.</param>
/// <param name="Exercise">The exercise by the category names of the FIT profile (<c>squat</c>, <c>bench_press</c>), or the word of a set log.</param>
/// <param name="Repetitions">0 or more.</param>
/// <param name="Kilograms">External load, 0 or more; 0 is body weight.</param>
/// <param name="RepetitionsInReserve">Repetitions that would still have been possible, 0 or more.</param>
public sealed record StrengthSet(
    Instant? Start,
    double? DurationSeconds,
    bool Active,
    string? Exercise,
    int? Repetitions,
    double? Kilograms,
    double? RepetitionsInReserve = null)
{
    /// <summary>Which machine, in the gym's own words; null for free weights or where it was not written down.</summary>
    public string? Machine { get; init; }

    /// <summary>How hard it was, 0 to 10; at 10 nothing was left.</summary>
    public double? Hardness { get; init; }

    public SetLoad Load { get; init; }

    /// <summary>Number of the pin in a stack; no kilograms.</summary>
    public double? Pin { get; init; }

    /// <summary>Held without moving.</summary>
    public bool IsHold { get; init; }

    /// <summary>Declared fast: jumps, throws, lifts as fast as possible.</summary>
    public bool IsFast { get; init; }

    /// <summary>Measured mean speed of the lifting phase, metres per second, above 0.</summary>
    public double? BarSpeedMetresPerSecond { get; init; }

    /// <summary>Length of the lifting phase of one repetition in seconds, above 0.</summary>
    public double? ConcentricSeconds { get; init; }
}
