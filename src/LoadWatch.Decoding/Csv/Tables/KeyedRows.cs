using LoadWatch.Recordings;
using LoadWatch.Rows;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>
/// The rows of a table, each key once for each subject. Where a kind counts rows of one key, each gets its number; else a repetition is passed
/// over, and of two rows that contradict each other neither is used.
/// </summary>
internal sealed class KeyedRows(TableKind kind)
{
    // More people than one table names; it only spares work.
    private const int FoldedAtMost = 5_000;

    private readonly List<TableRow?> rows = [];
    private readonly Dictionary<(string Subject, string Key), Known> known = [];
    private readonly Dictionary<string, string> folded = new(StringComparer.Ordinal);

    /// <summary>Rows that count.</summary>
    public int Count { get; private set; }

    public IReadOnlyList<TableRow> Rows => [.. rows.OfType<TableRow>()];

    /// <returns>The contradicted line, and how many rows are lost by it; null where there is none.</returns>
    public (long Line, int Lost)? Add(TableRow row, RowKey key)
    {
        // Where rows are counted the key of the first stands for all, so that it is not kept twice.
        var first = key.IsCounted ? key.Counted(1) : key.Text;
        var place = (Folded(row.Subject), first);
        if (!known.TryGetValue(place, out var before))
        {
            known[place] = new Known(rows.Count, row.Line, Times: 1);
            Append(row with { Key = first });
            return null;
        }

        if (key.IsCounted)
        {
            known[place] = before with { Times = before.Times + 1 };
            Append(row with { Key = key.Counted(before.Times + 1) });
            return null;
        }

        return rows[before.Index] is { } same && kind.AreEqual(same.Content, row.Content) ? null : (before.Line, 1 + Drop(before.Index));
    }

    private void Append(TableRow row)
    {
        rows.Add(row);
        Count++;
    }

    private int Drop(int index)
    {
        var lost = rows[index] is null ? 0 : 1;
        rows[index] = null;
        Count -= lost;
        return lost;
    }

    /// <summary>Ids of people are the same in upper and lower case.</summary>
    private string Folded(string? subject)
    {
        if (!folded.TryGetValue(subject ?? "", out var upper))
        {
            upper = (subject ?? "").ToUpperInvariant();
            if (folded.Count < FoldedAtMost)
            {
                folded[subject ?? ""] = upper;
            }
        }

        return upper;
    }

    private readonly record struct Known(int Index, long Line, int Times);
}
