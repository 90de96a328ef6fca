using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>What follows from speed where a body runs: sports on foot and team sports. On wheels or water the same speed costs something else.</summary>
public static class SpeedLoads
{
    /// <summary>Only what is known; each at most once.</summary>
    /// <param name="best">The anchor <c>speed_max</c> on the date, or null: then nothing is told as a share of it.</param>
    public static IEnumerable<Quantity> Of(UsableRecording usable, Anchor? best, ComputationSettings settings)
    {
        var sport = usable.Recording.Sport;
        if (usable[Channel.Speed] is not { } speed || !(sport.IsOnFoot || sport.IsTeamSport))
        {
            return [];
        }

        var histogram = usable.Histograms[Channel.Speed];
        var top = SpeedTop.MetresPerSecond(speed);
        return
        [
            .. OfTop(top),
            .. OfBounds(histogram, settings.SpeedBounds),
            .. best is { Value: > 0 } ? SpeedMaxShares.Of(histogram, top, best, settings.SpeedMaxShares) : [],
            .. OfChanges(speed),
        ];
    }

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
