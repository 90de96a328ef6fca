using LoadWatch.Rows;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// A version of a table on top of the rows that stood before it. It speaks for the dates from its first row's on, one of a folder for those up to its last row's
/// (an older file may come late), or for all: there its rows replace, correct and retract. Other rows stay. One without rows takes back all where it speaks for
/// everything, else it says nothing. Pure.
/// </summary>
public static class TableUpdate
{
    /// <param name="before">Rows of the table.</param>
    /// <param name="personOf">Id of the person whom a row's subject means, or null.</param>
    /// <returns>Rows of the table after it. A row that says what it said before keeps the moment since when it says so.</returns>
    public static IReadOnlyList<StoredRow> Apply(
        IReadOnlyList<StoredRow> before, TableVersion version, DecodedTable table, Func<TableRow, string?> personOf)
    {
        if (table.Rows.Count == 0)
        {
            return table.CoversEverything ? [.. before.Where(row => row.Kind != table.Kind)] : before;
        }

        var from = table.CoversEverything ? LocalDate.MinIsoValue : table.Rows.Min(row => row.Date);
        var to = table is { CoversEverything: false, IsNamedByFolder: true } ? table.Rows.Max(row => row.Date) : LocalDate.MaxIsoValue;
        var known = before.ToDictionary(Identity);
        var said = table.Rows
            .Select(row => new StoredRow(
                version.Scope, table.Kind, table.Layout, row.Subject ?? "", personOf(row), row.Date, row.Key, version.Since, row.Content))
            .Select(row => known.TryGetValue(Identity(row), out var same) && SayTheSame(row, same) ? same : row)
            .ToDictionary(Identity);
        return [.. before.Where(row => (row.Kind != table.Kind || row.Date < from || row.Date > to) && !said.ContainsKey(Identity(row))), .. said.Values];
    }

    private static (RowKind Kind, string Subject, string Key) Identity(StoredRow row) => (row.Kind, row.Subject, row.Key);

    /// <summary>Whether two rows say the same, whenever.</summary>
    public static bool SayTheSame(StoredRow one, StoredRow other) =>
        one with { Since = default, Content = other.Content } == other with { Since = default } && RowText.Write(one.Content) == RowText.Write(other.Content);
}
