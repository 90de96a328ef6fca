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

    /// <summary>Of power or speed; else null.</summary>
    public EnduranceSteps? Steps { get; init; }

    /// <summary>By what heart rate was read, for the session or for what a better channel left; else null.</summary>
    public HeartRateDrive? HeartRate { get; init; }

    /// <summary>This one, with the slow and medium classes of what a poorer channel tells of other moments. Bouts and the largest class stay: a poorer channel
    /// knows none.</summary>
    public EnduranceEstimate FilledBy(EnduranceEstimate poorer, long milliseconds) => this with
    {
        SlowSeconds = Sum(SlowSeconds, poorer.SlowSeconds),
        MediumSeconds = Sum(MediumSeconds, poorer.MediumSeconds),
        NotSeen = [.. NotSeen, .. EnduranceRemarks.OfFill(Channel, milliseconds)],
        HeartRate = poorer.HeartRate,
    };

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

    private static Band? Sum(Band? one, Band? other) =>
        one is { } first && other is { } second ? Bands.Of(first.Low + second.Low, first.Mid + second.Mid, first.High + second.High) : null;
}
