using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>Takes the readings of a row, in the units of the channels.</summary>
internal sealed class ReadingCells(CsvTable table, CsvLayout layout)
{
    // No reading of any channel comes near it; it keeps sums of readings finite.
    private const double LargestReading = 1e9;

    private readonly double[] values = new double[Enum.GetValues<Channel>().Length];
    private readonly (int Column, Channel Channel, ChannelUnit Unit)[] channels =
    [
        .. from column in layout.Columns
           where table.Has(column.Column)
           select (table.Find(column.Column)!.Value, column.Channel, ChannelUnit.Find(column.Channel, column.Unit)!.Value),
    ];

    private readonly QualityCell? quality = layout.Quality is { } wanted ? new(table, wanted, layout.Decimal) : null;

    /// <summary>The readings of the row last taken, by channel number; NaN for none.</summary>
    public ReadOnlySpan<double> Values => values;

    /// <returns>The first cell that is no reading, or the cell of the quality that is no number; else null.</returns>
    public Problem? Take(CsvRows rows)
    {
        Array.Fill(values, double.NaN);
        foreach (var (column, channel, unit) in channels)
        {
            var cell = rows[column];
            if (cell.IsEmpty)
            {
                continue;
            }

            if (!StrictNumber.TryRead(cell, layout.Decimal, out var value))
            {
                return table.Wrong(rows, column, $"not a number with the decimal mark {layout.Decimal}");
            }

            if (Math.Abs(value) > LargestReading)
            {
                return table.Wrong(rows, column, "beyond any reading");
            }

            values[(int)channel] = unit.Convert(value);
        }

        return quality?.Take(rows, values);
    }
}
