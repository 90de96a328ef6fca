using LoadWatch.People;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Simulation.Worlds;

/// <summary>Somebody with everything that is true of them.</summary>
/// <param name="Sessions">By date, at most one a date.</param>
/// <param name="Told">What plan and answers say, each from the night on in which it is read.</param>
public sealed record TruePerson(Person Person, IReadOnlyList<TrueSession> Sessions, IReadOnlyList<Told> Told, IReadOnlyList<Happening> Happenings);

/// <summary>A line of the plan or an answer.</summary>
/// <param name="On">The night in which it is read.</param>
/// <param name="Until">The last date that it is about.</param>
public sealed record Told(LocalDate On, LocalDate From, LocalDate Until, PlanEntry? Entry, Absence? Absence);

/// <summary>A group of people over a season.</summary>
/// <param name="First">First date.</param>
/// <param name="Counted">First date of those that are counted: before it, rules learn what is usual.</param>
/// <param name="Last">Last date.</param>
public sealed record World(string Name, Group Group, IReadOnlyList<TruePerson> People, LocalDate First, LocalDate Counted, LocalDate Last)
{
    public int CountedDays => Period.DaysBetween(Counted, Last) + 1;
}
