using LoadWatch.Days;
using LoadWatch.Limits;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>What the limits leave open on a date, from the days before it as they are stored.</summary>
public sealed class TodaysLimits(WorkingConfiguration configuration, TableBasis basis)
{
    /// <summary>Null where the date before it is not computed.</summary>
    public TodaysRoom? Of(StoreSession session, Person person, LocalDate date)
    {
        var (days, changes) = Before(session, person, date);
        return days.Count == 0 || days[^1].Date != date.PlusDays(-1)
            ? null
            : Behind(person, configuration.GroupOf(person), days, new PersonPlans(configuration).Of(session, person, date, date), changes);
    }

    /// <summary>The days up to a date as they are stored, their loads by the reference values of that date (I-15).</summary>
    public IReadOnlyList<Day> DaysTo(StoreSession session, Person person, LocalDate date)
    {
        var (days, changes) = Before(session, person, date.PlusDays(1));
        return new SeriesByValues(person, configuration.GroupOf(person), changes, changes.Periods.On(date)).Before(days, date.PlusDays(1));
    }

    private (IReadOnlyList<Day> Days, ReferenceChanges Changes) Before(StoreSession session, Person person, LocalDate date)
    {
        var periods = ReferencePeriods.Of(person, configuration.GroupOf(person), basis.AnchorsOf(person, date));
        var days = session.Days.Before(person.Id, date, First(periods, date));
        return (days, new ReferenceChanges(periods, () => new RestatedSessions(
            person, basis.AnchorsOf(person, date), configuration.Computation, periods.Quantities, session.Activities.Histograms(person.Id, days[0].Date, date))));
    }

    /// <summary>The first of the days that are looked back at from a date.</summary>
    public static LocalDate First(ReferencePeriods periods, LocalDate date) => periods.Reach(date) ?? date.PlusDays(-LoadCalendar.LookBackDays);

    /// <summary>Of the date behind some days, by the reference values of that date (I-15). Pure.</summary>
    /// <param name="days">Unbroken, with their sessions; as many as are looked back at.</param>
    /// <param name="plan">What is said of the date.</param>
    /// <param name="changes">Null: no reference value ever changes.</param>
    public static TodaysRoom Behind(Person person, Group group, IReadOnlyList<Day> days, PersonPlan plan, ReferenceChanges? changes = null)
    {
        var date = days[^1].Date.PlusDays(1);
        var view = changes is null ? null : new SeriesByValues(person, group, changes, changes.Periods.On(date));
        return RoomFinder.Of(person, group, view is null ? days : view.Before(days, date), plan);
    }
}
