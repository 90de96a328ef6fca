using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Rows;

/// <summary>What a row of kind <c>plan</c> says: a session or a phase, from the row's date on.</summary>
/// <param name="Until">Last date of a phase, inclusive; null: the one date.</param>
/// <param name="Start">Local time, of a session.</param>
/// <param name="End">Local time, of a session; before <paramref name="Start"/> it is on the next date.</param>
/// <param name="RecordingExpected">Whether a recording should come.</param>
/// <param name="Sport">In the words of the FIT profile, or null.</param>
public sealed record PlanRow(PlanWord Word, LocalDate? Until, LocalTime? Start, LocalTime? End, bool RecordingExpected, string? Sport) : RowContent;
