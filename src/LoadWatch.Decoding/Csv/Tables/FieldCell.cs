namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A column of a table and what its cells say.</summary>
internal sealed class FieldCell
{
    private readonly CellReading theirs;
    private readonly CellReading ours;
    private readonly Dictionary<string, string> words;

    /// <param name="field">One without a complaint of its role.</param>
    public FieldCell(int column, FieldRole role, CsvField field, CsvLayout layout)
    {
        Column = column;
        Field = role.Name;
        theirs = role.Reading(field, layout);
        ours = Ours(role, field);
        words = field.Words.DistinctBy(pair => pair.Key, StringComparer.OrdinalIgnoreCase)
            .ToDictionary(pair => pair.Key.Trim(), pair => pair.Value.Trim(), StringComparer.OrdinalIgnoreCase);
    }

    /// <summary>From 0.</summary>
    public int Column { get; }

    public string Field { get; }

    /// <summary>How the words of a layout are read: in the unit of the column, but as our own formats write it.</summary>
    public static CellReading Ours(FieldRole role, CsvField field) => role.Reading(field with { Format = null }, FieldRole.Ours);

    /// <summary>Whether the cell says anything; a word that stands for nothing does not.</summary>
    public bool IsFilled(string text) => text.Length > 0 && !(words.TryGetValue(text, out var meant) && meant.Length == 0);

    public CellValue Read(string text) => text.Length == 0 ? CellValue.Unknown : words.GetValueOrDefault(text) switch
    {
        null => theirs(text),
        "" => CellValue.Unknown,
        var meant => ours(meant),
    };
}
