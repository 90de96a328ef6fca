using NodaTime;

namespace LoadWatch.Rows;

/// <summary>One row as its table tells it, nobody looked up yet.</summary>
/// <param name="Subject">
/// The person, or for plan and answers the group, as the cell writes it; null where the table has no such column: then the rows are about the owner of the
/// file, a plan about everybody.
/// </param>
/// <param name="Date">The date that the row is about; the first one of a stretch.</param>
/// <param name="Key">
/// Tells it from every other row of the same subject and kind: date, time or order, exercise, set, in one canonical text. Equal keys in a later version or
/// in another table are the same row.
/// </param>
/// <param name="Line">Where it stands, from 1.</param>
public sealed record TableRow(string? Subject, LocalDate Date, string Key, RowContent Content, long Line);

/// <summary>The usable rows of one version of a table.</summary>
/// <param name="Layout">Name of the layout that read it.</param>
/// <param name="Rows">In file order; keys are unique within a subject.</param>
public sealed record DecodedTable(RowKind Kind, string Layout, IReadOnlyList<TableRow> Rows)
{
    /// <summary>Whether the table is told by its folder: files of changing names are versions of one table. Else a file name is a table of its own.</summary>
    public bool IsNamedByFolder { get; init; }

    /// <summary>Whether a version speaks for all dates. Else for those from its first row's on: older rows stay.</summary>
    public bool CoversEverything { get; init; }
}

/// <summary>What a row says.</summary>
public abstract record RowContent;
