using BenchmarkDotNet.Attributes;
using LoadWatch.Days;
using LoadWatch.Findings;
using NodaTime;

namespace LoadWatch.Benchmarks;

/// <summary>Ten years of one person's days and findings, against one year.</summary>
[MemoryDiagnoser]
public class DaysBenchmarks
{
    private static readonly LocalDate First = new(2016, 1, 1);

    private readonly List<ActivityOnDay> activities =
    [
        .. Enumerable.Range(0, 3650).Where(day => day % 7 is 0 or 2 or 4 or 5).Select(day =>
            new ActivityOnDay($"{day:0000}", First.PlusDays(day), ["device 1"], 60 + (day % 40), [])),
    ];

    [Benchmark(Baseline = true)]
    public IReadOnlyList<Finding> OneYear() => Evaluate(365);

    [Benchmark]
    public IReadOnlyList<Finding> TenYears() => Evaluate(3650);

    private IReadOnlyList<Finding> Evaluate(int days)
    {
        var through = First.PlusDays(days);
        return RuleBook.Evaluate(new RuleSubject(LongRide.Person, LoadCalendar.Build("p1", activities, through), new RuleLimits()));
    }
}
