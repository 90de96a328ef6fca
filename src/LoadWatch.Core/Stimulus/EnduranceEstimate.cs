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

    /// <summary>Of a session, without usable readings: what was not seen in more of it is not told as not done. A choice.</summary>
    private const double MostUnseen = 0.1;

    /// <summary>
    /// What this may say where only a share of the session was usable. Hard work that was seen stands, as a lower bound; that there was not enough of it, and how much
    /// of the largest class, is not known then.
    /// </summary>
    /// <param name="share">From 0 to 1.</param>
    public EnduranceEstimate SeenIn(double share)
    {
        if (HardBouts is not { } bouts || Significant.Round(1 - share) <= MostUnseen)
        {
            return this;
        }

        var isReached = HeavyOrFastLine.Reached(bouts.Mid, repetitions: 0, sets: 0);
        return this with
        {
            Grade = Grade > Grade.D ? Grade : Grade.D,
            HardBouts = isReached ? bouts : null,
            LargeSeconds = isReached ? LargeSeconds : null,
            NotSeen = [.. NotSeen, EnduranceRemarks.OfUnseen(Channel, share, isReached)],
        };
    }

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
