using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Fills the columns of a series; memory is what the readings need, and a channel without a reading takes none.</summary>
internal sealed class SampleColumns
{
    private readonly GrowingColumn<long> times = new(SampleSeries.Undated);
    private readonly GrowingColumn<double>?[] values = new GrowingColumn<double>?[Enum.GetValues<Channel>().Length];

    public int Count { get; private set; }

    /// <param name="unixMilliseconds">Time of the row.</param>
    /// <param name="readings">By channel number; NaN for none.</param>
    public void Add(long unixMilliseconds, ReadOnlySpan<double> readings)
    {
        times[Count] = unixMilliseconds;
        for (var channel = 0; channel < values.Length; channel++)
        {
            if (!double.IsNaN(readings[channel]))
            {
                (values[channel] ??= new(double.NaN))[Count] = readings[channel];
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
                columns[channel] = column.Close(Count);
                values[(int)channel] = null;
            }
        }

        return new SampleSeries(times.Close(Count), columns);
    }
}
