using LoadWatch.Rows;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The content of a row, or why its cells together make none, and the field to look at.</summary>
internal readonly record struct RowMade(RowContent? Content, string? Reason, string? Field)
{
    public static RowMade Of(RowContent content) => new(content, null, null);

    public static RowMade Wrong(string field, string reason) => new(null, reason, field);
}
