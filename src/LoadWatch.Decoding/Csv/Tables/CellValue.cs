namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>What a cell says, or why it says nothing; neither for an empty one.</summary>
internal readonly record struct CellValue(object? Value, string? Reason)
{
    public static CellValue Unknown => default;

    public static CellValue Of(object value) => new(value, null);

    public static CellValue Wrong(string reason) => new(null, reason);
}

/// <summary>Reads a filled cell.</summary>
internal delegate CellValue CellReading(string text);
