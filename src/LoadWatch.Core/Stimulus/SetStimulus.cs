namespace LoadWatch.Stimulus;

/// <summary>
/// Sums the sets of one region. A repetition counts as 1 s of concentric work (an assumption; the length of a set holds pauses and
/// lowering too).
/// The grade is that of the poorest set that was read: the sum is no better.
/// </summary>
public static class SetStimulus
{
    /// <param name="demands">The sets that could be read; none: every figure is unknown.</param>
    /// <param name="unread">How many more working sets may have gone through the region and could not be read: then hard repetitions below the line of a
    /// heavy session are unknown, not few.</param>
    /// <param name="notSeen">What was missing in the others.</param>
    public static RegionStimulus Of(BodyRegion region, IReadOnlyList<SetDemand> demands, int unread, IReadOnlyList<string> notSeen)
    {
        if (demands.Count == 0)
        {
            return EnduranceEstimate.Nothing.For(region, notSeen);
        }

        var low = Read(demands, Variant.Low);
        var mid = Read(demands, Variant.Mid);
        var high = Read(demands, Variant.High);
        var isKnown = unread == 0 || HeavyOrFastLine.Reached(0, mid.HardRepetitions, mid.HardSets);
        return new RegionStimulus(
            region,
            demands.Max(demand => demand.Grade),
            StimulusChannels.Sets,
            HardBouts: null,
            isKnown ? Bands.Of(low, mid, high, reading => reading.HardRepetitions) : null,
            isKnown ? mid.HardSets : null,
            Bands.Of(low, mid, high, reading => reading.Seconds.Slow),
            Bands.Of(low, mid, high, reading => reading.Seconds.Medium),
            Bands.Of(low, mid, high, reading => reading.Seconds.Large),
            [.. notSeen, .. LowerBound(demands)]);
    }

    /// <summary>Class-seconds, hard repetitions and hard sets as one variant reads them.</summary>
    public static SetReading Read(IEnumerable<SetDemand> demands, Variant variant)
    {
        var reading = new SetReading(default, 0, 0);
        foreach (var demand in demands)
        {
            var drives = demand.Drives(variant).ToList();
            var hard = drives.Count(HardLine.Reached);
            var seconds = drives.Aggregate(reading.Seconds, (sum, drive) => sum + variant.Recruitment.At(drive));
            reading = new SetReading(seconds, reading.HardRepetitions + hard, reading.HardSets + (hard > 0 ? 1 : 0));
        }

        return reading;
    }

    private static IEnumerable<string> LowerBound(IReadOnlyList<SetDemand> demands)
    {
        var open = demands.Count(demand => demand.Reserve is null);
        return open == 0 ? [] : [$"repetitions in reserve of {open} of {demands.Count} sets: a lower bound"];
    }
}

/// <param name="Seconds">Recruited fraction of each class summed over repetitions of 1 s.</param>
public sealed record SetReading(ClassFractions Seconds, int HardRepetitions, int HardSets);
