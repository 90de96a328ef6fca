using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Storage.Rows;

/// <summary>A row of a table as it stands now.</summary>
/// <param name="Scope">The table that it is a row of: inbox and file name, or inbox and folder with the layout.</param>
/// <param name="Subject">As the table writes it; empty where the table has no such column.</param>
/// <param name="Person">Id of the person, looked up; null for plan and answers of a group, and where nobody of the roster is meant.</param>
/// <param name="Since">When the version that brought it, or changed it, was seen: of two tables that tell the same row differently the later one counts.</param>
public sealed record StoredRow(
    string Scope, RowKind Kind, string Layout, string Subject, string? Person, LocalDate Date, string Key, Instant Since, RowContent Content);
