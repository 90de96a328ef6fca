using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>The samples of each session of a part. A row without a time stays with the row before it.</summary>
internal sealed class SampleSplit
{
    private static readonly Channel[] Channels = Enum.GetValues<Channel>();
    private readonly SampleColumns samples;
    private readonly SessionOwners owners;
    private readonly int[] rowsOf;

    public SampleSplit(SampleColumns samples, SessionOwners owners)
    {
        this.samples = samples;
        this.owners = owners;
        rowsOf = new int[owners.Count];
        foreach (var stretch in Stretches())
            rowsOf[stretch.Owner] += stretch.Rows;
    }

    /// <summary>One series per session, in the order of the sessions. Each column goes back as soon as it is copied, so the samples are empty then.</summary>
    public SampleSeries[] HandOver(FitClock clock)
    {
        var channels = new Dictionary<Channel, double[][]>();
        foreach (var channel in Channels)
        {
            if (samples[channel] is { IsEmpty: false } column)
                channels[channel] = Copied(column);
        }

        var times = Copied(samples.Times);
        Array.ForEach(times, clock.ToUnix);
        return [.. Enumerable.Range(0, rowsOf.Length).Select(i => new SampleSeries(times[i], Recorded(channels, i)))];
    }

    /// <summary>What developer fields hold beside the channels, for each session; null where they hold nothing.</summary>
    public Dictionary<Channel, ChannelStatistics>[]? Shadowed()
    {
        Dictionary<Channel, ChannelStatistics>[]? shadowed = null;
        foreach (var channel in Channels)
        {
            if (samples.Shadowed(channel) is not { } column)
                continue;

            shadowed ??= Array.ConvertAll(rowsOf, _ => new Dictionary<Channel, ChannelStatistics>());
            foreach (var (owner, tally) in Tallies(column).Index())
            {
                if (tally.Count > 0)
                    shadowed[owner][channel] = new ChannelStatistics(tally.Count, tally.Sum / tally.Count, tally.Max);
            }
        }

        return shadowed;
    }

    private Tally[] Tallies(SparseColumn<double> column)
    {
        const int most = 512;
        var tallies = new Tally[rowsOf.Length];
        Span<double> values = stackalloc double[most];
        foreach (var (first, rows, owner) in Stretches())
        {
            for (var done = 0; done < rows; done += most)
            {
                var piece = values[..Math.Min(most, rows - done)];
                column.CopyTo(first + done, piece);
                tallies[owner].Add(piece);
            }
        }

        return tallies;
    }

    private static Dictionary<Channel, double[]> Recorded(Dictionary<Channel, double[][]> channels, int session) =>
        channels
            .Where(channel => Array.Exists(channel.Value[session], value => !double.IsNaN(value)))
            .ToDictionary(channel => channel.Key, channel => channel.Value[session]);

    private T[][] Copied<T>(SparseColumn<T> column)
        where T : struct
    {
        var columns = Array.ConvertAll(rowsOf, rows => GC.AllocateUninitializedArray<T>(rows));
        var filled = new int[rowsOf.Length];
        foreach (var (first, rows, owner) in Stretches())
        {
            column.CopyTo(first, columns[owner].AsSpan(filled[owner], rows));
            filled[owner] += rows;
        }

        column.Return();
        return columns;
    }

    /// <summary>Found anew for every column: sessions may take turns row by row, and a list of that would be longer than a column.</summary>
    private IEnumerable<Stretch> Stretches()
    {
        var (first, owner) = (0, owners.Of(null));
        for (var row = 0; row < samples.Count && owners.Count > 1; row++)
        {
            var time = samples.Times[row];
            var next = time == SampleSeries.Undated ? owner : owners.Of(time, owner);
            if (next == owner)
                continue;

            yield return new Stretch(first, row - first, owner);
            (first, owner) = (row, next);
        }

        yield return new Stretch(first, samples.Count - first, owner);
    }

    private struct Tally
    {
        public int Count;
        public double Sum;
        public double Max;

        public void Add(ReadOnlySpan<double> values)
        {
            foreach (var value in values)
            {
                if (double.IsNaN(value))
                    continue;

                Max = Count == 0 ? value : Math.Max(Max, value);
                Sum += value;
                Count++;
            }
        }
    }

    /// <summary>Rows that follow each other and belong to one session.</summary>
    private readonly record struct Stretch(int First, int Rows, int Owner);
}
