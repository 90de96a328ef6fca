namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The columns that a layout of a table names.</summary>
internal static class TableColumns
{
    /// <summary>All fields, those of wide entries too.</summary>
    public static IEnumerable<CsvField> Fields(CsvLayout layout) => layout.Fields.Concat(layout.Wide.SelectMany(entry => entry.Fields));

    public static string Date(CsvLayout layout) => layout.DateColumn ?? layout.Time.Column;

    public static IEnumerable<string?> Named(CsvLayout layout) =>
        [.. Fields(layout).Select(field => field.Column), Date(layout), layout.PersonColumn, layout.GroupColumn];

    /// <summary>The same; a column of moments may state the date and a time of day.</summary>
    public static IEnumerable<string?> NamedForOneThing(CsvLayout layout) =>
    [
        .. Fields(layout).Where(field => !IsTimeOfMoment(layout, field)).Select(field => field.Column),
        Date(layout),
        layout.PersonColumn,
        layout.GroupColumn,
    ];

    private static bool IsTimeOfMoment(CsvLayout layout, CsvField field) =>
        MomentNotation.IsColumn(layout, field.Column) && TableKind.Of(layout.Kind).Role(field.Field) is TimeRole;

    /// <summary>Whether the table has what it takes to be read by the layout.</summary>
    public static bool Fit(CsvLayout layout, CsvTable table) =>
        layout.Header.All(table.Has)
        && table.Has(Date(layout))
        && (!Fields(layout).Any() || Fields(layout).Any(field => table.Has(field.Column)));
}
