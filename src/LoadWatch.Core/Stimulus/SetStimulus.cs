namespace LoadWatch.Stimulus;

/// <summary>
/// Sums the sets of one region. A hold is one hard bout and one hard set where its end is hard for 3 s, and never a hard repetition; so three hard
/// holds make a heavy day, and one beside a set of six hard repetitions does (a choice).
/// The grade is that of the poorest set that was read: the sum is no better.
/// </summary>
public static class SetStimulus
{
    /// <param name="demands">The sets that could be read; none: every figure is unknown.</param>
    /// <param name="unread">How many more working sets may have gone through the region and could not be read: then hard repetitions and bouts below the
    /// line of a heavy session are unknown, not few.</param>
    /// <param name="notSeen">What was missing in the others.</param>
    public static RegionStimulus Of(BodyRegion region, IReadOnlyList<SetDemand> demands, int unread, IReadOnlyList<string> notSeen, Variants variants)
    {
        if (demands.Count == 0)
        {
            return EnduranceEstimate.Nothing.For(region, notSeen);
        }

        var low = Read(demands, variants.Low);
        var mid = Read(demands, variants.Mid);
        var high = Read(demands, variants.High);
        var isKnown = unread == 0 || HeavyOrFastLine.Reached(mid.HardBouts, mid.HardRepetitions, mid.HardSets);
        var hasHolds = demands.Any(demand => demand.Rule == SetRule.Hold);
        return new RegionStimulus(
            region,
            demands.Max(demand => demand.Grade),
            StimulusChannels.Sets,
            isKnown && hasHolds ? Bands.Of(low, mid, high, reading => reading.HardBouts) : null,
            isKnown ? Bands.Of(low, mid, high, reading => reading.HardRepetitions) : null,
            isKnown ? mid.HardSets : null,
            Bands.Of(low, mid, high, reading => reading.Seconds.Slow),
            Bands.Of(low, mid, high, reading => reading.Seconds.Medium),
            Bands.Of(low, mid, high, reading => reading.Seconds.Large),
            [.. notSeen, .. SetRemarks.Of(demands)]);
    }

    /// <summary>Class-seconds, hard repetitions, sets and bouts as one variant reads them.</summary>
    public static SetReading Read(IEnumerable<SetDemand> demands, Variant variant) =>
        demands.Aggregate(new SetReading(default, 0, 0, 0), (sum, demand) => sum + Read(demand, variant));

    private static SetReading Read(SetDemand demand, Variant variant)
    {
        var drives = demand.Drives(variant).ToList();
        var seconds = drives.Aggregate(default(ClassFractions), (sum, drive) => sum + variant.Recruitment.At(drive)) * demand.SecondsEach;
        var hard = drives.Count(HardLine.Reached);
        if (demand.Rule != SetRule.Hold)
        {
            return new SetReading(seconds, hard, hard > 0 ? 1 : 0, 0);
        }

        var bouts = demand.SecondsEach >= HardBouts.ShortestSeconds ? hard : 0;
        return new SetReading(seconds, 0, bouts, bouts);
    }
}

/// <param name="Seconds">Recruited fraction of each class summed over the lifting phases of repetitions and the ends of holds, s.</param>
/// <param name="HardSets">Sets with a hard repetition, and hard holds.</param>
/// <param name="HardBouts">Of holds.</param>
public sealed record SetReading(ClassFractions Seconds, int HardRepetitions, int HardSets, int HardBouts)
{
    public static SetReading operator +(SetReading left, SetReading right) => new(
        left.Seconds + right.Seconds,
        left.HardRepetitions + right.HardRepetitions,
        left.HardSets + right.HardSets,
        left.HardBouts + right.HardBouts);
}
