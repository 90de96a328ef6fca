using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>What follows from speed where a body runs: sports on foot and team sports. On wheels or water the same speed costs something else.</summary>
public static class SpeedLoads
{
    /// <summary>Only what is known; each at most once.</summary>
    public static IEnumerable<Quantity> Of(UsableRecording usable, IReadOnlyList<double> speedBounds)
    {
        var sport = usable.Recording.Sport;
        if (usable[Channel.Speed] is not { } speed || !(sport.IsOnFoot || sport.IsTeamSport))
        {
            yield break;
        }

        if (SpeedTop.MetresPerSecond(speed) is { } top)
        {
            yield return new Quantity(QuantityNames.SpeedTop, top, "m/s", Estimated: false);
        }

        foreach (var bound in DistanceAbove.Bounds(speedBounds))
        {
            if (DistanceAbove.Metres(usable.Histograms[Channel.Speed], bound) is { } metres)
            {
                yield return new Quantity(DistanceAbove.Name(bound), metres, "m", Estimated: false);
            }
        }
    }
}
