using LoadWatch.Activities;

namespace LoadWatch.Quality;

/// <summary>Whether the load that heart rate answers to varied within a stretch: by power, else by speed. What says nothing did not vary.</summary>
internal sealed class LoadChange(UsableChannel? power, UsableChannel? speed)
{
    // Means over a block, so that the noise of single readings is no change. All of them choices.
    private const long BlockMilliseconds = 15_000;
    private const double Fraction = 0.25;
    private const double LeastWatts = 30;
    private const double LeastMetresPerSecond = 0.5;

    /// <summary>Whether there is anything to tell by.</summary>
    public bool IsKnown => power is { Count: > 0 } || speed is { Count: > 0 };

    /// <param name="from">Milliseconds since 1970-01-01T00:00:00Z.</param>
    public bool Varies(long from, long to) => Varies(power, LeastWatts, from, to) ?? Varies(speed, LeastMetresPerSecond, from, to) ?? false;

    /// <summary>Null where the channel has no two blocks with a reading there.</summary>
    private static bool? Varies(UsableChannel? channel, double least, long from, long to)
    {
        if (channel is null)
        {
            return null;
        }

        var times = channel.UnixMilliseconds;
        var values = channel.Values;
        var (blocks, smallest, largest) = (0, double.PositiveInfinity, double.NegativeInfinity);
        for (var row = Sorted.FirstFrom(times, from, time => time); row < times.Length && times[row] < to;)
        {
            var block = Moments.Between(from, times[row]) / BlockMilliseconds;
            var (sum, count) = (0.0, 0);
            for (; row < times.Length && times[row] < to && Moments.Between(from, times[row]) / BlockMilliseconds == block; row++, count++)
            {
                sum += values[row];
            }

            (blocks, smallest, largest) = (blocks + 1, Math.Min(smallest, sum / count), Math.Max(largest, sum / count));
        }

        return blocks < 2 ? null : largest - smallest >= Math.Max(least, Fraction * largest);
    }
}
