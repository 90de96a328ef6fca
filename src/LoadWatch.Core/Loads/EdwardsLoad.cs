using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// Summated-zone load. Source: Edwards 1993, The Heart Rate Monitor Book (weights from memory, configurable).
/// Load = sum of k t(k): t(k) minutes in zone k = 1 to 5 for 50-60, 60-70, 70-80, 80-90 and 90-100 % of maximal heart rate; below 50 %
/// nothing counts.
/// The source leaves the edges open. Here: the lower bound belongs to the zone, and whatever is above the maximum counts as zone 5.
/// </summary>
public static class EdwardsLoad
{
    private const double MillisecondsPerMinute = 60_000;

    /// <summary>Arbitrary units, 0 or more; null for a histogram without time.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm.</param>
    /// <param name="maxBpm">Maximal heart rate, above 0.</param>
    /// <param name="weights">Of the five zones.</param>
    public static double? Of(Histogram heartRate, double maxBpm, IReadOnlyList<double> weights)
    {
        double? load = null;
        foreach (var (bpm, milliseconds) in heartRate.Bins)
        {
            load = (load ?? 0) + (milliseconds / MillisecondsPerMinute * (Zone(bpm, maxBpm) is var zone and > 0 ? weights[zone - 1] : 0));
        }

        return Significant.Round(load);
    }

    /// <summary>0 below the first zone, else 1 to 5.</summary>
    public static int Zone(int bpm, double maxBpm) => (int)Math.Clamp(Math.Floor(Math.Round(bpm * 10 / maxBpm, 9)) - 4, 0, 5);
}
