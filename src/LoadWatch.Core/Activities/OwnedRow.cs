using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>A table row in force, of a person.</summary>
/// <param name="Layout">Name of the layout that read it: its source (I-6).</param>
/// <param name="Key">Tells it from every other row of the layout and date; order among rows is by it.</param>
public sealed record OwnedRow(string Layout, LocalDate Date, string Key, RowContent Content);
