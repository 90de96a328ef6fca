using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// Team-sport load. Source: Stagno, Thatcher and van Someren 2007, A modified TRIMP to quantify the in-season training load of team sport
/// players, J Sports Sci 25:629-634 (eight hockey players; title, zones and weights from memory, configurable).
/// Load = sum of w(k) t(k): t(k) minutes in zone k = 1 to 5 for 65-71, 72-78, 79-85, 86-92 and 93-100 % of maximal heart rate, w = 1.25, 1.71,
/// 2.54, 3.61, 5.16; below 65 % nothing counts.
/// Departures: the gaps between the zones are a matter of rounding, so a zone begins at 65, 72, 79, 86, 93 % and ends where the next begins;
/// whatever is above the maximum counts as zone 5; computed for every sport, though the weights are those of one team.
/// </summary>
public static class StagnoLoad
{
    private const double MillisecondsPerMinute = 60_000;

    /// <summary>Arbitrary units, 0 or more; null for a histogram without time.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm.</param>
    /// <param name="maxBpm">Maximal heart rate, above 0.</param>
    public static double? Of(Histogram heartRate, double maxBpm, EquationChoices equations)
    {
        double? load = null;
        foreach (var (bpm, milliseconds) in heartRate.Bins)
        {
            load = (load ?? 0) + (milliseconds / MillisecondsPerMinute * Weight(bpm, maxBpm, equations));
        }

        return Significant.Round(load);
    }

    /// <summary>The weight of a heart rate; 0 below the first zone.</summary>
    public static double Weight(int bpm, double maxBpm, EquationChoices equations)
    {
        var fraction = Math.Round(bpm / maxBpm, 11);
        var weight = 0.0;
        for (var zone = 0; zone < equations.StagnoBounds.Count && fraction >= equations.StagnoBounds[zone]; zone++)
        {
            weight = equations.StagnoWeights[zone];
        }

        return weight;
    }
}
