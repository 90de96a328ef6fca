using NodaTime;

namespace LoadWatch.Plans;

/// <summary>Why somebody does not train as usual. Which of them it is concerns few; to the others all are "away".</summary>
public enum AbsenceWord
{
    Ill,
    Injured,
    Away,
}

/// <param name="Until">Last date, inclusive; null while it is open.</param>
public sealed record Absence(AbsenceWord Word, LocalDate From, LocalDate? Until)
{
    public bool Covers(LocalDate date) => From <= date && !(date > Until);
}
