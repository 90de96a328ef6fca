using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using NodaTime;
using DayWordRow = LoadWatch.Rows.DayRow;

namespace LoadWatch.Service.Pipeline;

/// <summary>Gathers what plan, day tables and decisions in force say about each person.</summary>
public sealed class PersonPlans(WorkingConfiguration configuration)
{
    /// <summary>A stretch of stated rest is not read further than this many days. A choice.</summary>
    private const int LongestRestDays = 400;

    /// <summary>A return counts for 14 days behind a break of 7 or more: so much is read of absences by day tables before the first date. Days.</summary>
    private const int ReturnLookBackDays = PersonPlan.ReturnDays + PersonPlan.BreakDays + 7;

    /// <summary>By the id of everybody in the roster.</summary>
    public IReadOnlyDictionary<string, PersonPlan> Of(StoreSession session)
    {
        var entries = Entries(session);
        var days = session.TableRows.OfKind(RowKind.Days).ToLookup(row => row.Person, StringComparer.Ordinal);
        var decisions = session.Decisions.InForce().ToLookup(decision => decision.Person, StringComparer.Ordinal);
        return configuration.People.Values.ToDictionary(
            person => person.Id,
            person => Plan([.. entries[""].Concat(entries[person.Id]).Select(entry => OnDaysOf(person, entry))], [.. days[person.Id]], [.. decisions[person.Id]]),
            StringComparer.OrdinalIgnoreCase);
    }

    /// <summary>Of one person, what matters on dates of a range, both ends included.</summary>
    public PersonPlan Of(StoreSession session, Person person, LocalDate from, LocalDate to) => Plan(
        [.. session.TableRows.Plan(person.Id, configuration.Subjects.Means(person), from, person.DayBeginsAt == LocalTime.Midnight ? to : to.PlusDays(1)).Select(Entry).Select(entry => OnDaysOf(person, entry))],
        session.TableRows.OfPerson(person.Id, RowKind.Days, Back(from, ReturnLookBackDays), to),
        session.Decisions.OfDates(person.Id, Back(from, PersonPlan.LongestDays), to));

    private static LocalDate Back(LocalDate from, int days) => from < LocalDate.MinIsoValue.PlusDays(days) ? LocalDate.MinIsoValue : from.PlusDays(-days);

    /// <summary>Lines of the plan by the person they are about; those about everybody under the empty id.</summary>
    private ILookup<string, PlanEntry> Entries(StoreSession session) => session.TableRows.OfKind(RowKind.Plan)
        .SelectMany(row => About(row).Select(person => (person, Entry: Entry(row))))
        .ToLookup(pair => pair.person, pair => pair.Entry, StringComparer.Ordinal);

    private IEnumerable<string> About(StoredRow row) => row is { Person: null, Subject: "" }
        ? [""]
        : (configuration.Subjects.Of(row) ?? []).Select(person => person.Id);

    /// <summary>The line of the plan that a row of kind plan is.</summary>
    public static PlanEntry Entry(StoredRow row)
    {
        var plan = (PlanRow)row.Content;
        return new PlanEntry(plan.Word, row.Date, LastDate(row.Date, plan.Until), plan.Start, plan.End, plan.RecordingExpected, plan.Sport);
    }

    /// <summary>What is planned before the person's day begins counts for the date before.</summary>
    private static PlanEntry OnDaysOf(Person person, PlanEntry entry) => entry.Start < person.DayBeginsAt
        ? entry with { From = entry.From.PlusDays(-1), Until = entry.Until.PlusDays(-1) }
        : entry;

    /// <summary>One person's plan. Pure.</summary>
    /// <param name="entries">Lines about the person, the group or everybody.</param>
    /// <param name="days">Rows of kind days of the person.</param>
    /// <param name="decisions">In force, of the person, in the order of their moments.</param>
    public static PersonPlan Plan(IReadOnlyList<PlanEntry> entries, IReadOnlyList<StoredRow> days, IReadOnlyList<Decision> decisions)
    {
        var said = days.Select(row => (row.Date, ((DayWordRow)row.Content).Word)).ToList();
        var decided = Absences.Decided(decisions);
        return new PersonPlan
        {
            Entries = [.. entries.Concat(decisions.Where(decision => decision.Kind == DecisionKind.Match).Select(Match)).OrderBy(entry => entry.From)],
            Absences = [.. decided.Concat(Absences.Stated(said, decided)).OrderBy(absence => absence.From)],
            Returns = [.. decisions.Where(decision => decision.Kind == DecisionKind.Returning).Select(decision => decision.From!.Value).Distinct().Order()],
            Rests = Rests(said, decisions),
            Attendance = said.Where(day => day.Word is DayWord.Attended or DayWord.Absent)
                .GroupBy(day => day.Date)
                .ToDictionary(same => same.Key, same => same.Any(day => day.Word == DayWord.Attended)),
        };
    }

    /// <summary>What staff say went on; whether a recording should come is for the plan to say.</summary>
    private static PlanEntry Match(Decision decision) => new(
        PlanWord.Match, decision.From!.Value, LastDate(decision.From.Value, decision.Until), Start: null, End: null, RecordingExpected: false, Sport: null);

    /// <summary>Answers go before day tables.</summary>
    private static Dictionary<LocalDate, string> Rests(IEnumerable<(LocalDate Date, DayWord Word)> said, IEnumerable<Decision> decisions)
    {
        var rests = said.Where(day => day.Word == DayWord.Rest).Select(day => day.Date).Distinct().ToDictionary(date => date, _ => "days");
        foreach (var rest in decisions.Where(decision => decision.Kind == DecisionKind.Rest))
        {
            var from = rest.From!.Value;
            var length = Math.Min(LongestRestDays, Period.DaysBetween(from, LastDate(from, rest.Until)) + 1);
            foreach (var date in Enumerable.Range(0, length).Select(day => from.PlusDays(day)))
            {
                rests[date] = "answers";
            }
        }

        return rests;
    }

    private static LocalDate LastDate(LocalDate from, LocalDate? until) => until > from ? until.Value : from;
}
