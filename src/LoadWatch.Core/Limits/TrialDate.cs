using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Limits;

/// <summary>A date as rules would read it with one session of a supposed load. What stands from earlier dates is left out: the limit is that which raises.</summary>
internal sealed class TrialDate
{
    private const string Key = "trial";
    private const int WeekDays = 7;

    private readonly Person person;
    private readonly IReadOnlyList<Day> before;
    private readonly LocalDate date;
    private readonly DayPlan plan;
    private readonly LoadDeviation deviation;
    private readonly RuleSubject bare;
    private readonly Dictionary<double, Day> days = [];

    public TrialDate(Person person, Group group, IReadOnlyList<Day> before, LocalDate date, DayPlan plan)
    {
        (this.person, this.before, this.date, this.plan, deviation) = (person, before, date, plan, group.Deviation);
        var limits = Undelayed(group.Limits);
        var near = before.TakeLast(limits.SessionSpike.LookBackDays).ToList();
        var session = new DaySession(Key, Sport.Generic.ToString(), null, new Dictionary<string, double>(), new Dictionary<Channel, double>(), AddsLoad: true);
        bare = new RuleSubject(person, [], limits)
        {
            From = date,
            Activities = [.. near.SelectMany(day => day.Sessions.Select(one => one.On(day.Date))), session.On(date)],
            LoadQuantity = group.LoadQuantity,
            SessionLoads = near.SelectMany(day => day.Sessions).ToDictionary(one => one.Key, one => one.Load, StringComparer.Ordinal),
        };
        MostEven = Peak([.. before.TakeLast(WeekDays - 1).Select(day => day.Load)]);
    }

    /// <summary>The load with which the week would be the most even; null where one of the six days before is unknown, or all are nought.</summary>
    public double? MostEven { get; }

    /// <summary>The date with its trends.</summary>
    public Day With(double load)
    {
        if (!days.TryGetValue(load, out var day))
        {
            days[load] = day = LoadTrend.After(before, deviation).Add(new Day { Person = person.Id, Date = date, State = DayState.Recorded, Load = load, DaysSinceRecorded = 0, Plan = plan });
        }

        return day;
    }

    /// <summary>Whether the rule would raise for the group's load. Matches close together hang on no load.</summary>
    public bool Raises(IRule rule, double load)
    {
        var subject = bare with
        {
            Days = [.. before, With(load)],
            Memory = new RuleMemory(Row(rule)),
            SessionLoads = new Dictionary<string, double?>(bare.SessionLoads!, StringComparer.Ordinal) { [Key] = load },
        };
        return rule.Evaluate(subject).Any(finding => finding is { Quantity: null, Unit: not "matches", Severity: Severity.Notice or Severity.Warning });
    }

    /// <summary>A row of hard days goes on from the days before; all else is read afresh.</summary>
    private Carried Row(IRule rule) => rule is HardDaysRule hard ? hard.RowAlone(before[^1].Carried) : Carried.Nothing;

    /// <summary>What would raise tomorrow for the same reason is passed today.</summary>
    private static RuleLimits Undelayed(RuleLimits limits) => limits with
    {
        LoadRatio = limits.LoadRatio with { OnDays = 1 },
        WeeklyJump = limits.WeeklyJump with { OnDays = 1 },
        Monotony = limits.Monotony with { OnDays = 1 },
        HardDays = limits.HardDays with { OnDays = 1 },
    };

    private static double? Peak(double?[] others)
    {
        var sum = others.Sum(load => load ?? 0);
        return others.Length < WeekDays - 1 || others.Contains(null) || sum <= 0 ? null : others.Sum(load => load!.Value * load.Value) / sum;
    }
}
