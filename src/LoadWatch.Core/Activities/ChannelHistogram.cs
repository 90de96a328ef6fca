using System.Buffers;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>Counts the time of a channel's usable readings into bins.</summary>
public static class ChannelHistogram
{
    /// <summary>Above every bin of a usable heart rate, power or speed.</summary>
    private const int UsualBins = 3072;

    /// <summary>Bins per unit of the channel: tenths of a metre per second for speed, whole units elsewhere.</summary>
    public static int BinsPerUnit(Channel channel) => channel == Channel.Speed ? 10 : 1;

    public static Histogram Of(UsableChannel channel)
    {
        var usual = ArrayPool<long>.Shared.Rent(UsualBins);
        try
        {
            return Of(channel, usual);
        }
        finally
        {
            ArrayPool<long>.Shared.Return(usual);
        }
    }

    private static Histogram Of(UsableChannel channel, long[] usual)
    {
        var values = channel.Values;
        var milliseconds = channel.Milliseconds;
        var perUnit = BinsPerUnit(channel.Channel);
        List<(int Bin, int Milliseconds)> others = [];
        Array.Clear(usual);
        for (var at = 0; at < values.Length && at < milliseconds.Length; at++)
        {
            var bin = BinOf(values[at], perUnit);
            if (bin >= 0 && bin < usual.Length)
            {
                usual[bin] += milliseconds[at];
            }
            else
            {
                others.Add((bin, milliseconds[at]));
            }
        }

        var histogram = new Histogram(usual);
        others.ForEach(other => histogram.Add(other.Bin, other.Milliseconds));
        return histogram;
    }

    /// <summary>The floor in bins, after rounding to a thousandth of the unit, so that 5.3 m/s held as 5.2999999 stays in bin 53.</summary>
    public static int BinOf(Channel channel, double value) => BinOf(value, BinsPerUnit(channel));

    /// <summary>Values lie within <see cref="ChannelLimits"/>, so nothing overflows. A whole one needs no rounding.</summary>
    private static int BinOf(double value, int perUnit)
    {
        var whole = unchecked((int)value);
        if (whole == value)
        {
            return whole * perUnit;
        }

        var bins = unchecked((long)Math.Round(value * 1000)) * perUnit;
        return unchecked((int)(bins >= 0 ? bins / 1000 : (bins - 999) / 1000));
    }
}
