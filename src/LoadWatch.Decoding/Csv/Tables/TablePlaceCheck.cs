namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Finds what is wrong with the fields of a row together: one stated twice, one that no row can do without, constants that are none.</summary>
internal static class TablePlaceCheck
{
    public static IEnumerable<string> Reasons(CsvLayout layout, TableKind kind) => layout.Wide.Count == 0
        ? [.. OfNothing(layout), .. OfPlace(layout, entry: null, "", kind)]
        : layout.Wide.SelectMany((entry, i) => OfEntry(entry, i).Concat(OfPlace(layout, entry, $"wide[{i}]: ", kind))).Distinct(StringComparer.Ordinal);

    private static IEnumerable<string> OfNothing(CsvLayout layout) =>
        layout.Fields.Count == 0 && layout.Constants.Count == 0 ? ["fields names no column"] : [];

    private static IEnumerable<string> OfEntry(CsvWideEntry entry, int i) =>
        entry.Fields.Count == 0 ? [$"wide[{i}].fields names no column"] : [];

    private static IEnumerable<string> OfPlace(CsvLayout layout, CsvWideEntry? entry, string at, TableKind kind)
    {
        var constants = PlaceConstants.Of(layout, entry).ToList();
        var named = layout.Fields.Concat(entry?.Fields ?? [])
            .Select(field => field.Field == QuantityRole.Word ? $"{field.Field} {field.Quantity}" : field.Field)
            .Concat(constants.Select(constant => constant.Field))
            .ToList();
        return
        [
            .. constants.Select(constant => OfConstant(constant.Field, constant.Text, kind)).OfType<string>().Select(reason => at + reason),
            .. named.GroupBy(name => name, StringComparer.Ordinal).Where(same => same.Count() > 1).Select(same => $"{at}{same.Key} is stated twice"),
            .. kind.Needed.Where(needed => !named.Contains(needed)).Select(needed => $"{at}nothing states {needed}: it needs a field or a constant"),
        ];
    }

    private static string? OfConstant(string field, string text, TableKind kind) => kind.Role(field) switch
    {
        null or QuantityRole => $"constant '{field}' is no field that can be constant",
        _ when string.IsNullOrWhiteSpace(text) => $"constant {field} is blank",
        var role => role.Reading(new CsvField(), FieldRole.Ours)(text.Trim()).Reason is { } reason ? $"constant {field} '{text}': {reason}" : null,
    };
}
