namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Finds what makes a layout of a table unusable.</summary>
internal static class TableLayoutCheck
{
    public static IEnumerable<string> Reasons(CsvLayout layout)
    {
        var kind = TableKind.Of(layout.Kind);
        return
        [
            .. OfSamplesOnly(layout),
            .. Dates(layout),
            .. Subjects(layout, kind),
            .. TableFieldCheck.Reasons(layout, kind),
            .. TablePlaceCheck.Reasons(layout, kind),
            .. SharedColumns(layout),
        ];
    }

    /// <summary>Keys that mean nothing in a layout of samples.</summary>
    public static IEnumerable<string> OfTablesOnly(CsvLayout layout)
    {
        (bool IsUsed, string Key)[] keys =
        [
            (layout.GroupColumn is not null, "group_column"),
            (layout.DateColumn is not null, "date_column"),
            (layout.Fields.Count > 0, "fields"),
            (layout.Constants.Count > 0, "constants"),
            (layout.Wide.Count > 0, "wide"),
            (layout.Table != TableNaming.File, "table"),
            (layout.Covers is not null, "covers"),
        ];
        return keys.Where(key => key.IsUsed).Select(key => $"{key.Key} is of tables only, not of samples");
    }

    private static IEnumerable<string> OfSamplesOnly(CsvLayout layout)
    {
        (bool IsUsed, string Reason)[] keys =
        [
            (layout.Columns.Count > 0, "columns is of samples only: a table has fields"),
            (layout.Sport is not null, "sport is of samples only: a table has it among its constants"),
            (layout.Quality is not null, "quality is of samples only"),
            (layout.Time.DateColumn is not null, "time.date_column is of samples only: a table has date_column"),
            (layout.SportColumn is not null, "sport_column is of samples only: a table has it among its fields"),
        ];
        return keys.Where(key => key.IsUsed).Select(key => key.Reason);
    }

    private static IEnumerable<string> Dates(CsvLayout layout) => (layout.DateColumn, layout.Time.Column) switch
    {
        (null, "") => ["date_column is missing: a table has it, or a time whose date counts"],
        (not null, not "") => ["date_column and time exclude each other"],
        (null, _) when layout.Time.Format == CsvTimeColumn.SecondsFromStart => ["time.format seconds_from_start holds no date"],
        (null, _) => CsvLayoutCheck.Time(layout.Time),
        ({ } column, _) when string.IsNullOrWhiteSpace(column) => ["date_column is blank"],
        _ => DateNotation.Complaint(layout.DateFormat) is { } reason ? [$"date_format {reason}"] : [],
    };

    private static IEnumerable<string> Subjects(CsvLayout layout, TableKind kind)
    {
        var named = layout.Wide.Count(entry => entry.Person is not null);
        if (layout.GroupColumn is not null && !kind.TakesGroups)
        {
            yield return "group_column is of plan and answers only";
        }

        if (named > 0 && named < layout.Wide.Count)
        {
            yield return "wide: either every entry names a person or none";
        }

        if (named > 0 && (layout.PersonColumn ?? layout.GroupColumn) is not null)
        {
            yield return "wide: a person there and person_column or group_column exclude each other";
        }

        if (layout.Wide.Any(entry => entry.Person is { } person && string.IsNullOrWhiteSpace(person)))
        {
            yield return "wide: a person is blank";
        }
    }

    private static IEnumerable<string> SharedColumns(CsvLayout layout) =>
        TableColumns.NamedForOneThing(layout)
            .Where(name => !string.IsNullOrWhiteSpace(name))
            .GroupBy(name => name, StringComparer.Ordinal)
            .Where(same => same.Count() > 1)
            .Select(same => $"column '{same.Key}' is used for two things");
}
