namespace LoadWatch.Activities;

/// <summary>Plain sums and extremes over the usable readings of a channel, in time order.</summary>
internal static class ChannelTotals
{
    /// <summary>Time that all readings stand for, milliseconds.</summary>
    public static long Milliseconds(this UsableChannel channel)
    {
        var total = 0L;
        foreach (var duration in channel.Milliseconds)
        {
            total += duration;
        }

        return total;
    }

    /// <summary>Sum of value times time, in the channel's unit times milliseconds.</summary>
    public static double ValueMilliseconds(this UsableChannel channel)
    {
        var values = channel.Values;
        var milliseconds = channel.Milliseconds;
        var sum = 0.0;
        for (var at = 0; at < values.Length && at < milliseconds.Length; at++)
        {
            sum += values[at] * milliseconds[at];
        }

        return sum;
    }

    /// <summary>The plain mean of at least one reading, whatever it stands for.</summary>
    public static double PlainMean(this UsableChannel channel)
    {
        var sum = 0.0;
        foreach (var value in channel.Values)
        {
            sum += value;
        }

        return sum / channel.Count;
    }

    /// <summary>The smallest and the largest of at least one reading.</summary>
    public static (double Smallest, double Largest) Extremes(this UsableChannel channel)
    {
        var (smallest, largest) = (double.PositiveInfinity, double.NegativeInfinity);
        foreach (var value in channel.Values)
        {
            smallest = value < smallest ? value : smallest;
            largest = value > largest ? value : largest;
        }

        return (smallest, largest);
    }
}
