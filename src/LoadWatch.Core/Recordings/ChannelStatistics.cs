namespace LoadWatch.Recordings;

/// <summary>Plain figures of one channel as recorded, every reading with the same weight, nothing cut.</summary>
/// <param name="Count">Rows with a reading.</param>
/// <param name="Mean">In the channel's unit; null without a reading.</param>
/// <param name="Max">In the channel's unit; null without a reading.</param>
public readonly record struct ChannelStatistics(int Count, double? Mean, double? Max)
{
    public static ChannelStatistics Of(SampleSeries samples, Channel channel)
    {
        ArgumentNullException.ThrowIfNull(samples);
        var (count, sum, max) = (0, 0.0, double.NegativeInfinity);
        foreach (var value in samples[channel])
        {
            if (double.IsNaN(value))
                continue;

            count++;
            sum += value;
            max = Math.Max(max, value);
        }

        return count == 0 ? default : new ChannelStatistics(count, sum / count, max);
    }
}
