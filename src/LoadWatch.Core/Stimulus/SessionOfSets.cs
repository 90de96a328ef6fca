using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>Sorts the working sets of a session into body regions and reads each. An exercise without a region is asked for, not
/// guessed.</summary>
public static class SessionOfSets
{
    public static SessionStimulus Of(
        IReadOnlyList<StrengthSet> work,
        LocalDate date,
        string person,
        AnchorBook anchors,
        IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises)
    {
        var placed = work.Select(set => new PlacedSet(set, RegionsOf(set, exercises), SetDemand.Of(set, date, person, anchors))).ToList();
        var questions = Questions(placed.Where(set => set.Regions.Count == 0)).ToList();
        var regions = BodyRegions.All
            .Select(region => (Region: region, Sets: placed.FindAll(set => set.Regions.Contains(region))))
            .Where(group => group.Sets.Count > 0)
            .Select(group => SetStimulus.Of(group.Region, Demands(group.Sets), [.. Missing(group.Sets), .. questions]));
        return new SessionStimulus([.. regions], questions);
    }

    private static IReadOnlyList<BodyRegion> RegionsOf(StrengthSet set, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises) =>
        set.Exercise is { } exercise && exercises.TryGetValue(exercise, out var regions) ? regions : [];

    private static List<SetDemand> Demands(IEnumerable<PlacedSet> sets) => [.. sets.Select(set => set.Reading.Demand).OfType<SetDemand>()];

    /// <summary><c>3 sets of squat: no one_repetition_max, or ...</c>.</summary>
    private static IEnumerable<string> Missing(IEnumerable<PlacedSet> sets) => sets
        .Where(set => set.Reading.Missing is not null)
        .GroupBy(set => (set.Set.Exercise, set.Reading.Missing))
        .Select(group => $"{Counted(group.Count())} of {group.Key.Exercise}: no {group.Key.Missing}");

    private static IEnumerable<string> Questions(IEnumerable<PlacedSet> unplaced) => unplaced
        .GroupBy(set => set.Set.Exercise, StringComparer.Ordinal)
        .Select(group => group.Key is null
            ? $"{Counted(group.Count())} without an exercise: which body region?"
            : $"{Counted(group.Count())} of {group.Key}: which body region?");

    private static string Counted(int sets) => sets == 1 ? "1 set" : $"{sets} sets";

    private sealed record PlacedSet(StrengthSet Set, IReadOnlyList<BodyRegion> Regions, (SetDemand? Demand, string? Missing) Reading);
}
