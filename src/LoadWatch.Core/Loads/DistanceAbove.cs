using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>
/// Distance covered at a speed or faster. Common practice of field sports, no published source; the speeds are those of the zones.
/// Distance = sum of v t: t seconds in a bin of the speed histogram, v its middle, m/s. A bin is 0.1 m/s wide and named by its floor, so a
/// reading is off by 0.05 m/s at most, 1 % at 5.5 m/s. Over fine readings this evens out; a device that writes tenths is read 0.05 m/s too fast
/// throughout.
/// A speed at the bound belongs above it. A bound between two tenths acts as the next higher tenth.
/// </summary>
public static class DistanceAbove
{
    /// <summary>What the name of every such quantity begins with.</summary>
    public const string Prefix = "distance_above_";

    /// <summary>Slower is no fast running, metres per second. Common practice (Gualtieri 2023 finds no consensus).</summary>
    public const double SlowestBound = 5.5;

    /// <summary>Those of the inner bounds of the speed zones that are fast, m/s, in their order.</summary>
    public static IEnumerable<double> Bounds(IEnumerable<double> speedBounds) =>
        speedBounds.Where(double.IsFinite).Select(Significant.Round).Where(bound => bound >= SlowestBound).Distinct();

    /// <summary><c>distance_above_5_5_m_s</c> for 5.5 m/s.</summary>
    public static string Name(double bound) =>
        $"{Prefix}{bound.ToString("0.#########", CultureInfo.InvariantCulture).Replace('.', '_')}_m_s";

    /// <summary>Metres, 0 or more; null for a histogram without time.</summary>
    /// <param name="speed">Milliseconds by tenths of a metre per second.</param>
    /// <param name="bound">Metres per second.</param>
    public static double? Metres(Histogram speed, double bound)
    {
        double binsPerUnit = ChannelHistogram.BinsPerUnit(Channel.Speed);
        double? metres = null;
        foreach (var (bin, milliseconds) in speed.Bins)
        {
            var covered = bin / binsPerUnit >= bound ? (bin + 0.5) / binsPerUnit * milliseconds / 1000 : 0;
            metres = (metres ?? 0) + covered;
        }

        return Significant.Round(metres);
    }
}
