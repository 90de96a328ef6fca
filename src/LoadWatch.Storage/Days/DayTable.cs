using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Storage.Days;

/// <summary>Table <c>day</c>: each person's local dates with their trends.</summary>
public sealed class DayTable
{
    private const string Columns = """
        person, date, state, state_source, load, acute, chronic, chronic_before, ratio_coupled, ratio_uncoupled, ratio_ewma,
        ewma_acute, ewma_chronic, weekly_change, monotony, strain, chronic_median, coverage7, coverage28,
        days_since_first_covered, days_since_recorded, plan, regions
        """;

    private const string Insert = $"""
        INSERT INTO day ({Columns})
        VALUES (
            @Person, @Date, @State, @StateSource, @Load, @Acute, @Chronic, @ChronicBefore, @RatioCoupled, @RatioUncoupled, @RatioEwma,
            @EwmaAcute, @EwmaChronic, @WeeklyChange, @Monotony, @Strain, @ChronicMedian, @Coverage7, @Coverage28,
            @DaysSinceFirstCovered, @DaysSinceRecorded, @Plan, @Regions)
        """;

    private const string DeleteFrom = "DELETE FROM day WHERE person = @person AND date >= @from";
    private const string SelectOfPerson = $"SELECT {Columns} FROM day WHERE person = @person AND date >= @from AND date <= @to ORDER BY date";

    private readonly StoreSession session;

    internal DayTable(StoreSession session) => this.session = session;

    /// <summary>Stores a person's days in place of all from a date on.</summary>
    /// <exception cref="ArgumentException">A day is of somebody else, or before that date.</exception>
    public void Replace(string person, LocalDate from, IReadOnlyList<Day> days)
    {
        if (days.FirstOrDefault(day => day.Date < from || !string.Equals(day.Person, person, StringComparison.Ordinal)) is { } stray)
        {
            throw new ArgumentException($"{stray.Date} of {stray.Person} is not among the days of {person} from {from}", nameof(days));
        }

        session.Execute(DeleteFrom, new { person, from });
        session.ExecuteEach(Insert, days.Select(DayRow.From));
    }

    /// <summary>A person's days in the range, both ends included, oldest first.</summary>
    public IReadOnlyList<Day> OfPerson(string person, LocalDate? from = null, LocalDate? to = null) =>
        session.Rows<DayRow>(SelectOfPerson, new { person, from = from ?? LocalDate.MinIsoValue, to = to ?? LocalDate.MaxIsoValue })
            .ConvertAll(row => row.ToDay());
}
