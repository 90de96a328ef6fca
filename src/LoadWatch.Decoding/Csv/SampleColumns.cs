using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Fills the columns of a series. They are made once, for as many rows as there can be, so memory is what the readings need; a channel
/// without a reading takes none.
/// </summary>
internal sealed class SampleColumns(int rowsAtMost)
{
    private readonly long[] times = new long[rowsAtMost];
    private readonly double[]?[] values = new double[]?[Enum.GetValues<Channel>().Length];

    public int Count { get; private set; }

    /// <param name="unixMilliseconds">Time of the row.</param>
    /// <param name="readings">By channel number; NaN for none.</param>
    public void Add(long unixMilliseconds, ReadOnlySpan<double> readings)
    {
        times[Count] = unixMilliseconds;
        for (var channel = 0; channel < values.Length; channel++)
        {
            if (CutMark.IsTaken(readings[channel]))
            {
                (values[channel] ??= Empty())[Count] = readings[channel];
            }
        }

        Count++;
    }

    /// <summary>Hands the columns over; nothing can be added after it.</summary>
    public SampleSeries ToSeries()
    {
        var columns = new Dictionary<Channel, double[]>();
        foreach (var channel in Enum.GetValues<Channel>())
        {
            if (values[(int)channel] is { } column)
            {
                columns[channel] = Cut(column);
                values[(int)channel] = null;
            }
        }

        return new SampleSeries(Cut(times), columns);
    }

    private double[] Empty()
    {
        var column = new double[times.Length];
        Array.Fill(column, double.NaN);
        return column;
    }

    private T[] Cut<T>(T[] column) => column.Length == Count ? column : column[..Count];
}
