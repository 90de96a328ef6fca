using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Finds the mark between cells, the encoding and the line of the column names.</summary>
internal static class DialectStudy
{
    private const int RowsLookedAt = 200;

    // In this order where two marks part the rows equally well: a comma may also be the decimal mark.
    private static readonly char[] Delimiters = [';', '\t', '|', ','];

    /// <summary>The file with its column names, or with the fault of why it has none.</summary>
    public static CsvTable Find(CsvSource source, DraftNotes notes)
    {
        var best = Delimiters.Select(delimiter => Parting(source, delimiter)).MaxBy(parting => parting.Share)!;
        if (best.Table.Fault is not null)
        {
            return best.Table;
        }

        if (best.Cells < 2)
        {
            return best.Table with { Fault = new Problem(ProblemSeverity.Error, "no mark parts the rows into columns: looked for ; tab | and ,", Line: 1) };
        }

        var table = WithNames(best.Table, best.Cells, notes);
        Tell(table, notes);
        return table;
    }

    /// <summary>How many of the first rows have the number of cells that most have.</summary>
    private static (CsvTable Table, int Cells, double Share) Parting(CsvSource source, char delimiter)
    {
        var table = CsvTable.Open(source, CsvText.Auto, delimiter, linesAbove: 0, linesBelow: 0);
        if (table.Fault is not null)
        {
            return (table, 0, 0);
        }

        using var rows = (table with { RowsAbove = 0 }).Rows();
        var counts = new List<int>();
        while (counts.Count < RowsLookedAt && rows.Next())
        {
            counts.Add(rows.CellCount);
        }

        var most = counts.GroupBy(count => count).OrderByDescending(group => group.Count()).ThenByDescending(group => group.Key).First();
        return (table, most.Key, most.Key < 2 ? 0 : (double)most.Count() / counts.Count);
    }

    /// <summary>The names stand in the first row that has as many cells as most, none of which is empty or a number.</summary>
    private static CsvTable WithNames(CsvTable table, int cells, DraftNotes notes)
    {
        using var rows = (table with { RowsAbove = 0 }).Rows();
        for (var row = 1; row <= RowsLookedAt && rows.Next(); row++)
        {
            if (row < table.RowsAbove || rows.CellCount != cells || !AreNames(rows))
            {
                continue;
            }

            var linesAbove = row > table.RowsAbove ? (int)rows.Line - 1 : 0;
            if (linesAbove > 0)
            {
                notes.Doubt("lines_above", $"the column names stand on line {rows.Line}, and what is above is passed over: do they stand there in every such file?");
            }

            return table with { LinesAbove = linesAbove, RowsAbove = row, Line = rows.Line, LastLine = rows.Line + rows.LineSpan - 1, Names = [.. Enumerable.Range(0, cells).Select(rows.Text)] };
        }

        return table with { Fault = new Problem(ProblemSeverity.Error, "no line of column names: one is needed, since columns are told by their names", Line: 1) };
    }

    private static bool AreNames(CsvRows rows)
    {
        var filled = 0;
        for (var index = 0; index < rows.CellCount; index++)
        {
            if (StrictNumber.TryRead(rows[index], '.', out _) || StrictNumber.TryRead(rows[index], ',', out _) || Notation.MomentsOf(rows[index].ToArray()).Count > 0)
            {
                return false;
            }

            filled += rows[index].IsEmpty ? 0 : 1;
        }

        return filled * 2 > rows.CellCount;
    }

    private static void Tell(CsvTable table, DraftNotes notes)
    {
        var mark = table.Separator == '\t' ? "a tab" : $"'{table.Separator}'";
        notes.Found.Add($"{mark} between cells, {table.Names.Count} columns, their names on line {table.Line}: {DraftNotes.Quoted(table.Names.Take(40))}");
        if (table.Text.MarkLength > 0)
        {
            notes.Found.Add("encoding: told by a byte order mark");
        }
        else if (table.Text.Encoding is null)
        {
            notes.Found.Add("encoding: UTF-8");
        }
        else
        {
            notes.Doubt("encoding", $"no UTF-8, read as Windows-1252: are the letters of the names right? {DraftNotes.Quoted(table.Names.Where(name => name.Any(c => c > '\x7f')).Take(5))}");
        }
    }
}
