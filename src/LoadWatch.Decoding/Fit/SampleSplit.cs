using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>The samples of each session of a part. A row without a time stays with the row before it.</summary>
internal sealed class SampleSplit
{
    private readonly SampleColumns samples;
    private readonly SessionOwners owners;
    private readonly int[] rowsOf;

    private SampleSplit(SampleColumns samples, SessionOwners owners)
    {
        this.samples = samples;
        this.owners = owners;
        rowsOf = new int[owners.Count];
        ForEachRow((_, owner) => rowsOf[owner]++);
    }

    /// <summary>One series per session, in the order of the sessions.</summary>
    public static SampleSeries[] Of(SampleColumns samples, FitClock clock, SessionOwners owners)
    {
        var split = new SampleSplit(samples, owners);
        var times = split.Column(row => clock.UnixMilliseconds(samples.Times[row]));
        var channels = new Dictionary<Channel, double[][]>();
        foreach (var channel in Enum.GetValues<Channel>())
        {
            if (samples[channel] is { IsEmpty: false } column)
                channels[channel] = split.Column(row => column[row]);
        }

        return [.. Enumerable.Range(0, owners.Count).Select(i => new SampleSeries(times[i], Recorded(channels, i)))];
    }

    private static Dictionary<Channel, double[]> Recorded(Dictionary<Channel, double[][]> channels, int session) =>
        channels
            .Where(channel => Array.Exists(channel.Value[session], value => !double.IsNaN(value)))
            .ToDictionary(channel => channel.Key, channel => channel.Value[session]);

    private T[][] Column<T>(Func<int, T> value)
    {
        var columns = Array.ConvertAll(rowsOf, rows => new T[rows]);
        var filled = new int[rowsOf.Length];
        ForEachRow((row, owner) => columns[owner][filled[owner]++] = value(row));
        return columns;
    }

    private void ForEachRow(Action<int, int> take)
    {
        var owner = owners.Of(null);
        for (var row = 0; row < samples.Count; row++)
        {
            var time = samples.Times[row];
            owner = time == SampleSeries.Undated ? owner : owners.Of(time);
            take(row, owner);
        }
    }
}
