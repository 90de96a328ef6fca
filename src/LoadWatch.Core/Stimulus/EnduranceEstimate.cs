namespace LoadWatch.Stimulus;

/// <summary>What one endurance channel says of a session, the same for every region that the sport goes through.</summary>
/// <param name="Channel">As in <see cref="RegionStimulus.Channel"/>.</param>
public sealed record EnduranceEstimate(
    Grade Grade,
    string Channel,
    Band? HardBouts,
    Band? SlowSeconds,
    Band? MediumSeconds,
    Band? LargeSeconds,
    IReadOnlyList<string> NotSeen)
{
    /// <summary>The session went through the region, and no channel could tell what it asked for.</summary>
    public static EnduranceEstimate Nothing { get; } = new(Grade.E, StimulusChannels.None, null, null, null, null, []);

    public RegionStimulus For(BodyRegion region, IEnumerable<string> alsoNotSeen) => new(
        region,
        Grade,
        Channel,
        HardBouts,
        HardRepetitions: null,
        HardSets: null,
        SlowSeconds,
        MediumSeconds,
        LargeSeconds,
        [.. NotSeen, .. alsoNotSeen]);
}
