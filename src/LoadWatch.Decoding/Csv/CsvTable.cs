using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>A text with the names of its columns, read with one encoding and one separator.</summary>
/// <param name="Separator">The one in use: a first line <c>sep=;</c> goes before the layout's.</param>
/// <param name="RowsAbove">Rows above the data: up to the names, these included, and those passed over below them.</param>
/// <param name="Line">The line of the names; null without any.</param>
/// <param name="Fault">Why the names could not be read, or null.</param>
internal sealed record CsvTable(CsvText Text, char Separator, int RowsAbove, long? Line, IReadOnlyList<string> Names, Problem? Fault)
{
    private const int ShownCharacters = 200;

    // A tracking export with every band of speed has some hundred.
    private const int ColumnsAtMost = 5_000;

    /// <param name="linesAbove">Lines at the start of the file that are passed over before the names; a first line <c>sep=;</c> is always one.</param>
    /// <param name="linesBelow">Lines below the names that are passed over.</param>
    public static CsvTable Open(CsvSource source, string encoding, char separator, int linesAbove, int linesBelow)
    {
        var text = CsvText.Of(source, encoding);
        using (var rows = new CsvRows(text, separator))
        {
            if (!rows.Next())
            {
                return new(text, separator, 0, null, [], rows.Fault ?? new Problem(ProblemSeverity.Error, "the file is empty", Line: 1));
            }

            if (StatedSeparator(rows, separator) is { } stated)
            {
                (separator, linesAbove) = (stated, Math.Max(linesAbove, (int)rows.Line));
            }
        }

        return OpenBelow(text, separator, linesAbove, linesBelow);
    }

    /// <summary>Lines above the names that a layout has to pass over.</summary>
    public int LinesAbove { get; init; }

    /// <summary>The line on which the names end: a later one than theirs where a quoted name holds line ends.</summary>
    public long LastLine { get; init; }

    /// <summary>The rows below the names.</summary>
    public CsvRows Rows()
    {
        var rows = new CsvRows(Text, Separator);
        for (var row = 0; row < RowsAbove; row++)
        {
            rows.Next();
        }

        return rows;
    }

    /// <summary>The column of a name, or null.</summary>
    public int? Find(string? name)
    {
        for (var index = 0; index < Names.Count; index++)
        {
            if (Names[index] == name)
            {
                return index;
            }
        }

        return null;
    }

    public bool Has(string name) => Find(name) is not null;

    /// <summary>A row that cannot be used because of a cell.</summary>
    public Problem Wrong(CsvRows rows, int column, string reason) =>
        new(ProblemSeverity.Error, reason, Line: rows.Line, Column: column + 1, Field: Names[column]);

    /// <summary>The names for a message: cut to a readable length, without control characters.</summary>
    public string ShownNames()
    {
        var shown = string.Join(", ", Names.Take(50));
        shown = string.Concat(shown.Take(ShownCharacters).Select(c => char.IsControl(c) ? '?' : c));
        return shown.Length == ShownCharacters || Names.Count > 50 ? shown + "..." : shown;
    }

    private static CsvTable OpenBelow(CsvText text, char separator, int linesAbove, int linesBelow)
    {
        using var rows = new CsvRows(text, separator);
        var passed = 0;
        while (rows.Next())
        {
            passed++;
            if (rows.Line > linesAbove)
            {
                return At(text, separator, passed, linesBelow, rows);
            }
        }

        return new(text, separator, passed, null, [], rows.Fault ?? new Problem(ProblemSeverity.Error, "no line of column names", Line: linesAbove + 1));
    }

    private static CsvTable At(CsvText text, char separator, int rowsAbove, int linesBelow, CsvRows rows)
    {
        var line = rows.Line;
        if (rows.CellCount > ColumnsAtMost)
        {
            return new(text, separator, rowsAbove, line, [], new Problem(ProblemSeverity.Error, $"more than {ColumnsAtMost} columns", Line: line));
        }

        IReadOnlyList<string> names = [.. Enumerable.Range(0, rows.CellCount).Select(rows.Text)];
        var last = line + rows.LineSpan - 1;
        while (linesBelow > 0 && rows.Next() && rows.Line <= last + linesBelow)
        {
            rowsAbove++;
        }

        return new(text, separator, rowsAbove, line, names, Fault: null) { LastLine = last };
    }

    /// <summary>Of a first line <c>sep=;</c>, whether or not the reader has cut it in two.</summary>
    private static char? StatedSeparator(CsvRows rows, char separator)
    {
        var first = rows.Text(0);
        return (rows.CellCount, first.Length) switch
        {
            _ when !first.StartsWith("sep=", StringComparison.OrdinalIgnoreCase) => null,
            (1, 5) when MaySeparate(first[4]) => first[4],
            (2, 4) when rows[1].IsEmpty => separator,
            (1, 4) => '\t',
            _ => null,
        };
    }

    /// <summary>A letter or a quote between two cells would be a mistake.</summary>
    private static bool MaySeparate(char c) => c == '\t' || (char.IsAscii(c) && c != '"' && (char.IsPunctuation(c) || char.IsSymbol(c)));
}
