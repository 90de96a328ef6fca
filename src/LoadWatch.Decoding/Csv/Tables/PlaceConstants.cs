namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The fields that a layout, or a wide entry of it, states itself, each with its value as our own formats write it.</summary>
internal static class PlaceConstants
{
    public static IEnumerable<(string Field, string Text)> Of(CsvLayout layout, CsvWideEntry? entry) =>
        [.. Pairs(layout.Constants), .. entry is null ? [] : Of(entry), .. UnitOfValue(entry?.Fields ?? []), .. UnitOfValue(layout.Fields)];

    private static IEnumerable<(string Field, string Text)> Of(CsvWideEntry entry) =>
        Pairs(entry.Constants).Concat(
            from pair in new (string Field, string? Text)[]
            {
                ("order", RowKey.Written(entry.Order)),
                ("set", RowKey.Written(entry.Set)),
                ("exercise", entry.Exercise),
                ("machine", entry.Machine),
                ("drill", entry.Drill),
                ("test", entry.Test),
                ("unit", entry.Unit),
                ("hand", entry.Hand),
            }
            where pair.Text is not null
            select (pair.Field, pair.Text));

    private static IEnumerable<(string Field, string Text)> Pairs(IReadOnlyDictionary<string, string> constants) =>
        constants.Select(pair => (pair.Key, pair.Value));

    /// <summary>The unit that the layout states for the value of a test is the test's unit.</summary>
    private static IEnumerable<(string Field, string Text)> UnitOfValue(IEnumerable<CsvField> fields) =>
        from field in fields
        where field is { Field: TestValueRole.Word, Unit: not null }
        select ("unit", TestValueRole.UnitRead(field.Unit!));
}
