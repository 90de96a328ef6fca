namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>A field that a kind of table has, and how its cells are read.</summary>
internal abstract record FieldRole(string Name)
{
    /// <summary>How a value is written in our own formats and in constants: decimal point, ISO dates.</summary>
    public static CsvLayout Ours { get; } = new();

    /// <summary>Why no cell could be read so, or null.</summary>
    public virtual string? Complaint(CsvField field) => field switch
    {
        { Unit: not null } => $"{Name} has no unit",
        { Format: not null } => $"{Name} has no format",
        { Quantity: not null } => $"quantity is for the field {QuantityRole.Word} only, not for {Name}",
        _ => null,
    };

    /// <param name="field">One without a <see cref="Complaint"/>.</param>
    /// <param name="layout">Says how numbers and dates are written.</param>
    public abstract CellReading Reading(CsvField field, CsvLayout layout);
}

/// <summary>One word of several; upper and lower case are the same.</summary>
internal sealed record WordRole(string Name, params IReadOnlyList<string> Words) : FieldRole(Name)
{
    public override CellReading Reading(CsvField field, CsvLayout layout) => text =>
        Words.FirstOrDefault(word => word.Equals(text, StringComparison.OrdinalIgnoreCase)) is { } word
            ? CellValue.Of(word)
            : CellValue.Wrong($"not one of {string.Join(", ", Words)}");
}

/// <summary>Free text on one line. What a spreadsheet would take for a formula is text like any other.</summary>
internal sealed record TextRole(string Name, int Longest = 100) : FieldRole(Name)
{
    /// <summary>Whether line ends may stand in it.</summary>
    public bool HasLines { get; init; }

    public override CellReading Reading(CsvField field, CsvLayout layout) => text => text switch
    {
        _ when text.Length > Longest => CellValue.Wrong($"longer than {Longest} characters"),
        _ when text.Any(IsForbidden) => CellValue.Wrong("holds a line end or another control character"),
        _ => CellValue.Of(text),
    };

    private bool IsForbidden(char c) => char.IsControl(c) && !(HasLines && c is '\n' or '\r' or '\t');
}

/// <summary>A sport in the words of the FIT profile.</summary>
internal sealed record SportRole(string Name) : FieldRole(Name)
{
    public override CellReading Reading(CsvField field, CsvLayout layout) => text => SportWord.Read(text) is { } sport
        ? CellValue.Of(sport.ToString())
        : CellValue.Wrong("not a word for a sport: small letters, digits and _, with / before a detail");
}
