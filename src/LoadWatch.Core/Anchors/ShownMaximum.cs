using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>A one-repetition maximum that the sets of one session let expect.</summary>
/// <param name="Exercise">In canonical form (<see cref="ExerciseWord"/>).</param>
/// <param name="Machine">Likewise; null without one.</param>
public sealed record ShownMaximum(LocalDate Date, string Exercise, string? Machine, double Kilograms);
