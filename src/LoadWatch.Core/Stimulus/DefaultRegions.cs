namespace LoadWatch.Stimulus;

/// <summary>The shipped tables of body regions; a user's configuration replaces entries. Common practice, no published source.</summary>
public static class DefaultRegions
{
    private static readonly BodyRegion[] Legs = [BodyRegion.Legs];
    private static readonly BodyRegion[] Trunk = [BodyRegion.Trunk];
    private static readonly BodyRegion[] Arms = [BodyRegion.Arms];
    private static readonly BodyRegion[] Whole = [BodyRegion.Legs, BodyRegion.Trunk, BodyRegion.Arms];
    private static readonly BodyRegion[] LegsAndTrunk = [BodyRegion.Legs, BodyRegion.Trunk];

    /// <summary>By exercise category of the FIT profile and a few plain words of the gym floor.</summary>
    public static IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> Exercises { get; } =
        new Dictionary<string, IReadOnlyList<BodyRegion>>(StringComparer.Ordinal)
        {
            ["squat"] = Legs,
            ["lunge"] = Legs,
            ["leg_press"] = Legs,
            ["leg_extension"] = Legs,
            ["leg_curl"] = Legs,
            ["calf_raise"] = Legs,
            ["hip_raise"] = Legs,
            ["plyo"] = Legs,
            ["sled"] = Legs,
            ["deadlift"] = LegsAndTrunk,
            ["hyperextension"] = Trunk,
            ["core"] = Trunk,
            ["crunch"] = Trunk,
            ["sit_up"] = Trunk,
            ["plank"] = Trunk,
            ["chop"] = Trunk,
            ["leg_raise"] = Trunk,
            ["bench_press"] = Arms,
            ["push_up"] = Arms,
            ["shoulder_press"] = Arms,
            ["pull_up"] = Arms,
            ["row"] = Arms,
            ["curl"] = Arms,
            ["triceps_extension"] = Arms,
            ["flye"] = Arms,
            ["lateral_raise"] = Arms,
            ["shrug"] = Arms,
            ["olympic_lift"] = Whole,
            ["total_body"] = Whole,
        };

    /// <summary>By sport name, or by <c>name/detail</c>, which goes first.</summary>
    public static IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> Sports { get; } =
        new Dictionary<string, IReadOnlyList<BodyRegion>>(StringComparer.Ordinal)
        {
            ["cycling"] = Legs,
            ["cycling/hand_cycling"] = Arms,
            ["cycling/indoor_hand_cycling"] = Arms,
            ["e_biking"] = Legs,
            ["running"] = Legs,
            ["walking"] = Legs,
            ["hiking"] = Legs,
            ["rowing"] = Whole,
            ["cross_country_skiing"] = Whole,
            ["fitness_equipment/indoor_rowing"] = Whole,
            ["fitness_equipment/indoor_cycling"] = Legs,
            ["fitness_equipment/stair_climbing"] = Legs,
            ["fitness_equipment/elliptical"] = Legs,
            ["fitness_equipment/treadmill"] = Legs,
            ["swimming"] = [BodyRegion.Arms, BodyRegion.Trunk],
        };
}
