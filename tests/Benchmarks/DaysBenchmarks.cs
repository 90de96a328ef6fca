using BenchmarkDotNet.Attributes;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>Ten years of one person's days, against one year, with sessions and stimulus as they are kept; and beside them the rules, and what the limits leave open on one date.</summary>
[MemoryDiagnoser]
public class DaysBenchmarks
{
    private static readonly LocalDate First = new(2016, 1, 1);
    private static readonly Group Squad = new("g1", "Squad", QuantityNames.BanisterTrimp, new RuleLimits());

    private readonly List<ActivityOnDay> activities = [.. Enumerable.Range(0, 3650).Where(day => day % 7 is 0 or 2 or 4 or 5).Select(Activity)];
    private readonly IReadOnlyList<Day> ten;
    private readonly IReadOnlyList<Day> lookBack;

    public DaysBenchmarks()
    {
        ten = Build(3650);
        lookBack = [.. ten.TakeLast(LoadCalendar.LookBackDays)];
    }

    [Benchmark(Baseline = true)]
    public IReadOnlyList<Day> DaysOfOneYear() => Build(365);

    [Benchmark]
    public IReadOnlyList<Day> DaysOfTenYears() => Build(3650);

    [Benchmark]
    public IReadOnlyList<Finding> RulesOverTenYears() => RuleBook.Evaluate(new RuleSubject(LongRide.Person, ten, new RuleLimits())
    {
        Activities = [.. ten.SelectMany(day => day.Sessions.Select(session => session.On(day.Date)))],
        SessionLoads = ten.SelectMany(day => day.Sessions).ToDictionary(session => session.Key, session => session.Load, StringComparer.Ordinal),
    });

    [Benchmark]
    public TodaysRoom InsideTodaysLimits() => RoomFinder.Of(LongRide.Person, Squad, lookBack, PersonPlan.None);

    private IReadOnlyList<Day> Build(int days) => LoadCalendar.Build("p1", activities, First.PlusDays(days));

    private static ActivityOnDay Activity(int day)
    {
        var (key, load, sport) = ($"{day:0000}", 60.0 + (day % 40), day % 3 == 0 ? "running" : "cycling");
        var stimulus = new RegionStimulus(
            BodyRegion.Legs, Grade.B, "power", new Band(1, day % 5, 9), null, null, new Band(900, 1000, 1100), new Band(90, 100, 110), new Band(4, 5, 6), []);
        return new ActivityOnDay(key, First.PlusDays(day), ["device 1"], load, [stimulus])
        {
            Session = new DaySession(
                key,
                sport,
                load,
                new SortedDictionary<string, double>(StringComparer.Ordinal) { [QuantityNames.BanisterTrimp] = load, [QuantityNames.Distance] = 9000 + (day % 50) },
                new Dictionary<Channel, double>(),
                AddsLoad: true),
        };
    }
}
