using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>Counts the time of a channel's usable readings into bins.</summary>
public static class ChannelHistogram
{
    /// <summary>Bins per unit of the channel: tenths of a metre per second for speed, whole units elsewhere.</summary>
    public static int BinsPerUnit(Channel channel) => channel == Channel.Speed ? 10 : 1;

    public static Histogram Of(UsableChannel channel)
    {
        var bins = new Dictionary<int, long>();
        foreach (var sample in channel.Samples)
        {
            var bin = BinOf(channel.Channel, sample.Value);
            bins[bin] = bins.GetValueOrDefault(bin) + sample.Milliseconds;
        }

        var histogram = new Histogram();
        foreach (var (bin, milliseconds) in bins)
        {
            histogram.Add(bin, milliseconds);
        }

        return histogram;
    }

    /// <summary>The floor in bins, after rounding to a thousandth of the unit, so that 5.3 m/s held as 5.2999999 stays in bin 53.</summary>
    public static int BinOf(Channel channel, double value)
    {
        var thousandths = (long)Math.Round(value * 1000);
        return (int)Math.Floor(thousandths * BinsPerUnit(channel) / 1000.0);
    }
}
