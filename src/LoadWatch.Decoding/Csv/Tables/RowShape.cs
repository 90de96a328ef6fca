using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>Whether a line has the cells that the column names promise.</summary>
internal static class RowShape
{
    public static bool IsEmpty(CsvRows rows) => AreEmpty(rows, first: 0);

    /// <summary>Why the cells cannot be told apart, or null. Empty cells behind the last column do no harm.</summary>
    public static Problem? Complaint(CsvRows rows, CsvTable table) => rows switch
    {
        { IsQuotedWrongly: true } => Refusal("text behind a closing quote", rows.Line),
        _ when rows.CellCount < table.Names.Count || !AreEmpty(rows, table.Names.Count) =>
            Refusal($"{rows.CellCount} cells for {table.Names.Count} columns", rows.Line),
        _ => null,
    };

    public static Problem Refusal(string reason, long line) => new(ProblemSeverity.Error, reason, Line: line);

    private static bool AreEmpty(CsvRows rows, int first)
    {
        for (var index = first; index < rows.CellCount; index++)
        {
            if (rows.Text(index).Length > 0)
            {
                return false;
            }
        }

        return true;
    }
}
