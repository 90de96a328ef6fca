using System.ComponentModel.DataAnnotations;
using CsCheck;
using LoadWatch.Days;
using LoadWatch.Findings;
using NodaTime;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class RuleBookTests
{
    [Fact]
    public void RulesAreNamedAndInOrder() => Assert.Equal(
        [
            "load_ratio", "weekly_jump", "session_spike", "monotony", "hard_days", "falling_load", "stimulus_gap", "stimulus_low", "falling_capacity", "silence",
            "not_usable", "function_test", "test_overdue",
        ],
        RuleBook.All.Select(rule => rule.Name));

    [Fact]
    public void WithoutDaysThereAreNoFindings() => Assert.Empty(RuleBook.Evaluate(new RuleSubject(Anna, [], Watched.Stated)));

    [Fact]
    public void FindingsAreSortedByDateRuleAndRegion()
    {
        var found = Busy();

        Assert.Equal(found.OrderBy(finding => finding.Date).ThenBy(finding => finding.Rule, StringComparer.Ordinal), found);
        Assert.Equal(["hard_days", "load_ratio", "silence", "stimulus_gap", "weekly_jump"], found.Where(finding => finding.Date == On(60)).Select(finding => finding.Rule));
    }

    [Fact]
    public void EveryFindingHasItsRunItsEvidenceAndOneSentence() => Assert.All(Busy(), finding =>
    {
        Assert.True(finding.Since <= finding.Date);
        Assert.NotEmpty(finding.Evidence.Formula);
        Assert.NotEmpty(finding.Evidence.Source);
        Assert.NotEmpty(finding.Evidence.Inputs);
        Assert.EndsWith(".", finding.Text, StringComparison.Ordinal);
        Assert.DoesNotContain("Anna", finding.Text, StringComparison.OrdinalIgnoreCase);
    });

    /// <summary>I-13: also what explain prints of a finding.</summary>
    [Fact]
    public void WordsDescribeChangeOnly() => Assert.All(
        Busy().Concat(LimitEvidenceTests.Some()),
        finding => PlainWords.Hold(string.Join(' ', [finding.Text, finding.Evidence.Formula, finding.Evidence.Source, .. finding.Evidence.Inputs.Select(input => $"{input.Name.Replace('_', ' ')} {input.Note}")])));

    [Fact]
    public void ARuleThatIsOffSaysNothing()
    {
        Assert.Contains(Busy(), finding => finding.Rule == "load_ratio");
        var off = Watched.Stated with { LoadRatio = Watched.Stated.LoadRatio with { Enabled = false } };

        Assert.DoesNotContain(RuleBook.Evaluate(new RuleSubject(Anna, BusyDays(), off)), finding => finding.Rule == "load_ratio");
    }

    [Fact]
    public void EveryRuleHasItsOwnSwitch()
    {
        RuleLimits[] off =
        [
            new() { LoadRatio = new() { Enabled = false } },
            new() { WeeklyJump = new() { Enabled = false } },
            new() { SessionSpike = new() { Enabled = false } },
            new() { Monotony = new() { Enabled = false } },
            new() { HardDays = new() { Enabled = false } },
            new() { FallingLoad = new() { Enabled = false } },
            new() { StimulusGap = new() { Enabled = false } },
            new() { StimulusLow = new() { Enabled = false } },
            new() { FallingCapacity = new() { Enabled = false } },
            new() { Silence = new() { Enabled = false } },
            new() { NotUsable = new() { Enabled = false } },
            new() { FunctionTest = new() { Enabled = false } },
            new() { TestOverdue = new() { Enabled = false } },
        ];

        Assert.All(RuleBook.All, rule => Assert.True(rule.LimitsOf(Watched.Stated).Enabled));
        Assert.Equal(RuleBook.All.Select(rule => rule.Name), off.Select(limits => Assert.Single(RuleBook.All, rule => !rule.LimitsOf(limits).Enabled).Name));
    }

    [Fact]
    public void TurningARuleOffOrChangingItsLimitsIsNeitherAReturnNorACorrection()
    {
        var (plan, hash) = (LoadWatch.Plans.DayPlan.None, RuleBook.LimitsHash("load_ratio", Watched.Stated));
        var other = Watched.Stated with { LoadRatio = Watched.Stated.LoadRatio with { Raise = 2 } };

        Assert.Null(RuleBook.WhyQuiet("load_ratio", Watched.Stated, plan, hash));
        Assert.Null(RuleBook.WhyQuiet("load_ratio", other, plan, hashBefore: null));
        Assert.Equal(QuietReason.LimitsChanged, RuleBook.WhyQuiet("load_ratio", other, plan, hash));
        Assert.Equal(QuietReason.SuppressedByPlan, RuleBook.WhyQuiet("load_ratio", other, plan with { ReturnDay = 2 }, hash));
        Assert.Equal(QuietReason.RuleOff, RuleBook.WhyQuiet("load_ratio", Watched.Stated with { LoadRatio = Watched.Stated.LoadRatio with { Enabled = false } }, plan, hash));
        Assert.Equal(QuietReason.RuleOff, RuleBook.WhyQuiet("of_a_former_version", Watched.Stated, plan, hash));
    }

    [Fact]
    public void TheHashNamesTheLimitsOfOneRule()
    {
        var other = Watched.Stated with { Silence = Watched.Stated.Silence with { ExtraDays = 3 } };

        Assert.All(RuleBook.All, rule => Assert.Equal(rule.Name == "silence", RuleBook.LimitsHash(rule.Name, other) != RuleBook.LimitsHash(rule.Name, Watched.Stated)));
        Assert.Matches("^[0-9a-f]{16}$", RuleBook.LimitsHash("silence", other));
        Assert.Equal("", RuleBook.LimitsHash("of_a_former_version", other));
    }

    [Fact]
    public void QuantitiesOfAllRulesThatAreOnAreGathered()
    {
        var limits = new RuleLimits
        {
            LoadRatio = new() { Quantities = ["work", "distance"] },
            WeeklyJump = new() { Quantities = ["distance", "climb"] },
            FallingLoad = new() { Quantities = ["minutes"], Enabled = false },
        };

        Assert.Equal(["climb", "distance", "work"], limits.Quantities);
        Assert.Empty(Watched.Stated.Quantities);
    }

    /// <summary>I-6: whatever stands on the last known date stands as it is over an unknown tail, and nothing else comes up; but for silence, which is about it.</summary>
    [Fact]
    public void AnUnknownTailNeitherRaisesNorClears() => Gen.Select(SomeDays, Gen.Int[1, 30]).Sample((days, tail) =>
    {
        var (before, after) = (Standing(days, 0), Standing(days, tail));

        return before.SequenceEqual(after);
    }, iter: 300);

    /// <summary>A day: rest, a session whose load could not be computed, or a session by its load; mostly of one size, so that rules come near their limits.</summary>
    private static readonly Gen<double?[]> SomeDays = Gen.Frequency(
        (2, Gen.Const((double?)-1)),
        (1, Gen.Const((double?)null)),
        (8, Gen.Double[60, 140].Select(load => (double?)load)),
        (2, Gen.Double[0, 600].Select(load => (double?)load))).Array[70, 140];

    /// <summary>Keys of the findings on the last date, with the first date of their run.</summary>
    private static List<(FindingKey, LocalDate)> Standing(double?[] days, int tail)
    {
        var sessions = days.Select((load, day) => (load, day)).Where(one => one.load is not -1.0).Select(one => one.day % 3 == 0
            ? Planned.Run(one.day, 100 * (one.load ?? 50), one.load)
            : Planned.Ride(one.day, one.load)).ToList();
        var last = sessions.Count == 0 ? On(0) : sessions[^1].Date.PlusDays(tail);
        return RuleBook.Evaluate(Planned.Subject(Period.DaysBetween(On(0), last), sessions))
            .Where(finding => finding.Date == last && finding.Rule != "silence")
            .Select(finding => (finding.Key, finding.Since))
            .ToList();
    }

    [Fact]
    public void TheGroupsUnitIsPassedOn() =>
        Assert.Contains(
            RuleBook.Evaluate(new RuleSubject(Anna, BusyDays(), Watched.Stated) { LoadUnit = "kJ" }),
            finding => finding.Text.Contains(" kJ)", StringComparison.Ordinal));

    [Fact]
    public void DefaultLimitsLieInTheirRanges()
    {
        RuleLimits limits = new();
        object[] parts =
        [
            limits.LoadRatio, limits.WeeklyJump, limits.SessionSpike, limits.Monotony, limits.HardDays, limits.FallingLoad, limits.StimulusGap, limits.StimulusLow,
            limits.FallingCapacity, limits.Silence, limits.NotUsable, limits.FunctionTest, limits.TestOverdue,
        ];

        Assert.All(parts, part => Validator.ValidateObject(part, new ValidationContext(part), validateAllProperties: true));
        Assert.True(limits.LoadRatio.Return < limits.LoadRatio.Raise);
    }

    /// <summary>46 steady days with heavy leg work on the first, then a week of more than twice the load, then nothing.</summary>
    private static IReadOnlyList<Day> BusyDays() => Build(60, [
        .. Enumerable.Range(0, 53).Select(day => Activity(day, day < 46 ? 100 : 220, stimulus: Bouts(day == 0 ? 5 : 1)))]);

    private static IReadOnlyList<Finding> Busy() => RuleBook.Evaluate(new RuleSubject(Anna, BusyDays(), Watched.Stated));
}
