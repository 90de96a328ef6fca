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

    /// <summary>The channels with a reading, heart rate also where beats came only in messages of their own.</summary>
    public static IEnumerable<Channel> ChannelsOf(Recording recording) =>
        Enum.GetValues<Channel>().Where(channel =>
            recording.SeriesOf(channel).Has(channel) || (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0));

    public static UsableChannel Of(Recording recording, Channel channel)
    {
        var rows = RowsOf(recording, channel);
        var usable = rows.TrueForAll(row => ChannelLimits.Usable(channel, row.Value, recording.Sport))
            ? rows
            : rows.FindAll(row => ChannelLimits.Usable(channel, row.Value, recording.Sport));
        return new UsableChannel(channel, WithDurations(usable), Share(usable, rows));
    }

    /// <summary>The rows that count for a channel within a stretch, in time order; a row without a reading is NaN.</summary>
    internal static IEnumerable<(long UnixMilliseconds, double Value)> Rows(Recording recording, Channel channel, Stretch within) =>
        RowsOf(recording, channel).Where(row => within.Holds(row.Time)).Select(row => (row.Time, row.Value));

    private static List<Row> RowsOf(Recording recording, Channel channel)
    {
        var rows = DatedRows(recording.SeriesOf(channel), channel);
        if (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0)
        {
            rows.AddRange(LateRows(recording.LateHeartRates, rows));
        }

        SortByTime(rows);
        return rows;
    }

    private static List<Row> DatedRows(SampleSeries series, Channel channel)
    {
        var times = series.UnixMilliseconds;
        var column = series[channel];
        var rows = new List<Row>(times.Length);
        for (var row = 0; row < times.Length; row++)
        {
            if (times[row] != SampleSeries.Undated)
            {
                rows.Add(new Row(times[row], column.IsEmpty ? double.NaN : column[row]));
            }
        }

        return rows;
    }

    /// <summary>Beats of their own join at their own times; within one second a usable reading of the records wins.</summary>
    private static List<Row> LateRows(IReadOnlyList<TimedHeartRate> late, List<Row> rows)
    {
        var taken = rows.Where(row => ChannelLimits.Usable(Channel.HeartRate, row.Value, Sport.Generic)).Select(row => Second(row.Time)).ToHashSet();
        return late
            .Where(beat => !taken.Contains(Second(beat.UnixMilliseconds)))
            .Select(beat => new Row(beat.UnixMilliseconds, beat.BeatsPerMinute))
            .ToList();
    }

    private static long Second(long milliseconds) => (long)Math.Floor(milliseconds / 1000.0);

    private static void SortByTime(List<Row> rows)
    {
        for (var row = 1; row < rows.Count; row++)
        {
            if (rows[row].Time < rows[row - 1].Time)
            {
                var sorted = rows.OrderBy(one => one.Time).ToList();
                rows.Clear();
                rows.AddRange(sorted);
                return;
            }
        }
    }

    private static UsableSample[] WithDurations(List<Row> rows)
    {
        var samples = new UsableSample[rows.Count];
        for (var row = 0; row < samples.Length; row++)
        {
            samples[row] = new UsableSample(rows[row].Time, rows[row].Value, Duration(rows, row));
        }

        return samples;
    }

    /// <summary>Unsigned, so that times from both ends of the range do not overflow: the later row comes second.</summary>
    private static int Duration(List<Row> rows, int row) =>
        row == rows.Count - 1 ? 0 : (int)Math.Min(LongestMilliseconds, unchecked((ulong)(rows[row + 1].Time - rows[row].Time)));

    private static double Share(List<Row> usable, List<Row> all)
    {
        var sampled = Total(all);
        if (sampled == 0)
        {
            return usable.Count > 0 ? 1 : 0;
        }

        return Math.Min(1, (double)Total(usable) / sampled);
    }

    private static long Total(List<Row> rows)
    {
        var total = 0L;
        for (var row = 0; row < rows.Count; row++)
        {
            total += Duration(rows, row);
        }

        return total;
    }

    private readonly record struct Row(long Time, double Value);
}
