// One-repetition maximum from a set: kilograms / share of the maximum that repetitions to failure allow (LoadChart: the training load chart of the National
// Strength and Conditioning Association). Repetitions to failure: done and in reserve, 12 at most together; a set without a stated reserve says nothing here.
// Error of such estimates: 10.6 to 13.5 % of the mean in direct tests.
using LoadWatch.Recordings;
using LoadWatch.Stimulus;

namespace LoadWatch.Loads;

/// <summary>The largest maximum that the sets of a session let expect, by exercise.</summary>
public static class OneRepetitionMaxEstimate
{
    /// <summary>One quantity for each exercise with a set that tells, in kilograms, marked as estimated.</summary>
    public static IEnumerable<Quantity> Of(IEnumerable<StrengthSet> work) => work
        .Where(set => set.Exercise is not null)
        .Select(set => (Name: NameOf(set.Exercise!), Kilograms: KilogramsOf(set)))
        .Where(set => set.Kilograms.HasValue)
        .GroupBy(set => set.Name, StringComparer.Ordinal)
        .Select(same => new Quantity(same.Key, same.Max(set => set.Kilograms!.Value), "kg", Estimated: true));

    /// <summary>Null where load, repetitions or reserve are unknown or too many.</summary>
    public static double? KilogramsOf(StrengthSet set) =>
        set is { Kilograms: > 0 and <= SetTotals.MostKilograms, Repetitions: >= 1, RepetitionsInReserve: >= 0 }
        && LoadChart.Share(set.Repetitions.Value + set.RepetitionsInReserve.Value) is { } share
            ? Significant.Round(set.Kilograms.Value / share)
            : null;

    private static string NameOf(string exercise) => QuantityNames.OneRepetitionMaxOf
        + string.Concat(exercise.ToLowerInvariant().Select(letter => char.IsAsciiLetterOrDigit(letter) ? letter : '_'));
}
