namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Where a line holds a row: the whole line, or a wide entry of it.</summary>
internal sealed class RowPlace
{
    private readonly bool isAlwaysFilled;

    private RowPlace(CsvTable table, CsvLayout layout, TableKind kind, CsvWideEntry? entry)
    {
        var fields = entry?.Fields ?? layout.Fields;
        Person = entry?.Person;
        Cells = Bind(table, layout, kind, fields);
        Constants =
        [
            .. from constant in PlaceConstants.Of(layout, entry)
               let role = kind.Role(constant.Field)!
               select (constant.Field, role.Reading(new CsvField(), FieldRole.Ours)(constant.Text.Trim()).Value!),
        ];
        isAlwaysFilled = entry is null && fields.Count == 0;
    }

    /// <summary>The person of a wide entry, or null.</summary>
    public string? Person { get; }

    /// <summary>Its own cells, those that the table has.</summary>
    public IReadOnlyList<FieldCell> Cells { get; }

    /// <summary>Fields that are the same in every line.</summary>
    public IReadOnlyList<(string Field, object Value)> Constants { get; }

    public static IReadOnlyList<RowPlace> Of(CsvTable table, CsvLayout layout, TableKind kind) => layout.Wide.Count == 0
        ? [new RowPlace(table, layout, kind, entry: null)]
        : [.. layout.Wide.Select(entry => new RowPlace(table, layout, kind, entry))];

    /// <summary>Cells that all wide entries of a line share.</summary>
    public static IReadOnlyList<FieldCell> Shared(CsvTable table, CsvLayout layout, TableKind kind) =>
        layout.Wide.Count == 0 ? [] : Bind(table, layout, kind, layout.Fields);

    /// <summary>Whether the line holds a row here.</summary>
    public bool IsFilled(CsvRows rows) => isAlwaysFilled || Cells.Any(cell => cell.IsFilled(rows.Text(cell.Column)));

    private static IReadOnlyList<FieldCell> Bind(CsvTable table, CsvLayout layout, TableKind kind, IReadOnlyList<CsvField> fields) =>
    [
        .. from field in fields
           where table.Has(field.Column)
           select new FieldCell(table.Find(field.Column)!.Value, kind.Role(field.Field)!, field, layout),
    ];
}
