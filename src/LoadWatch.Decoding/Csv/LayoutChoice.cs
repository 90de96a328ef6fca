using LoadWatch.Decoding.Csv.Tables;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>The layout that a file's column names pick, or why none could be picked.</summary>
internal sealed record LayoutChoice(CsvLayout? Layout, CsvTable? Table, Problem? Problem)
{
    public static LayoutChoice Make(CsvSource source, IReadOnlyList<CsvLayout> layouts)
    {
        if (layouts.Select(Unusable).FirstOrDefault(reason => reason is not null) is { } unusable)
        {
            return Refused(Error(unusable, line: null));
        }

        var tables = Tables(source, layouts);
        var fitting = layouts.Where(layout => Fits(layout, tables[Dialect(layout)])).ToList();
        var longest = fitting.Count == 0 ? 0 : fitting.Max(layout => layout.Header.Count);
        var best = fitting.FindAll(layout => layout.Header.Count == longest);
        return best switch
        {
            [] => Refused(NoneFits(tables.Values, layouts)),
            [var only] => Checked(only, tables[Dialect(only)]),
            _ => Refused(Error($"several layouts fit equally well: {NamesOf(best)}", tables[Dialect(best[0])].Line)),
        };
    }

    private static string? Unusable(CsvLayout layout) =>
        layout.Validate() is [var reason, ..] ? $"layout '{layout.Name}' cannot be used: {reason}" : null;

    private static Dictionary<(string, char, int, int), CsvTable> Tables(CsvSource source, IReadOnlyList<CsvLayout> layouts) =>
        layouts.DistinctBy(Dialect).ToDictionary(Dialect, layout => CsvTable.Open(source, layout.Encoding, layout.Delimiter, layout.LinesAbove, layout.LinesBelow));

    private static (string Encoding, char Delimiter, int LinesAbove, int LinesBelow) Dialect(CsvLayout layout) =>
        (layout.Encoding, layout.Delimiter, layout.LinesAbove, layout.LinesBelow);

    private static bool Fits(CsvLayout layout, CsvTable table) =>
        layout.Kind == CsvKind.Samples ? FitsSamples(layout, table) : TableColumns.Fit(layout, table);

    private static bool FitsSamples(CsvLayout layout, CsvTable table) =>
        layout.Header.All(table.Has)
        && table.Has(layout.Time.Column)
        && Wanted(layout).All(name => name is null || table.Has(name))
        && layout.Columns.Any(column => table.Has(column.Column));

    /// <summary>Without these columns the rows would mean something else.</summary>
    private static IEnumerable<string?> Wanted(CsvLayout layout) =>
        [layout.Time.StartColumn, layout.Time.DateColumn, layout.PersonColumn, layout.Quality?.Column];

    private static LayoutChoice Checked(CsvLayout layout, CsvTable table)
    {
        var used = UsedColumns(layout).FirstOrDefault(name => table.Names.Count(other => other == name) > 1);
        return used is null
            ? new(layout, table, Problem: null)
            : Refused(new Problem(ProblemSeverity.Error, "two columns have this name", Line: table.Line, Field: used));
    }

    private static IEnumerable<string?> UsedColumns(CsvLayout layout) => layout.Kind == CsvKind.Samples
        ? [.. layout.Columns.Select(column => column.Column), layout.Time.Column, layout.SportColumn, .. Wanted(layout)]
        : TableColumns.Named(layout);

    private static Problem NoneFits(IEnumerable<CsvTable> tables, IReadOnlyList<CsvLayout> layouts)
    {
        var widest = tables.MaxBy(table => table.Names.Count);
        return widest switch
        {
            null => Error("a CSV, but no layout is configured", line: 1),
            { Fault: { } fault } => fault,
            _ => Error($"no layout fits the column names found ({widest.ShownNames()}); layouts known: {NamesOf(layouts)}", widest.Line),
        };
    }

    private static string NamesOf(IEnumerable<CsvLayout> layouts) => string.Join(", ", layouts.Select(layout => layout.Name));

    private static Problem Error(string reason, long? line) => new(ProblemSeverity.Error, reason, Line: line);

    private static LayoutChoice Refused(Problem problem) => new(Layout: null, Table: null, problem);
}
