using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>Beats that came in messages of their own join the samples at their own times.</summary>
internal static class LateBeatRows
{
    /// <summary>
    /// The heart rates of the dated samples, NaN for none, and behind them the beats; within one second a usable reading of the samples wins, and a beat stands
    /// in the place of one that is not.
    /// </summary>
    public static (long[] Times, double[] HeartRates) With(SampleSeries samples, IReadOnlyList<TimedHeartRate> late)
    {
        var (times, rates) = Dated(samples);
        var rows = times.Count;
        var (taken, beaten) = (new HashSet<long>(), new HashSet<long>());
        for (var row = 0; row < times.Count; row++)
        {
            if (ChannelLimits.Usable(Channel.HeartRate, rates[row], Sport.Generic))
            {
                taken.Add(Second(times[row]));
            }
        }

        foreach (var beat in late)
        {
            if (!taken.Contains(Second(beat.UnixMilliseconds)))
            {
                times.Add(beat.UnixMilliseconds);
                rates.Add(beat.BeatsPerMinute);
                beaten.Add(Second(beat.UnixMilliseconds));
            }
        }

        for (var row = 0; row < rows && beaten.Count > 0; row++)
        {
            rates[row] = beaten.Contains(Second(times[row])) ? double.NaN : rates[row];
        }

        return ([.. times], [.. rates]);
    }

    private static (List<long> Times, List<double> Rates) Dated(SampleSeries samples)
    {
        var (times, rates) = (new List<long>(samples.Count), new List<double>(samples.Count));
        var column = samples[Channel.HeartRate];
        for (var row = 0; row < samples.Count; row++)
        {
            if (samples.UnixMilliseconds[row] is var time and not SampleSeries.Undated)
            {
                times.Add(time);
                rates.Add(column.IsEmpty ? double.NaN : column[row]);
            }
        }

        return (times, rates);
    }

    private static long Second(long milliseconds) => (long)Math.Floor(milliseconds / 1000.0);
}
