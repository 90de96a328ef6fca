using System.ComponentModel.DataAnnotations;
using System.Reflection;
using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;

namespace LoadWatch.Tests.Findings;

/// <summary>
/// I-8: whatever a limit decides, its value stands in the evidence. Every number of every rule's limits is moved a little, and some finding of some person below must show an input that
/// moved from the one value to the other.
/// </summary>
public class LimitEvidenceTests
{
    private static readonly RuleLimits Limits = Watched.Stated with
    {
        StimulusLow = Watched.Stated.StimulusLow with { OlderFloorDays = 3 },
        TestOverdue = new() { IntervalDays = 14 },
    };

    public static TheoryData<string, string> Numbers => [.. RuleBook.All.SelectMany(rule => NumbersOf(rule.LimitsOf(Limits)).Select(number => (rule.Name, number.Name)))];

    [Theory]
    [MemberData(nameof(Numbers))]
    public void EveryLimitStandsInTheEvidence(string rule, string limit)
    {
        var one = RuleBook.Of(rule)!;
        var number = one.LimitsOf(Limits).GetType().GetProperty(limit)!;

        Assert.Contains(Moved(one.LimitsOf(Limits), number), moved => People.Any(person => Shows(one, number, Limits, With(Limits, moved), person)));
    }

    /// <summary>What the test above rests on: a rule that hides a limit is caught.</summary>
    [Fact]
    public void ALimitThatIsLeftOutIsCaught()
    {
        var number = typeof(LoadRatioLimits).GetProperty(nameof(LoadRatioLimits.UsualFactor))!;
        var moved = Moved(Limits.LoadRatio, number).Select(limits => With(Limits, limits)).ToList();

        Assert.Contains(moved, limits => People.Any(person => Shows(new LoadRatioRule(), number, Limits, limits, person)));
        Assert.DoesNotContain(moved, limits => People.Any(person => Shows(new Forgetful(), number, Limits, limits, person)));
    }

    /// <summary>A finding of every kind that there is.</summary>
    internal static IEnumerable<Finding> Some() => RuleBook.All.SelectMany(rule => People.SelectMany(person => rule.Evaluate(person(Limits)).DistinctBy(finding => (finding.Rule, finding.Severity, finding.Quantity))));

    [Fact]
    public void EveryRuleFindsSomethingInSomebody() => Assert.Equal(RuleBook.All.Select(rule => rule.Name).Order(StringComparer.Ordinal), Some().Select(finding => finding.Rule).Distinct().Order(StringComparer.Ordinal));

    /// <summary>Whether a finding of the same date shows both values under one name.</summary>
    private static bool Shows(IRule rule, PropertyInfo number, RuleLimits limits, RuleLimits moved, Func<RuleLimits, RuleSubject> person)
    {
        var (from, to) = (Value(number, rule.LimitsOf(limits)), Value(number, rule.LimitsOf(moved)));
        var after = rule.Evaluate(person(moved)).ToLookup(finding => (finding.Date, finding.Key));
        return rule.Evaluate(person(limits)).Any(finding => after[(finding.Date, finding.Key)].Any(same => finding.Evidence.Inputs
            .Any(input => input.Value == from && same.Evidence.Inputs.Any(other => other.Name == input.Name && other.Value == to))));
    }

    private static double Value(PropertyInfo number, IRuleLimits limits) => Convert.ToDouble(number.GetValue(limits), System.Globalization.CultureInfo.InvariantCulture);

    private static IEnumerable<PropertyInfo> NumbersOf(IRuleLimits limits) =>
        limits.GetType().GetProperties().Where(property => property.PropertyType == typeof(double) || property.PropertyType == typeof(int));

    /// <summary>The limits with one number a little higher, and a little lower, as far as its range goes.</summary>
    private static IEnumerable<IRuleLimits> Moved(IRuleLimits limits, PropertyInfo number)
    {
        var range = number.GetCustomAttribute<RangeAttribute>()!;
        foreach (var by in new[] { 1, -1 })
        {
            object to = number.PropertyType == typeof(int) ? (object)((int)number.GetValue(limits)! + by) : (double)number.GetValue(limits)! + (by * 0.001);
            if (range.IsValid(to))
            {
                yield return (IRuleLimits)Set(limits, number, to);
            }
        }
    }

    private static RuleLimits With(RuleLimits limits, IRuleLimits own) =>
        (RuleLimits)Set(limits, typeof(RuleLimits).GetProperties().Single(property => property.PropertyType == own.GetType()), own);

    private static object Set(object record, PropertyInfo property, object value)
    {
        var copy = record.GetType().GetMethod("<Clone>$")!.Invoke(record, [])!;
        property.SetValue(copy, value);
        return copy;
    }

    private static IReadOnlyList<Func<RuleLimits, RuleSubject>> People =>
    [
        limits => new(Anna, BusyDays, limits),
        limits => new(Anna with { BirthYear = 1940 }, BusyDays, limits),
        limits => new(Anna, WeeklyJumpRuleTests.PlannedWeeks(missing: []), limits),
        limits => Subject(24, Spikes) with { Limits = limits },
        limits => new(Anna, EvenWeeks, limits),
        limits => Subject(40, Enumerable.Range(0, 41).Select(day => Ride(day, 100)), Matches(30, 32, 34, 36)) with { Limits = limits },
        limits => new(Anna, DaysOf([.. Same(100, 70), .. Same(40, 14)]), limits),
        limits => new(Anna, HeavyDays, limits),
        limits => new(Anna with { BirthYear = 1950 }, HeavyDays, limits),
        limits => new(Anna, [.. Enumerable.Range(0, 112).Select(day => Plain(day, DayState.Recorded))], limits) { Activities = Fading },
        limits => CriticalFallTests.Fallen(limits),
        limits => new(Anna, MissedSessions, limits),
        limits => new(Anna, [.. Enumerable.Range(0, 20).Select(day => Plain(day, DayState.Recorded))], limits) { Activities = [.. Enumerable.Range(2, 5).Select(Unusable)] },
        limits => new(Anna with { Sex = Sex.Male }, [.. Enumerable.Range(0, 40).Select(day => Plain(day, DayState.Unknown))], limits) { Tests = Tested },
        limits => new(Anna with { Sex = Sex.Female }, [.. Enumerable.Range(0, 40).Select(day => Plain(day, DayState.Unknown))], limits) { Tests = Tested },
    ];

