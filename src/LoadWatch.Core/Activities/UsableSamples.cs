using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// Cuts a channel down to what can be used. Rows are sorted by time, rows of one time keep the order of the file, undated rows are left
/// out.
/// A reading stands for the time to the next usable one of its channel, at most 10 s; the last stands for 0. Pauses need no rule of their
/// own:
/// whatever lies beyond those 10 s counts for nothing.
/// </summary>
public static class UsableSamples
{
    /// <summary>The longest time that one reading may stand for, milliseconds. A choice: it bridges sparse recording, not a stop.</summary>
    public const int LongestMilliseconds = 10_000;

    /// <summary>Milliseconds in seconds; mostly it is one.</summary>
    internal static double Seconds(int milliseconds) => milliseconds == 1000 ? 1 : milliseconds / 1000.0;

    /// <summary>The channels with a reading, heart rate also where beats came only in messages of their own.</summary>
    public static IEnumerable<Channel> ChannelsOf(Recording recording) =>
        SampleSeries.EveryChannel.Where(channel =>
            recording.SeriesOf(channel).Has(channel) || (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0));

    public static UsableChannel Of(Recording recording, Channel channel) => Of(recording, channel, SampleTimeline.Of(recording.Samples.Times));

    /// <summary>The same where the time line of the recording's samples is known.</summary>
    internal static UsableChannel Of(Recording recording, Channel channel, SampleTimeline timeline)
    {
        if (recording.Gathered.TryGetValue(channel, out var gathered))
        {
            return Of(channel, recording.Sport, gathered, SampleTimeline.Of(gathered.Times));
        }

        if (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0)
        {
            var (times, values) = LateBeatRows.With(recording.Samples, recording.LateHeartRates);
            var withBeats = SampleTimeline.Of(times);
            return Of(channel, recording.Sport, withBeats, withBeats.Ordered(values));
        }

        return Of(channel, recording.Sport, recording.Samples, timeline);
    }

    /// <summary>The rows of what a file tells that count for a channel within a stretch, in time order; a row without a reading is NaN.</summary>
    internal static IEnumerable<(long UnixMilliseconds, double Value)> Rows(Recording recording, Channel channel, Stretch within)
    {
        var (times, values) = channel == Channel.HeartRate && recording.LateHeartRates.Count > 0
            ? LateBeatRows.With(recording.Samples, recording.LateHeartRates)
            : (recording.Samples.Times, recording.Samples.Column(channel) ?? []);
        var timeline = values.Length == 0 ? SampleTimeline.Of([]) : SampleTimeline.Of(times);
        return timeline.Times.Zip(timeline.Ordered(values)).Where(row => within.Holds(row.First));
    }

    private static UsableChannel Of(Channel channel, Sport sport, SampleSeries samples, SampleTimeline timeline) => samples.Column(channel) is { } column
        ? Of(channel, sport, timeline, timeline.Ordered(column))
        : new UsableChannel(channel, [], [], [], 0, share: 0);

    private static UsableChannel Of(Channel channel, Sport sport, SampleTimeline timeline, double[] values)
    {
        var range = ChannelLimits.Of(channel, sport);
        var count = Count(values, range);
        if (count == values.Length)
        {
            return new UsableChannel(channel, timeline.Times, values, timeline.Milliseconds, count, Share(timeline.TotalMilliseconds, timeline, count));
        }

        var (usableTimes, usableValues, milliseconds) = (new long[count], new double[count], new int[count]);
        Keep(timeline.Times, values, range, usableTimes, usableValues);
        var total = SampleTimeline.Durations(usableTimes, milliseconds);
        return new UsableChannel(channel, usableTimes, usableValues, milliseconds, count, Share(total, timeline, count));
    }

    private static int Count(ReadOnlySpan<double> values, (double Least, double Most) range)
    {
        var count = 0;
        foreach (var value in values)
        {
            count += value >= range.Least && value <= range.Most ? 1 : 0;
        }

        return count;
    }

    private static void Keep(
        ReadOnlySpan<long> times, ReadOnlySpan<double> values, (double Least, double Most) range, Span<long> usableTimes, Span<double> usableValues)
    {
        var kept = 0;
        for (var row = 0; row < values.Length; row++)
        {
            if (values[row] >= range.Least && values[row] <= range.Most)
            {
                usableTimes[kept] = times[row];
                usableValues[kept] = values[row];
                kept++;
            }
        }
    }

    private static double Share(long usable, SampleTimeline timeline, int count)
    {
        if (timeline.TotalMilliseconds == 0)
        {
            return count > 0 ? 1 : 0;
        }

        return Math.Min(1, (double)usable / timeline.TotalMilliseconds);
    }
}
