using LoadWatch.Loads;
using NodaTime;

namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>sessions</c> says of one session, or of one drill of it. Unknown is null.</summary>
/// <param name="Order">The how-manieth session of the date, from 1.</param>
/// <param name="Start">Local time at which the session began.</param>
/// <param name="Sport">In the words of the FIT profile (<c>soccer</c>, <c>training/strength_training</c>).</param>
/// <param name="Drill">Name of the drill that the row is about; null for the whole session.</param>
/// <param name="Minutes">Above 0.</param>
/// <param name="Rating">Rating of effort of the session, 0 to 10.</param>
/// <param name="Quantities">As stated by the table, sorted by name; never marked as estimated.</param>
/// <param name="Content">What the session is declared to have been.</param>
public sealed record SessionRow(
    int? Order,
    LocalTime? Start,
    string? Sport,
    string? Drill,
    double? Minutes,
    double? Rating,
    IReadOnlyList<Quantity> Quantities,
    DeclaredContent? Content) : RowContent;

/// <summary>What a session is declared to have been where nothing could see it.</summary>
public enum DeclaredContent
{
    Heavy,
    Fast,
    Match,
    Easy,
    Rehabilitation,
}
