using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// A person's days with every session by the reference values of one period (I-15). A session without a histogram has no other quantity than it had; one whose load was
/// converted before the period is converted by the line of its first date.
/// </summary>
internal sealed class SeriesByValues(Person person, Group group, ReferenceChanges changes, ReferencePeriod period)
{
    private const int MonthDays = 28;

    /// <summary>Whether the values hold from this date on.</summary>
    public bool IsNew(LocalDate date) => period.From == date;

    /// <summary>With what rules of load begin a date.</summary>
    public RunsAcrossChange Runs(Carried carried, LocalDate from) =>
        RunsAcrossChange.At(carried, period, changes.Periods.Before(from), changes.Periods.Before(from.PlusDays(-1)), IsNew(from));

    /// <summary>Lines by other values say nothing: those of the months at hand are drawn anew, older ones are gone.</summary>
    public CarriedLoads? CarriedLoads(Day? last, LocalDate from) => last?.Carried.Loads is { } loads && period.LoadFrom == from
        ? loads with { LastLines = new Dictionary<string, ConversionLine>() }
        : last?.Carried.Loads;

    /// <summary>The days before a date, by the values of the period. Those that are of it already are left as they are.</summary>
    public IReadOnlyList<Day> Before(IReadOnlyList<Day> stored, LocalDate from)
    {
        if (changes.Periods.Reach(from) is not { } reach || stored.Count == 0)
        {
            return stored;
        }

        var days = stored.Where(day => day.Date >= reach).ToList();
        var restated = Restated(days);
        var other = restated.TakeWhile(day => day.Date < period.LoadFrom).ToList();
        return other.Count == 0 ? restated : [.. LoadCalendar.By(other, (_, session) => session.Load, FirstCovered(days, from), group.Deviation), .. restated.Skip(other.Count)];
    }

    /// <summary>Days of which some are of later periods.</summary>
    /// <param name="now">The same dates by the values of the last of them.</param>
    public IReadOnlyList<Day> Of(IReadOnlyList<Day> own, IReadOnlyList<Day> now)
    {
        var restated = Restated(own);
        return CoveredAs(now, LoadCalendar.By(restated, (_, session) => session.Load, LongAgo(restated), group.Deviation));
    }

    /// <summary>A first covered day that lies far enough back for every trend.</summary>
    public static LocalDate LongAgo(IReadOnlyList<Day> days) => days[0].Date.PlusDays(-MonthDays);

    /// <summary>How long a person is known hangs on no reference value.</summary>
    public static IReadOnlyList<Day> CoveredAs(IReadOnlyList<Day> now, IReadOnlyList<Day> days) =>
        [.. days.Zip(now, (day, known) => day with { DaysSinceFirstCovered = known.DaysSinceFirstCovered })];

    /// <summary>Whether it is unknown by former values what is known now.</summary>
    public static bool IsSilent(Day former, Day now) =>
        (former.Acute is null && now.Acute is not null) || (former.ChronicBefore is null && now.ChronicBefore is not null);

    private LocalDate? FirstCovered(List<Day> days, LocalDate from)
    {
        var known = days[^1].DaysSinceFirstCovered is { } ago ? days[^1].Date.PlusDays(-ago) : (LocalDate?)null;
        return period.LoadFrom == from && known >= days[0].Date ? null : known;
    }

    private List<Day> Restated(IReadOnlyList<Day> days)
    {
        var sessions = days
            .Select(day => day.Sessions.Count == 0 ? day : day with { Sessions = [.. day.Sessions.Select(session => changes.In(period, day.Date, session))] })
            .ToList();
        var order = new Lazy<LoadOrder>(() => new LoadOrder(
            group.LoadQuantity,
            group.LoadFallbacks,
            [.. sessions.SelectMany(day => day.Sessions.Select(session => new SessionLoads(day.Date, session.On(day.Date).Quantities)))],
            person.HeartRateIsValidOn));
        return sessions.ConvertAll(day => day.Sessions.Count == 0 || changes.Periods.On(day.Date).LoadBasis == period.LoadBasis
            ? day
            : day with { Sessions = [.. day.Sessions.Select(session => session with { Load = Load(order.Value, day.Date, session) })] });
    }

    private double? Load(LoadOrder order, LocalDate date, DaySession session)
    {
        var joined = session.On(date);
        return order.Restate(new SessionLoads(date, joined.Quantities), LocalDate.Max(date, period.LoadFrom))
            ?? (QuantitySports.MayHold(group.LoadQuantity, joined.Sport) ? null : 0);
    }
}
