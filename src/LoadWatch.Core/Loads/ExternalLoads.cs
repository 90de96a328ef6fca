using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>What was done, whatever it cost the body: minutes, distance, climb, mechanical work. Sums and totals, no published source
/// needed.</summary>
public static class ExternalLoads
{
    /// <summary>Only what is known; each at most once.</summary>
    public static IEnumerable<Quantity> Of(UsableRecording usable)
    {
        if (Minutes(usable.Recording) is { } minutes)
        {
            yield return new Quantity(QuantityNames.Minutes, minutes, "min", Estimated: false);
        }

        if (DistanceMetres(usable) is { } metres)
        {
            yield return new Quantity(QuantityNames.Distance, metres, "m", Estimated: false);
        }

        if (usable[Channel.Altitude] is { } altitude)
        {
            yield return new Quantity(QuantityNames.Climb, Climb.Metres(altitude), "m", Estimated: false);
        }

        if (usable[Channel.Power] is { } power)
        {
            yield return new Quantity(QuantityNames.Work, WorkKilojoules(power), "kJ", Estimated: false);
            if (!usable.Recording.Sport.IsOnFoot && SecondTop.Of(power) is { } top)
            {
                yield return new Quantity(QuantityNames.PowerTop, top, "W", Estimated: false);
            }
        }
    }

    /// <summary>Timer time, else elapsed time, minutes; null where neither is a time.</summary>
    public static double? Minutes(Recording recording) =>
        Significant.Round((Time(recording.TimerSeconds) ?? Time(recording.ElapsedSeconds)) / 60);

    /// <summary>Power times time over usable readings, kilojoules.</summary>
    public static double WorkKilojoules(UsableChannel power) =>
        Significant.Round(power.ValueMilliseconds() / 1e6);

    /// <summary>
    /// What the session states, else the largest reading less the smallest, metres: readings are a running total, which in a file of several sessions
    /// runs through all of them. A part of the readings is enough, so no usable share is asked.
    /// </summary>
    private static double? DistanceMetres(UsableRecording usable)
    {
        if (usable.Recording.DistanceMetres is { } stated and > 0 && double.IsFinite(stated))
        {
            return Significant.Round(stated);
        }

        if (!usable.Channels.TryGetValue(Channel.Distance, out var distance) || distance.Count == 0)
        {
            return null;
        }

        var (smallest, largest) = distance.Extremes();
        return Significant.Round(largest - smallest);
    }

    private static double? Time(double? seconds) => seconds is { } known && double.IsFinite(known) && known >= 0 ? known : null;
}
