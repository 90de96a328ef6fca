using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>What follows from speed where a body runs: sports on foot and team sports. On wheels or water the same speed costs something else.</summary>
public static class SpeedLoads
{
    /// <summary>What needs the readings one after the other; only what is known, each at most once.</summary>
    public static IReadOnlyList<Quantity> OfSamples(UsableRecording usable) =>
        Runs(usable.Recording.Sport) && usable[Channel.Speed] is { } speed ? [.. OfTop(SpeedTop.MetresPerSecond(speed)), .. OfChanges(speed)] : [];

    /// <summary>What follows from the time by speed; only what is known, each at most once.</summary>
    /// <param name="speed">Milliseconds by tenths of a metre per second; null where speed is not usable.</param>
    /// <param name="top">Top speed, m/s, or null.</param>
    /// <param name="best">The anchor <c>speed_max</c> on the date, or null: then nothing is told as a share of it.</param>
    public static IReadOnlyList<Quantity> OfHistogram(Histogram? speed, Sport sport, double? top, Anchor? best, ComputationSettings settings) =>
        speed is null || !Runs(sport)
            ? []
            : [.. OfBounds(speed, settings.SpeedBounds), .. best is { Value: > 0 } ? SpeedMaxShares.Of(speed, top, best, settings.SpeedMaxShares) : []];

    private static bool Runs(Sport sport) => sport.IsOnFoot || sport.IsTeamSport;

    private static IEnumerable<Quantity> OfTop(double? top)
    {
        if (top is { } metresPerSecond)
        {
            yield return new Quantity(QuantityNames.SpeedTop, metresPerSecond, "m/s", Estimated: false);
        }
    }

    private static IEnumerable<Quantity> OfBounds(Histogram speed, IEnumerable<double> speedBounds)
    {
        foreach (var bound in DistanceAbove.Bounds(speedBounds))
        {
            if (DistanceAbove.Metres(speed, bound) is { } metres)
            {
                yield return new Quantity(DistanceAbove.Name(bound), metres, "m", Estimated: false);
            }
        }
    }

    private static IEnumerable<Quantity> OfChanges(UsableChannel speed)
    {
        if (Accelerations.Of(speed) is { } counts)
        {
            yield return new Quantity(QuantityNames.Accelerations, counts.Accelerations, "count", Estimated: false);
            yield return new Quantity(QuantityNames.Decelerations, counts.Decelerations, "count", Estimated: false);
        }
    }
}
