using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>Exercises to ask about: words of working sets that the table of body regions does not hold.</summary>
public static class UnknownExercises
{
    /// <summary>Each once, in canonical form, in ordinal order. A set without an exercise names none.</summary>
    public static IReadOnlyList<string> Of(IEnumerable<StrengthSet> sets, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises) =>
    [
        .. sets.Where(set => set.Active)
            .Select(set => ExerciseWord.Canonical(set.Exercise))
            .OfType<string>()
            .Where(word => RegionsOf(word, exercises).Count == 0)
            .Distinct(StringComparer.Ordinal)
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>Empty for an exercise, however written, that the table does not hold.</summary>
    internal static IReadOnlyList<BodyRegion> RegionsOf(string? exercise, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises) =>
        ExerciseWord.Canonical(exercise) is { } word && exercises.TryGetValue(word, out var regions) ? regions : [];
}
