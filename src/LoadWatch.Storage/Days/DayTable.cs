using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Storage.Days;

/// <summary>Table <c>day</c>: each person's local dates with their trends.</summary>
public sealed class DayTable
{
    private const string Columns = """
        person, date, state, state_source, load, acute, chronic, chronic_before, ratio_coupled, ratio_uncoupled, ratio_ewma,
        ewma_acute, ewma_chronic, weekly_change, monotony, strain, chronic_median, coverage7, coverage28,
        days_since_first_covered, days_since_recorded, plan, regions,
        load_error, weekly_change_ordinary, usual_week, largest_session30, longest_run_metres30
        """;

    private const string Insert = $"""
        INSERT INTO day ({Columns}, sessions, carried)
        VALUES (
            @Person, @Date, @State, @StateSource, @Load, @Acute, @Chronic, @ChronicBefore, @RatioCoupled, @RatioUncoupled, @RatioEwma,
            @EwmaAcute, @EwmaChronic, @WeeklyChange, @Monotony, @Strain, @ChronicMedian, @Coverage7, @Coverage28,
            @DaysSinceFirstCovered, @DaysSinceRecorded, @Plan, @Regions,
            @LoadError, @WeeklyChangeOrdinary, @UsualWeek, @LargestSession30, @LongestRunMetres30, @Sessions, @Carried)
        """;

    private const string Delete = "DELETE FROM day WHERE person = @person AND date >= @from AND date <= @to";
    private const string SelectOfPerson = $"SELECT {Columns} FROM day WHERE person = @person AND date >= @from AND date <= @to ORDER BY date";

    private const string SelectBefore =
        $"SELECT {Columns}, sessions FROM day WHERE person = @person AND date >= @from AND date < @last ORDER BY date";

    private const string SelectLast = $"SELECT {Columns}, sessions, carried FROM day WHERE person = @person AND date = @last";

    private readonly StoreSession session;

    internal DayTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's days in place of all from a date on, up to another where one is given.</summary>
    /// <exception cref="ArgumentException">A day is of somebody else, or not among those dates.</exception>
    public void Replace(string person, LocalDate from, IReadOnlyList<Day> days, LocalDate? to = null)
    {
        if (days.FirstOrDefault(day => day.Date < from || day.Date > to || !string.Equals(day.Person, person, StringComparison.Ordinal)) is { } stray)
        {
            throw new ArgumentException($"{stray.Date} of {stray.Person} is not among the days of {person} from {from}", nameof(days));
        }

        session.Execute(Delete, new { person, from, to = to ?? LocalDate.MaxIsoValue });
        session.ExecuteEach(Insert, days.Select(DayRow.From));
    }

    /// <summary>A person's days in the range, both ends included, oldest first.</summary>
    public IReadOnlyList<Day> OfPerson(string person, LocalDate? from = null, LocalDate? to = null) =>
        session.Rows<DayRow>(SelectOfPerson, new { person, from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue })
            .ConvertAll(row => row.ToDay());

    /// <summary>The days before a date that later ones look back at, oldest first, with their sessions; the last of them with what it carries.</summary>
    /// <param name="first">Null: the look-back, <see cref="LoadCalendar.LookBackDays"/>.</param>
    public IReadOnlyList<Day> Before(string person, LocalDate date, LocalDate? first = null)
    {
        var values = new { person, from = first ?? date.PlusDays(-LoadCalendar.LookBackDays), last = date.PlusDays(-1) };
        return [.. session.Rows<DayRow>(SelectBefore, values).Select(row => row.ToDay()), .. session.Rows<DayRow>(SelectLast, values).Select(row => row.ToDay())];
    }
}
