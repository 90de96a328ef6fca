using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Reads the rows of one table by one layout.</summary>
internal sealed class TableReading
{
    // About 450 bytes a row with its key, measured: so many stay near the 192 MB that a file of 32 MB may take.
    private const int RowsAtMost = 400_000;
    private const int BytesOfRow = 450;
    private const long BytesBeside = 40L << 20;
    private const int TimesFile = 3;

    private const int BadRowsAllowed = 3;
    private const int BadPercentAllowed = 10;

    private readonly CsvTable table;
    private readonly CsvLayout layout;
    private readonly TableKind kind;
    private readonly RowDate dates;
    private readonly SubjectCells subjects;
    private readonly IReadOnlyList<RowPlace> places;
    private readonly IReadOnlyList<FieldCell> shared;
    private readonly KeyedRows keyed;
    private readonly long rowsAtMost;
    private readonly RowProblems problems = new();
    private readonly RowValues values = new();
    private readonly TextPool pool = new();

    public TableReading(CsvTable table, CsvLayout layout)
    {
        this.table = table;
        this.layout = layout;
        kind = TableKind.Of(layout.Kind);
        dates = new RowDate(table, layout);
        subjects = new SubjectCells(table, layout, kind);
        places = RowPlace.Of(table, layout, kind);
        shared = RowPlace.Shared(table, layout, kind);
        keyed = new KeyedRows(kind);

        // Below rows of some hundred bytes it is memory that sets the limit: 150,000 rows of sixty bytes.
        rowsAtMost = Math.Min(RowsAtMost, (BytesBeside + (TimesFile * table.Text.Source.Length)) / BytesOfRow);
    }

    public DecodedFile Read()
    {
        if ((ReadLines() ?? TooManyBad()) is { } refusal)
        {
            return new("table", FileType: null, layout.Name, [], [refusal, .. problems.Close()]);
        }

        return new("table", FileType: null, layout.Name, [], problems.Close())
        {
            Table = new DecodedTable(kind.Rows, layout.Name, keyed.Rows)
            {
                IsNamedByFolder = layout.Table == TableNaming.Folder,
                CoversEverything = layout.Covers is { } covers ? covers == TableCover.Everything : kind.CoversEverything,
            },
        };
    }

    /// <summary>Null once all lines are read, else why the file cannot be used.</summary>
    private Problem? ReadLines()
    {
        using var rows = table.Rows();
        while (rows.Next())
        {
            if (keyed.Count >= rowsAtMost)
            {
                return RowShape.Refusal($"more than {rowsAtMost} rows{(rowsAtMost < RowsAtMost ? ", the most of a file of its size" : "")}", rows.Line);
            }

            if (NamesAgain(rows) is { } again)
            {
                if (again.Severity == ProblemSeverity.Error)
                {
                    return again;
                }

                problems.Add(again);
                continue;
            }

            if (ReadLine(rows) is { } problem)
            {
                problems.AddBad(problem, rows.LineSpan);
            }
        }

        return rows.Fault;
    }

    /// <returns>Why no row of the line can be used, or null; what is wrong with one of several is among the problems.</returns>
    private Problem? ReadLine(CsvRows rows)
    {
        if (RowShape.IsEmpty(rows))
        {
            return null;
        }

        if (RowShape.Complaint(rows, table) is { } shape)
        {
            return shape;
        }

        var filled = places.Where(place => place.IsFilled(rows)).ToList();
        if (filled.Count == 0)
        {
            return null;
        }

        var date = dates.Read(rows, out var problem);
        if (date is null || (problem = Take(rows, shared)) is not null)
        {
            return problem;
        }

        foreach (var place in filled)
        {
            if (ReadPlace(rows, place, date.Value) is { } wrong)
            {
                problems.AddBad(wrong, filled.Count == 1 ? rows.LineSpan : 1);
            }
        }

        return null;
    }

    private Problem? ReadPlace(CsvRows rows, RowPlace place, LocalDate date)
    {
        values.Clear();
        foreach (var (field, value) in place.Constants)
        {
            values.Set(field, value);
        }

        var subject = subjects.Read(rows, place, out var problem);
        if ((problem ??= Take(rows, shared) ?? Take(rows, place.Cells)) is not null)
        {
            return problem;
        }

        var made = kind.Make(date, values);
        return made.Content is { } content
            ? Add(rows, new TableRow(subject is null ? null : pool.Same(subject), date, "", content, rows.Line))
            : Wrong(rows, place, made.Field!, made.Reason!);
    }

    /// <returns>The first cell that says nothing usable, or null.</returns>
    private Problem? Take(CsvRows rows, IReadOnlyList<FieldCell> cells)
    {
        foreach (var cell in cells)
        {
            var read = cell.Read(rows.Text(cell.Column));
            if (read.Reason is { } reason)
            {
                return table.Wrong(rows, cell.Column, reason);
            }

            if (read.Value is { } value)
            {
                values.Set(cell.Field, value is string text ? pool.Same(text) : value);
            }
        }

        return null;
    }

    private Problem? Add(CsvRows rows, TableRow row)
    {
        var key = kind.Key(row.Date, row.Content);
        if (keyed.Add(row with { Key = key.Text }, key) is not var (line, lost))
        {
            return null;
        }

        problems.AddBad(RowShape.Refusal($"contradicts line {line}, which is about the same {kind.One}: neither is used", rows.Line), lost);
        return null;
    }

    /// <summary>What is wrong with several cells together stands at the column of the field meant, where the table has one.</summary>
    private Problem Wrong(CsvRows rows, RowPlace place, string field, string reason) =>
        place.Cells.Concat(shared).FirstOrDefault(cell => cell.Field == field) is { } cell
            ? table.Wrong(rows, cell.Column, reason)
            : RowShape.Refusal(reason, rows.Line) with { Field = field };

    /// <summary>For a line of column names in the middle: a warning where they are those of the first line, an error where they are others.</summary>
    private Problem? NamesAgain(CsvRows rows) => rows switch
    {
        _ when rows.Text(dates.Column) != table.Names[dates.Column] => null,
        _ when Enumerable.Range(0, table.Names.Count).All(column => rows.Text(column) == table.Names[column]) =>
            RowShape.Refusal("the column names come again: rows above and below are taken as one table", rows.Line)
                with { Severity = ProblemSeverity.Warning },
        _ => RowShape.Refusal("other column names begin here: two files in one", rows.Line),
    };

    private Problem? TooManyBad()
    {
        var bad = problems.BadLines;
        var all = keyed.Count + bad;
        return bad switch
        {
            0 => null,
            _ when keyed.Count == 0 => new Problem(ProblemSeverity.Error, $"none of {all} rows can be used"),
            > BadRowsAllowed when bad * 100 > all * BadPercentAllowed =>
                new Problem(ProblemSeverity.Error, $"{bad} of {all} rows cannot be used, more than {BadPercentAllowed} %"),
            _ => null,
        };
    }
}
