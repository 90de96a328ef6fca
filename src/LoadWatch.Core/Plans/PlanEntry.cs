using NodaTime;

namespace LoadWatch.Plans;

/// <summary>One line of the plan as it holds for a person.</summary>
/// <param name="Until">Last date, inclusive; at least <paramref name="From"/>.</param>
/// <param name="Start">Local time, of a session with a time.</param>
/// <param name="End">Local time; before <paramref name="Start"/> it is on the next date.</param>
/// <param name="RecordingExpected">Whether a recording should come for each of its dates.</param>
public sealed record PlanEntry(
    PlanWord Word, LocalDate From, LocalDate Until, LocalTime? Start, LocalTime? End, bool RecordingExpected, string? Sport)
{
    public bool Covers(LocalDate date) => From <= date && date <= Until;
}
