using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>The samples of each session of a part. A row without a time stays with the row before it.</summary>
internal sealed class SampleSplit
{
    private readonly List<Stretch> stretches;
    private readonly int[] rowsOf;

    private SampleSplit(SampleColumns samples, SessionOwners owners)
    {
        stretches = Stretches(samples, owners);
        rowsOf = new int[owners.Count];
        foreach (var stretch in stretches)
            rowsOf[stretch.Owner] += stretch.Rows;
    }

    /// <summary>One series per session, in the order of the sessions.</summary>
    public static SampleSeries[] Of(SampleColumns samples, FitClock clock, SessionOwners owners) =>
        new SampleSplit(samples, owners).Series(samples.Times, channel => samples[channel] is { IsEmpty: false } column ? column : null, clock);

    /// <summary>The same for what developer fields hold beside them; null where they hold nothing.</summary>
    public static SampleSeries[]? Shadowed(SampleColumns samples, FitClock clock, SessionOwners owners) =>
        Array.Exists(Enum.GetValues<Channel>(), channel => samples.Shadowed(channel) is not null)
            ? new SampleSplit(samples, owners).Series(samples.Times, samples.Shadowed, clock)
            : null;

    private SampleSeries[] Series(SparseColumn<long> rows, Func<Channel, SparseColumn<double>?> columnOf, FitClock clock)
    {
        var times = Columns(rows);
        Array.ForEach(times, clock.ToUnix);
        var channels = new Dictionary<Channel, double[][]>();
        foreach (var channel in Enum.GetValues<Channel>())
        {
            if (columnOf(channel) is { } column)
                channels[channel] = Columns(column);
        }

        return [.. Enumerable.Range(0, rowsOf.Length).Select(i => new SampleSeries(times[i], Recorded(channels, i)))];
    }

    private static Dictionary<Channel, double[]> Recorded(Dictionary<Channel, double[][]> channels, int session) =>
        channels
            .Where(channel => Array.Exists(channel.Value[session], value => !double.IsNaN(value)))
            .ToDictionary(channel => channel.Key, channel => channel.Value[session]);

    private T[][] Columns<T>(SparseColumn<T> column)
        where T : struct
    {
        var columns = Array.ConvertAll(rowsOf, rows => GC.AllocateUninitializedArray<T>(rows));
        var filled = new int[rowsOf.Length];
        foreach (var (first, rows, owner) in stretches)
        {
            column.CopyTo(first, columns[owner].AsSpan(filled[owner], rows));
            filled[owner] += rows;
        }

        return columns;
    }

    private static List<Stretch> Stretches(SampleColumns samples, SessionOwners owners)
    {
        var found = new List<Stretch>();
        var (first, owner) = (0, owners.Of(null));
        for (var row = 0; row < samples.Count && owners.Count > 1; row++)
        {
            var time = samples.Times[row];
            var next = time == SampleSeries.Undated ? owner : owners.Of(time, owner);
            if (next == owner)
                continue;

            found.Add(new Stretch(first, row - first, owner));
            (first, owner) = (row, next);
        }

        found.Add(new Stretch(first, samples.Count - first, owner));
        return found;
    }

    /// <summary>Rows that follow each other and belong to one session.</summary>
    private readonly record struct Stretch(int First, int Rows, int Owner);
}
