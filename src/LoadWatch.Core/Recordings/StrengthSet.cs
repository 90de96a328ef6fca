using NodaTime;

namespace LoadWatch.Recordings;

/// <summary>One set of strength work, or the rest between two, as recorded. Unknown is null.</summary>
/// <param name="Start">Start of the set.</param>
/// <param name="DurationSeconds">Length in seconds, 0 or more.</param>
/// <param name="Active">True for work, false for the rest between sets.</param>
/// <param name="Exercise">The exercise by the category names of the FIT profile (<c>squat</c>, <c>bench_press</c>), or the word of a set log.</param>
/// <param name="Repetitions">0 or more.</param>
/// <param name="Kilograms">External load, 0 or more.</param>
/// <param name="RepetitionsInReserve">Repetitions that would still have been possible, 0 or more.</param>
public sealed record StrengthSet(
    Instant? Start,
    double? DurationSeconds,
    bool Active,
    string? Exercise,
    int? Repetitions,
    double? Kilograms,
    double? RepetitionsInReserve = null);
