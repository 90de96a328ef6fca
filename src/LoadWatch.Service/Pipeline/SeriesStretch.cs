using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>A person's dates between two changes of their reference values: all that rules look at is told by the same values (I-15). Pure.</summary>
/// <param name="changes">Null: there are none.</param>
internal sealed class SeriesStretch(Person person, Group group, PersonPlan plan, ReferenceChanges? changes)
{
    private readonly HashSet<string> names =
        group.Limits.Quantities.Concat(group.LoadFallbacks).Append(group.LoadQuantity).Append(QuantityNames.FosterLoad).ToHashSet(StringComparer.Ordinal);

    /// <summary>As <see cref="RuleSubject.BestMeans"/>.</summary>
    public IReadOnlyDictionary<string, IReadOnlyDictionary<Channel, BestMeans>> BestMeans { get; init; } = RuleSubject.NoBestMeans;

    /// <param name="stored">Days before, each by the values of its own date.</param>
    /// <param name="training">From the first date on.</param>
    /// <param name="from">First date.</param>
    public PersonSeries Of(IReadOnlyList<Day> stored, IReadOnlyList<JoinedActivity> training, IReadOnlyList<DatedTest> tests, LocalDate from, LocalDate to)
    {
        var last = stored.Count == 0 ? null : stored[^1];
        var view = changes is null ? null : new SeriesByValues(person, group, changes, changes.Periods.On(from));
        var loads = training.Select(Loads).ToList();
        var before = view is null ? stored : view.Before(stored, from);
        var past = before.SelectMany(day => day.Sessions.Select(session => session.On(day.Date))).ToList();
        var carried = last?.Carried ?? Carried.Nothing;
        var order = new LoadOrder(
            group.LoadQuantity, group.LoadFallbacks, [.. past.Select(Loads).Concat(loads)], person.HeartRateIsValidOn, view is null ? last?.Carried.Loads : view.CarriedLoads(last, from), last?.Date.PlusDays(1));
        var days = LoadCalendar.Continue(person.Id, before, [.. training.Select(activity => OnDay(activity, order))], to, plan, group.Deviation);
        if (days.Count == 0)
        {
            return new PersonSeries([], []);
        }

        var all = before.Concat(days).ToList();
        var series = Series(all, name => FirstCovered(name, carried, view, before, from));
        var runs = view?.Runs(carried, from) ?? new RunsAcrossChange(carried.Runs, Former: null);
        var memory = new RuleMemory(carried with { Runs = runs.Now });
        var subject = new RuleSubject(person, all, group.Limits)
        {
            From = days[0].Date,
            Memory = memory,
            LoadUnit = LoadUnits.Of(group.LoadQuantity),
            LoadQuantity = group.LoadQuantity,
            Deviation = group.Deviation,
            SessionLoads = SessionLoads(all),
            Activities = [.. past, .. training.Where(activity => activity.Date <= to).OrderBy(activity => activity.Date).ThenBy(activity => activity.Key, StringComparer.Ordinal)],
            Plan = plan,
            Tests = [.. tests.Where(test => test.Date <= to)],
            Series = series,
            BestMeans = BestMeans,
        };
        var findings = RuleBook.Evaluate(subject);
        RuleMemory? formerMemory = null;
        if (runs.Former is { } formerRuns)
        {
            formerMemory = new RuleMemory(carried with { Runs = formerRuns });
            findings = AcrossChange(subject, Former(subject, [.. stored.Skip(stored.Count - before.Count), .. days], from) with { Memory = formerMemory }, findings, from);
        }

        return new PersonSeries([.. days.Select(day => day with { Carried = Carry(day, order, series, memory, formerMemory) })], findings);
    }

    /// <summary>The same dates by the values at the beginning of the window.</summary>
    private RuleSubject Former(RuleSubject subject, IReadOnlyList<Day> own, LocalDate from)
    {
        var days = new SeriesByValues(person, group, changes!, changes!.Periods.Before(from)).Of(own, subject.Days);
        var series = subject.Series.Values.ToDictionary(
            one => one.Quantity,
            one => one with { Days = SeriesByValues.CoveredAs(one.Days, By(one.Quantity, days, SeriesByValues.LongAgo(days))) },
            StringComparer.Ordinal);
        return subject with { Days = days, SessionLoads = SessionLoads(days), Series = series };
    }

