using LoadWatch.Activities;
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

    private static readonly HashSet<string> StandingAndStairs =
        new(["chair_stand", "sit_to_stand", "chair_squat", "step_up", "step_down", "lateral_step", "stair_climb"], StringComparer.Ordinal);

    public static SessionStimulus Of(
        IReadOnlyList<StrengthSet> work,
        LocalDate date,
        Person person,
        AnchorBook anchors,
        ComputationSettings settings)
    {
        var exercises = settings.Exercises;
        var placed = work.Take(MostSets).Select(set => Read(set, SetDemand.Of(set, date, person.Id, anchors, settings.Equations), exercises)).ToList();
        var unplaced = placed.FindAll(set => set.Regions.Count == 0);
        var notPlaced = NotPlaced(unplaced, work.Count - placed.Count).ToList();
        var elsewhere = unplaced.Count + work.Count - placed.Count;
        var variants = Variants.Of(person.AgeOn(date));
        var regions = BodyRegions.All
            .Select(region => (Region: region, Sets: placed.FindAll(set => set.Regions.Contains(region))))
            .Where(group => group.Sets.Count + elsewhere > 0)
            .Select(group => OfRegion(group.Region, group.Sets, elsewhere, notPlaced, variants));
        return new SessionStimulus([.. regions], notPlaced) { Questions = UnknownExercises.Of(work, exercises), Sets = placed };
    }

    /// <summary>Sets whose region is not known may have gone through this one.</summary>
    private static RegionStimulus OfRegion(BodyRegion region, List<ReadSet> sets, int elsewhere, List<string> notPlaced, Variants variants)
    {
        var demands = Demands(sets);
        return SetStimulus.Of(region, demands, sets.Count - demands.Count + elsewhere, [.. Missing(sets), .. NearMaximal(sets), .. notPlaced], variants);
    }

    private static ReadSet Read(
        StrengthSet set, (SetDemand? Demand, string? Missing) reading, IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> exercises) =>
        new(set, UnknownExercises.RegionsOf(set.Exercise, exercises), reading.Demand, reading.Missing);

    private static List<SetDemand> Demands(IEnumerable<ReadSet> sets) => [.. sets.Select(set => set.Demand).OfType<SetDemand>()];

    /// <summary><c>3 sets of squat: no one_repetition_max, or ...</c>.</summary>
    private static IEnumerable<string> Missing(IEnumerable<ReadSet> sets) => sets
        .Where(set => set.Missing is not null)
        .GroupBy(set => (set.Exercise, set.Missing))
        .Select(group => $"{Counted(group.Count())} of {group.Key.Exercise}: no {group.Key.Missing}");

    /// <summary>Of sets that could not be read: said where the exercise is one that may be near the maximum of a frail person.</summary>
    private static IEnumerable<string> NearMaximal(IEnumerable<ReadSet> sets) =>
        sets.Any(set => set.Demand is null && StandingAndStairs.Contains(set.Exercise ?? ""))
            ? ["chair stands, steps and stairs may be near the maximum of a frail person: a hardness or repetitions in reserve would tell"]
            : [];

    private static IEnumerable<string> NotPlaced(List<ReadSet> unplaced, int beyond) => unplaced
        .GroupBy(set => set.Exercise, StringComparer.Ordinal)
        .Select(group => group.Key is null
            ? $"{Counted(group.Count())} without an exercise: which body region?"
            : $"{Counted(group.Count())} of {group.Key}: which body region?")
        .Concat(beyond > 0 ? [$"{Counted(beyond)} beyond the first {MostSets} not read"] : []);

    private static string Counted(int sets) => sets == 1 ? "1 set" : $"{sets} sets";
}
