using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>
/// Sorts the working sets of a session into body regions and reads each. An exercise without a region is asked for, not guessed: until then no region is
/// known to have rested.
/// </summary>
public static class SessionOfSets
{
    /// <summary>More sets than anybody does in a session are not read.</summary>
    private const int MostSets = 500;

    public static SessionStimulus Of(
        IReadOnlyList<StrengthSet> work,
        LocalDate date,
        string person,
        AnchorBook anchors,
        IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises)
    {
        var placed = work.Take(MostSets).Select(set => new PlacedSet(set, RegionsOf(set, exercises), SetDemand.Of(set, date, person, anchors))).ToList();
        var unplaced = placed.FindAll(set => set.Regions.Count == 0);
        var questions = Questions(unplaced, work.Count - placed.Count).ToList();
        var elsewhere = unplaced.Count + work.Count - placed.Count;
        var regions = BodyRegions.All
            .Select(region => (Region: region, Sets: placed.FindAll(set => set.Regions.Contains(region))))
            .Where(group => group.Sets.Count + elsewhere > 0)
            .Select(group => OfRegion(group.Region, group.Sets, elsewhere, questions));
        return new SessionStimulus([.. regions], questions);
    }

    /// <summary>Sets whose region is not known may have gone through this one.</summary>
    private static RegionStimulus OfRegion(BodyRegion region, List<PlacedSet> sets, int elsewhere, List<string> questions)
    {
        var demands = Demands(sets);
        return SetStimulus.Of(region, demands, sets.Count - demands.Count + elsewhere, [.. Missing(sets), .. questions]);
    }

    private static IReadOnlyList<BodyRegion> RegionsOf(StrengthSet set, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises) =>
        set.Exercise is { } exercise && exercises.TryGetValue(exercise, out var regions) ? regions : [];

    private static List<SetDemand> Demands(IEnumerable<PlacedSet> sets) => [.. sets.Select(set => set.Reading.Demand).OfType<SetDemand>()];

    /// <summary><c>3 sets of squat: no one_repetition_max, or ...</c>.</summary>
    private static IEnumerable<string> Missing(IEnumerable<PlacedSet> sets) => sets
        .Where(set => set.Reading.Missing is not null)
        .GroupBy(set => (set.Set.Exercise, set.Reading.Missing))
        .Select(group => $"{Counted(group.Count())} of {group.Key.Exercise}: no {group.Key.Missing}");

    private static IEnumerable<string> Questions(List<PlacedSet> unplaced, int beyond) => unplaced
        .GroupBy(set => set.Set.Exercise, StringComparer.Ordinal)
        .Select(group => group.Key is null
            ? $"{Counted(group.Count())} without an exercise: which body region?"
            : $"{Counted(group.Count())} of {group.Key}: which body region?")
        .Concat(beyond > 0 ? [$"{Counted(beyond)} beyond the first {MostSets} not read"] : []);

    private static string Counted(int sets) => sets == 1 ? "1 set" : $"{sets} sets";

    private sealed record PlacedSet(StrengthSet Set, IReadOnlyList<BodyRegion> Regions, (SetDemand? Demand, string? Missing) Reading);
}
