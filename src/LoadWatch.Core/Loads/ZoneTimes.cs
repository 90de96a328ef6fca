using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// Time in zone of heart rate, power and speed. Heart rate: three zones by the ventilatory thresholds where both are anchored, else the
/// classes of
/// Garber et al. 2011, Med Sci Sports Exerc 43:1334-1359, in fractions of heart-rate reserve. Power: fractions of critical power. Speed:
/// fixed bounds.
/// </summary>
public static class ZoneTimes
{
    /// <summary>Null where the thresholds and the reserve are both unknown.</summary>
    public static TimeInZone? OfHeartRate(
        Histogram heartRate, LocalDate date, Person person, AnchorBook anchors, IReadOnlyList<double> reserveBounds)
    {
        if (HeartRateThresholds.On(date, person, anchors) is { } thresholds)
        {
            return Of(Channel.HeartRate, "ventilatory thresholds", heartRate, [thresholds.FirstBpm, thresholds.SecondBpm], thresholds.Estimated);
        }

        return HeartRateReserve.On(date, person, anchors).Reserve is { } reserve
            ? Of(Channel.HeartRate, "percent of heart-rate reserve", heartRate, [.. reserveBounds.Select(reserve.BpmAt)], reserve.Estimated)
            : null;
    }

    /// <param name="criticalPower">The anchor, in watts.</param>
    public static TimeInZone OfPower(Histogram power, Anchor criticalPower, IReadOnlyList<double> bounds) => Of(
        Channel.Power,
        "percent of critical power",
        power,
        [.. bounds.Select(bound => bound * criticalPower.Value)],
        criticalPower.Source == AnchorSource.Estimated);

    public static TimeInZone OfSpeed(Histogram speed, IReadOnlyList<double> bounds) =>
        Of(Channel.Speed, "metres per second", speed, bounds, estimated: false);

    private static TimeInZone Of(Channel channel, string basis, Histogram histogram, IReadOnlyList<double> bounds, bool estimated)
    {
        double[] rounded = [.. bounds.Select(Significant.Round)];
        var milliseconds = new long[rounded.Length + 1];
        foreach (var (bin, time) in histogram.Bins)
        {
            var value = (double)bin / ChannelHistogram.BinsPerUnit(channel);
            milliseconds[Zone(value, rounded)] += time;
        }

        return new TimeInZone(channel, basis, rounded, [.. milliseconds.Select(time => Significant.Round(time / 1000.0))], estimated);
    }

    /// <summary>How many of the bounds a value has reached.</summary>
    private static int Zone(double value, double[] bounds)
    {
        var zone = 0;
        foreach (var bound in bounds)
        {
            zone += value >= bound ? 1 : 0;
        }

        return zone;
    }
}
