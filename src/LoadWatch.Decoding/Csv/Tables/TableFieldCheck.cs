namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Finds what is wrong with single fields of a table: unknown words, units, formats.</summary>
internal static class TableFieldCheck
{
    public static IEnumerable<string> Reasons(CsvLayout layout, TableKind kind) =>
    [
        .. layout.Fields.SelectMany(field => OfField(field, "fields", layout, kind)),
        .. layout.Wide.SelectMany((entry, i) => entry.Fields.SelectMany(field => OfField(field, $"wide[{i}].fields", layout, kind))),
    ];

    private static IEnumerable<string> OfField(CsvField field, string at, CsvLayout layout, TableKind kind) => kind.Role(field.Field) switch
    {
        _ when string.IsNullOrWhiteSpace(field.Column) => [$"{at}: the column of {field.Field} has no name"],
        null => [$"{at}: '{field.Field}' is no field of {Words<CsvKind>.Of(layout.Kind)}: use one of {Names(kind)}"],
        var role when role.Complaint(field) is { } reason => [$"{at}: column '{field.Column}': {reason}"],
        var role => OfWords(role, field).Select(reason => $"{at}: column '{field.Column}': {reason}"),
    };

    private static IEnumerable<string> OfWords(FieldRole role, CsvField field)
    {
        var reading = FieldCell.Ours(role, field);
        foreach (var (theirs, ours) in field.Words)
        {
            if (string.IsNullOrWhiteSpace(theirs))
            {
                yield return "words holds a blank one: an empty cell is unknown";
            }

            if (ours.Trim().Length > 0 && reading(ours.Trim()).Reason is { } reason)
            {
                yield return $"words: '{ours}' for '{theirs}': {reason}";
            }
        }

        foreach (var same in field.Words.Keys.GroupBy(word => word.Trim(), StringComparer.OrdinalIgnoreCase).Where(same => same.Count() > 1))
        {
            yield return $"words holds '{same.Key}' twice";
        }
    }

    private static string Names(TableKind kind) => string.Join(", ", kind.Roles.Select(role => role.Name));
}