    private IReadOnlyList<Finding> AcrossChange(RuleSubject now, RuleSubject former, IReadOnlyList<Finding> findings, LocalDate from)
    {
        var (period, before) = (changes!.Periods.On(from), changes.Periods.Before(from));
        var judge = new FindingsAcrossChange(period.ChangesSince(before), changes.Periods.FirstChange(from), (date, quantity) =>
        {
            var at = Period.DaysBetween(now.Days[0].Date, date);
            return SeriesByValues.IsSilent(DaysOf(former, quantity)[at], DaysOf(now, quantity)[at]);
        });
        return judge.Judge(findings, RuleBook.Evaluate(former, RuleBook.OfLoad));
    }

    private static IReadOnlyList<Day> DaysOf(RuleSubject subject, string? quantity) =>
        quantity is not null && subject.Series.TryGetValue(quantity, out var series) ? series.Days : subject.Days;

    private static Dictionary<string, double?> SessionLoads(IReadOnlyList<Day> days) =>
        days.SelectMany(day => day.Sessions).ToDictionary(session => session.Key, session => session.Load, StringComparer.Ordinal);

    private static SessionLoads Loads(JoinedActivity activity) => new(activity.Date, activity.Quantities);

    /// <summary>What a session of its sport cannot hold is none: a ride lifts no kilograms.</summary>
    private ActivityOnDay OnDay(JoinedActivity activity, LoadOrder order)
    {
        var chosen = order.Choose(Loads(activity));
        var load = chosen?.Value ?? (QuantitySports.MayHold(group.LoadQuantity, activity.Sport) ? null : 0);
        return new ActivityOnDay(activity.Key, activity.Date, activity.Sources, load, activity.Stimulus, activity.AddsLoad)
        {
            Session = DaySession.Of(activity, load, names) with
            {
                ConvertedFrom = chosen is null || chosen.From == group.LoadQuantity ? null : chosen.From,
                LoadError = chosen?.StandardError,
            },
        };
    }

    private Dictionary<string, QuantitySeries> Series(IReadOnlyList<Day> days, Func<string, LocalDate?> firstCovered) => group.Limits.Quantities.ToDictionary(
        name => name, name => new QuantitySeries(name, LoadUnits.Of(name), By(name, days, firstCovered(name))), StringComparer.Ordinal);

    /// <summary>By values that hold from this date on the first date may be another one, where it lies among the days at hand.</summary>
    private static LocalDate? FirstCovered(string name, Carried carried, SeriesByValues? view, IReadOnlyList<Day> before, LocalDate from) =>
        !carried.FirstCovered.TryGetValue(name, out var first) || (view is not null && view.IsNew(from) && first >= before[0].Date) ? null : first;

    private IReadOnlyList<Day> By(string name, IReadOnlyList<Day> days, LocalDate? firstCovered) =>
        LoadCalendar.By(days, (day, session) => Value(name, day, session), firstCovered, group.Deviation);

    /// <summary>Of a quantity beside the load a session has what it has: nothing stands in for it.</summary>
    private double? Value(string name, Day day, DaySession session)
    {
        var says = !QuantityNames.IsOfHeartRate(name) || person.HeartRateIsValidOn(day.Date);
        return says && session.Quantities.TryGetValue(name, out var value) ? value : QuantitySports.MayHold(name, Recordings.Sport.Parse(session.Sport)) ? null : 0;
    }

    private Carried Carry(Day day, LoadOrder order, Dictionary<string, QuantitySeries> series, RuleMemory memory, RuleMemory? former) => day.Carried with
    {
        FirstCovered = series.Values
            .Select(one => (one.Quantity, Ago: one.Days[Period.DaysBetween(one.Days[0].Date, day.Date)].DaysSinceFirstCovered))
            .Where(one => one.Ago.HasValue)
            .OrderBy(one => one.Quantity, StringComparer.Ordinal)
            .ToDictionary(one => one.Quantity, one => day.Date.PlusDays(-one.Ago!.Value), StringComparer.Ordinal),
        Loads = person.HeartRateInvalid.IsEmpty ? null : order.CarriedOn(day.Date),
        Runs = memory.On(day.Date),
        FormerRuns = former?.On(day.Date),
    };
}
