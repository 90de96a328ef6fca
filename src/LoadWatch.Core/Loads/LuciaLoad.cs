using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// Three-zone load. Source: Lucia, Hoyos, Santalla, Earnest and Chicharro 2003, Tour de France versus Vuelta a Espana: which is harder?,
/// Med Sci Sports Exerc 35:872-878 (title and multipliers from memory, the multipliers configurable).
/// Load = t(1) + 2 t(2) + 3 t(3): t(k) minutes below the first ventilatory threshold, between the two, and above the second.
/// The source leaves the edges open. Here: a threshold belongs to the zone above it. Everything below the first counts, rest too.
/// </summary>
public static class LuciaLoad
{
    private const double MillisecondsPerMinute = 60_000;

    /// <summary>Arbitrary units, 0 or more; null for a histogram without time.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm.</param>
    /// <param name="weights">Of the three zones.</param>
    public static double? Of(Histogram heartRate, HeartRateThresholds thresholds, IReadOnlyList<double> weights)
    {
        double? load = null;
        foreach (var (bpm, milliseconds) in heartRate.Bins)
        {
            load = (load ?? 0) + (milliseconds / MillisecondsPerMinute * weights[Zone(bpm, thresholds) - 1]);
        }

        return Significant.Round(load);
    }

    /// <summary>1 to 3.</summary>
    public static int Zone(int bpm, HeartRateThresholds thresholds)
    {
        if (bpm < thresholds.FirstBpm)
        {
            return 1;
        }

        return bpm < thresholds.SecondBpm ? 2 : 3;
    }
}
