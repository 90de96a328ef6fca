// One-repetition maximum from a set: kilograms / share of the maximum that repetitions to failure allow (OneRepetitionMaxEquations: the load chart, or
// another that was chosen). Repetitions to failure: done and in reserve, 12 at most together; a set without a stated reserve says nothing here,
// nor do holds, fast sets (they end long before failure), bands and what hangs on body weight.
using LoadWatch.Recordings;
using LoadWatch.Stimulus;

namespace LoadWatch.Loads;

/// <summary>The largest maximum that the sets of a session let expect, by exercise and machine.</summary>
public static class OneRepetitionMaxEstimate
{
    /// <summary>One quantity for each exercise on each machine with a set that tells, in kilograms, marked as estimated.</summary>
    public static IEnumerable<Quantity> Of(IEnumerable<StrengthSet> work, OneRepetitionMaxEquation equation) => work
        .Where(set => ExerciseWord.Canonical(set.Exercise) is not null)
        .Select(set => (Name: NameOf(set.Exercise, set.Machine), Kilograms: KilogramsOf(set, equation)))
        .Where(set => set.Kilograms.HasValue)
        .GroupBy(set => set.Name, StringComparer.Ordinal)
        .Select(same => new Quantity(same.Key, same.Max(set => set.Kilograms!.Value), "kg", Estimated: true));

    /// <summary>Null where load, repetitions or reserve are unknown or too many.</summary>
    public static double? KilogramsOf(StrengthSet set, OneRepetitionMaxEquation equation) =>
        set is { IsHold: false, IsFast: false }
        && new StatedSet(set) is { Kilograms: { } kilograms, Repetitions: { } repetitions, Reserve: { } reserve }
        && equation.Share(repetitions + reserve) is { } share
            ? Significant.Round(kilograms / share)
            : null;

    /// <summary><c>one_repetition_max_of_leg_press</c>, <c>one_repetition_max_of_leg_press_on_press_2</c>.</summary>
    internal static string NameOf(string? exercise, string? machine)
    {
        var words = ExerciseWord.Canonical(exercise) + (ExerciseWord.Canonical(machine) is { } word ? $"_on_{word}" : "");
        return QuantityNames.OneRepetitionMaxOf + string.Concat(words.Select(letter => char.IsAsciiLetterOrDigit(letter) ? letter : '_'));
    }
}
