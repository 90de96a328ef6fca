using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Shows every row of a file to the studies of its columns.</summary>
internal static class RowStudy
{
    /// <returns>Why the file cannot be read to its end, or null; and how many lines below the names are no data.</returns>
    public static (Problem? Fault, int LinesBelow) Read(CsvTable table, IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        using var rows = table.Rows();
        var (all, odd, first) = (0L, 0L, 0L);
        var linesBelow = 0;
        while (rows.Next())
        {
            if (all == 0 && linesBelow == 0 && TakeUnits(rows, columns, notes))
            {
                linesBelow = (int)(rows.Line - table.LastLine);
                continue;
            }

            all++;
            if (rows.CellCount != table.Names.Count || rows.IsQuotedWrongly)
            {
                first = odd == 0 ? rows.Line : first;
                odd++;
                continue;
            }

            foreach (var column in columns)
            {
                column.Take(rows[column.Index]);
            }
        }

        if (odd > 0)
        {
            notes.Doubt("header", $"{odd} of {all} rows have another number of cells than there are names and are passed over, the first on line {first}");
        }

        notes.Found.Add($"{all} rows below the names");
        return (rows.Fault ?? (all == odd ? new Problem(ProblemSeverity.Error, "no rows below the column names", Line: table.Line) : null), linesBelow);
    }

    /// <summary>A line of units below the names: no number in it, and some cell is a unit.</summary>
    private static bool TakeUnits(CsvRows rows, IReadOnlyList<ColumnStudy> columns, DraftNotes notes)
    {
        var units = new List<(ColumnStudy Column, string Unit)>();
        foreach (var column in columns)
        {
            var text = rows.Text(column.Index);
            if (StrictNumber.TryRead(rows[column.Index], '.', out _) || StrictNumber.TryRead(rows[column.Index], ',', out _))
            {
                return false;
            }

            if (UnitWords.Find(text.Trim('(', ')', '[', ']')) is { } unit)
            {
                units.Add((column, unit));
            }
        }

        foreach (var (column, unit) in units)
        {
            column.Unit = unit;
        }

        if (units.Count > 0)
        {
            notes.Doubt("lines_below", $"line {rows.Line} holds units: they are used here, and the line is passed over: does it stand there in every such file?");
        }

        return units.Count > 0;
    }
}
