using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using LoadWatch.Tests.Findings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

/// <summary>What days of a set log say of a region. A log is complete: a day with other sets holds none of the legs (I-6).</summary>
public class SetLogCoverageTests
{
    private static readonly StrengthSet Arms = Given.Set("chest_press", 8, 40, 2);
    private static readonly StrengthSet Legs = Given.Set("leg_press", 8, 80, 2);
    private static readonly StrengthSet LegsUnread = Given.Set("leg_press", 10, 80);

    [Fact]
    public void WhoOnlyEverTrainsTheArmsIsNotCoveredForTheLegs()
    {
        var days = Every(2, 40, Arms, Arms);

        Assert.All(LegsOf(days), region => Assert.Equal(RegionDay.NotCovered, region));
        Assert.Equal(0, days[^1].Regions[BodyRegion.Arms].DaysSince);
        Assert.Empty(new StimulusGapRule().Of(days));
    }

    [Fact]
    public void LegSetsThatCannotBeReadCoverNothingBesideArmsThatCan()
    {
        var days = Every(2, 40, Arms, Arms, LegsUnread);

        Assert.All(LegsOf(days), region => Assert.Equal(RegionDay.NotCovered, region));
        Assert.Empty(new StimulusGapRule().Of(days));
    }

    /// <summary>The legs were seen by the same log on day 0; from then on its days without a leg set are days without leg work.</summary>
    [Fact]
    public void OnceTheLegsWereSeenADayOfArmsIsADayWithoutLegWork()
    {
        var days = Build(14, [Session(0, Legs, Legs), .. Enumerable.Range(1, 7).Select(time => Session(time * 2, Arms, Arms))]);

        Assert.Equal((false, 14, 14), (LegsOf(days)[14].HeavyOrFast, LegsOf(days)[14].DaysSince, LegsOf(days)[14].KnownDaysSince));
        Assert.Equal([10, 11, 12, 13, 14], new StimulusGapRule().Of(days).Select(finding => finding.Value));
    }

    [Fact]
    public void AnUnknownExerciseAmongArmsLeavesTheLegsUnknown()
    {
        var days = Build(2, Session(0, Legs, Legs), Session(2, Arms, Given.Set("turkish walk", 8, 40, 2)));

        Assert.Null(LegsOf(days)[2].HeavyOrFast);
    }

    [Theory]
    [InlineData(3, true)]
    [InlineData(2, false)]
    public void ThreeHardHoldsMakeADayAndCoverTheRegion(int holds, bool heavy)
    {
        var wallSit = Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = 30, Hardness = 8 };

        var days = Build(0, Session(0, [.. Enumerable.Repeat(wallSit, holds)]));

        Assert.Equal(heavy, LegsOf(days)[0].HeavyOrFast);
        Assert.Equal(0, LegsOf(days)[0].DaysSince);
    }

    /// <summary>Six hard repetitions in one set are one set short; a hard hold is the second.</summary>
    [Theory]
    [InlineData(8, true)]
    [InlineData(6, false)]
    public void AHardHoldIsASetBesideSixHardRepetitions(double hardness, bool heavy)
    {
        var wallSit = Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = 30, Hardness = hardness };

        Assert.Equal(heavy, LegsOf(Build(0, Session(0, wallSit, Given.Set("leg_press", 6, 80, 2))))[0].HeavyOrFast);
    }

    [Fact]
    public void AHoldWithoutARatingLeavesTheDayUnknown()
    {
        var wallSit = Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = 30 };

        Assert.Null(LegsOf(Build(1, Session(0, Legs), Session(1, Legs, wallSit)))[1].HeavyOrFast);
    }

    private static IReadOnlyList<Day> Every(int step, int through, params StrengthSet[] sets) =>
        Build(through, [.. Enumerable.Range(0, (through / step) + 1).Select(time => Session(time * step, sets))]);

    private static ActivityOnDay Session(int day, params StrengthSet[] sets) => Activity(
        day,
        source: "set log",
        stimulus: [.. SessionOfSets.Of(sets, On(day), Given.Person() with { Id = "anna" }, AnchorBook.Empty, new()).Regions]);

    private static List<RegionDay> LegsOf(IReadOnlyList<Day> days) => days.Select(day => day.Regions[BodyRegion.Legs]).ToList();
}
