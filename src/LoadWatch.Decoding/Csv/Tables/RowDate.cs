using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Tells the date of each row, from a column of dates or of moments.</summary>
internal sealed class RowDate(CsvTable table, CsvLayout layout)
{
    private readonly CellReading reading = layout.DateColumn is null ? OfMoments(layout) : new DateNotation(layout.DateFormat).Read;

    /// <summary>From 0.</summary>
    public int Column { get; } = table.Find(TableColumns.Date(layout))!.Value;

    /// <returns>Null with the problem.</returns>
    public LocalDate? Read(CsvRows rows, out Problem? problem)
    {
        var text = rows.Text(Column);
        var read = text.Length == 0 ? CellValue.Wrong("no date") : reading(text);
        problem = read.Reason is { } reason ? table.Wrong(rows, Column, reason) : null;
        return read.Value as LocalDate?;
    }

    private static CellReading OfMoments(CsvLayout layout)
    {
        var moments = new MomentNotation(layout);
        return text => moments.Read(text) is { } local
            ? DateNotation.Plausible(local.Date)
            : CellValue.Wrong("not a time as the layout writes it");
    }
}
