namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The columns that a layout of a table names.</summary>
internal static class TableColumns
{
    /// <summary>All fields, those of wide entries too.</summary>
    public static IEnumerable<CsvField> Fields(CsvLayout layout) => layout.Fields.Concat(layout.Wide.SelectMany(entry => entry.Fields));

    public static string Date(CsvLayout layout) => layout.DateColumn ?? layout.Time.Column;

    public static IEnumerable<string?> Named(CsvLayout layout) =>
        [.. Fields(layout).Select(field => field.Column), Date(layout), layout.PersonColumn, layout.GroupColumn];

    /// <summary>Whether the table has what it takes to be read by the layout.</summary>
    public static bool Fit(CsvLayout layout, CsvTable table) =>
        layout.Header.All(table.Has)
        && table.Has(Date(layout))
        && (!Fields(layout).Any() || Fields(layout).Any(field => table.Has(field.Column)));
}
