using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Gathers the rows of a series; a stretch of a channel without a reading takes no memory.</summary>
internal sealed class SampleColumns
{
    private readonly BlockColumn<long> times = new(SampleSeries.Undated);
    private readonly BlockColumn<double>[] values = [.. Enum.GetValues<Channel>().Select(_ => new BlockColumn<double>(double.NaN))];

    public int Count { get; private set; }

    /// <summary>The latest time, milliseconds since 1970; null without a row.</summary>
    public long? Latest { get; private set; }

    /// <summary>The earliest time, milliseconds since 1970; null without a row.</summary>
    public long? Earliest { get; private set; }

    public static SampleColumns Of(SampleSeries series)
    {
        var columns = new SampleColumns();
        var readings = new double[columns.values.Length];
        for (var row = 0; row < series.Count; row++)
        {
            for (var channel = 0; channel < readings.Length; channel++)
            {
                readings[channel] = series[(Channel)channel] is { IsEmpty: false } column ? column[row] : double.NaN;
            }

            columns.Add(series.UnixMilliseconds[row], readings);
        }

        return columns;
    }

    /// <param name="unixMilliseconds">Time of the row.</param>
    /// <param name="readings">By channel number; NaN for none.</param>
    public void Add(long unixMilliseconds, ReadOnlySpan<double> readings)
    {
        times.Set(Count, unixMilliseconds);
        Latest = Latest > unixMilliseconds ? Latest : unixMilliseconds;
        Earliest = Earliest < unixMilliseconds ? Earliest : unixMilliseconds;
        for (var channel = 0; channel < values.Length; channel++)
        {
            if (CutMark.IsTaken(readings[channel]))
            {
                values[channel].Set(Count, readings[channel]);
            }
        }

        Count++;
    }

    /// <summary>
    /// Hands the rows over as one series, or as one for each session; nothing can be added after it. One column after the other leaves its blocks,
    /// so that no more than one is there twice.
    /// </summary>
    /// <param name="sessionsOf">The rows of each session, from the times of all; null, or null from it, for one series of all.</param>
    public IReadOnlyList<SampleSeries> ToSeries(Func<long[], IReadOnlyList<int[]>?>? sessionsOf)
    {
        var all = times.Take(Count);
        var sessions = sessionsOf?.Invoke(all);
        var columns = Enumerable.Range(0, sessions?.Count ?? 1).Select(_ => new Dictionary<Channel, double[]>()).ToList();
        foreach (var channel in Enum.GetValues<Channel>().Where(channel => !values[(int)channel].IsEmpty))
        {
            var column = values[(int)channel].Take(Count);
            for (var session = 0; session < columns.Count; session++)
            {
                Add(columns[session], channel, sessions is null ? column : Of(column, sessions[session]));
            }
        }

        return [.. columns.Select((those, session) => new SampleSeries(sessions is null ? all : Of(all, sessions[session]), those))];
    }

    private static void Add(Dictionary<Channel, double[]> columns, Channel channel, double[] column)
    {
        if (Array.Exists(column, CutMark.IsTaken))
        {
            columns[channel] = column;
        }
    }

    private static T[] Of<T>(T[] column, int[] rows) => Array.ConvertAll(rows, row => column[row]);
}