    /// <summary>Steady days with heavy leg work on the first, a week of more than twice the load, then nothing.</summary>
    private static readonly IReadOnlyList<Day> BusyDays =
        Build(90, [.. Enumerable.Range(0, 63).Select(day => Activity(day, day < 56 ? 100 : 220, stimulus: Bouts(day == 0 ? 5 : 1)))]);

    /// <summary>Eight runs and eight rides, then a run and a ride of twice the size.</summary>
    private static readonly IReadOnlyList<JoinedActivity> Spikes =
        [.. Enumerable.Range(0, 9).SelectMany(day => new[] { Run(day, 10_000), Ride(day, 100) }), Run(20, 25_000), Ride(20, 250)];

    private static readonly IReadOnlyList<Day> EvenWeeks = [.. Enumerable.Range(0, 65).Select(day => Watched.Ratio(day, 1) with
    {
        Monotony = day < 61 ? 1 : 3,
        Acute = day < 61 ? 100 + day : 200,
        ChronicBefore = 100,
        Strain = day < 61 ? 100 + day : 600,
    })];

    /// <summary>Heavy leg work every other day, then every fifth: never so far apart that the gap tells it.</summary>
    private static readonly IReadOnlyList<Day> HeavyDays = [.. Enumerable.Range(0, 120).Select(day => (Day: day, Last: day < 80 ? day - (day % 2) : day < 100 ? day - (day % 5) : 100 + ((day - 100) / 9 * 9))).Select(one =>
        Plain(one.Day, DayState.Recorded) with { Regions = new Dictionary<BodyRegion, RegionDay> { [BodyRegion.Legs] = new(one.Last == one.Day, 0, 0, one.Day - one.Last, one.Day - one.Last, null) } })];

    private static readonly IReadOnlyList<JoinedActivity> Fading = [.. Enumerable.Range(0, 16).Select(week => Plain(7 * week, new Sport("cycling")) with
    {
        Quantities =
        [
            new(QuantityNames.SpeedTop, week < 8 ? 8 : 6, "m/s", false),
            new(QuantityNames.PowerTop, week < 8 ? 800 : 600, "W", false),
            new(QuantityNames.OneRepetitionMaxOf + "leg_press", week < 8 ? 100 : 70, "kg", false),
        ],
    })];

    /// <summary>Sessions on Tuesdays and Thursdays by plan, none of which comes after four weeks.</summary>
    private static readonly IReadOnlyList<Day> MissedSessions = [.. Enumerable.Range(0, 56).Select(day =>
        Plain(day, day < 28 && day % 7 is 1 or 3 ? DayState.Recorded : DayState.Unknown) with { Plan = DayPlan.None with { Expected = day % 7 is 1 or 3 ? 1 : 0 } })];

    /// <summary>Each kind twice: the second beyond its cut-off, and further from the first than its error.</summary>
    private static readonly IReadOnlyList<DatedTest> Tested =
    [
        .. new (string Test, double Before, double After)[]
        {
            (FunctionTests.Grip, 40, 10),
            (FunctionTests.ChairStands, 10, 25),
            (FunctionTests.Gait, 1.4, 0.5),
            (FunctionTests.UpAndGo, 8, 30),
            (FunctionTests.PerformanceBattery, 11, 4),
            (FunctionTests.Walk400, 300, 500),
        }.SelectMany(one => new[] { Test(1, one.Test, one.Before), Test(5, one.Test, one.After) }).OrderBy(test => test.Date),
    ];

    private static DatedTest Test(int day, string test, double value) => new(On(day), new TestRow(test, value, null, null, null, null, null, null, null));

    private static Day Plain(int day, DayState state) => new() { Person = "anna", Date = On(day), State = state, DaysSinceRecorded = state == DayState.Recorded ? 0 : 5 };

    private static JoinedActivity Plain(int day, Sport sport) => new() { Key = $"a{day}", Date = On(day), Sport = sport, Sources = ["watch"] };

    private static JoinedActivity Unusable(int day) => Plain(day, Sport.Generic) with { UsableShare = new Dictionary<Channel, double> { [Channel.HeartRate] = 0.1 } };

    /// <summary>The load ratio without one input of its evidence.</summary>
    private sealed class Forgetful : IRule
    {
        private readonly LoadRatioRule rule = new();

        public string Name => rule.Name;

        public RuleRecord Record => rule.Record;

        public IRuleLimits LimitsOf(RuleLimits limits) => rule.LimitsOf(limits);

        public IEnumerable<Finding> Evaluate(RuleSubject subject) => rule.Evaluate(subject).Select(finding => finding with
        {
            Evidence = finding.Evidence with { Inputs = [.. finding.Evidence.Inputs.Where(input => input.Name != "usual_factor_wanted")] },
        });
    }
}
