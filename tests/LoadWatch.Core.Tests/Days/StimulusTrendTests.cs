using LoadWatch.Days;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

public class StimulusTrendTests
{
    [Theory]
    [InlineData(3, true)]
    [InlineData(2.99, false)]
    [InlineData(0, false)]
    public void ThreeHardBoutsMakeTheDay(double bouts, bool heavy) =>
        Assert.Equal(heavy, Legs(Build(0, Activity(0, stimulus: Bouts(bouts))))[0].HeavyOrFast);

    [Theory]
    [InlineData(6, 2, true)]
    [InlineData(6, 1, false)]
    [InlineData(5.9, 2, false)]
    public void SixHardRepetitionsInTwoSetsMakeTheDay(double repetitions, int sets, bool heavy) =>
        Assert.Equal(heavy, Legs(Build(0, Activity(0, stimulus: Repetitions(repetitions, sets))))[0].HeavyOrFast);

    [Fact]
    public void TheActivitiesOfADateCountTogether()
    {
        Assert.True(Legs(Build(0, Activity(0, key: "a", stimulus: Bouts(1)), Activity(0, key: "b", stimulus: Bouts(2))))[0].HeavyOrFast);
        Assert.True(Legs(Build(0, Activity(0, key: "a", stimulus: Repetitions(3, 1)), Activity(0, key: "b", stimulus: Repetitions(3, 1))))[0]
            .HeavyOrFast);
    }

    [Fact]
    public void WorkThatNoChannelCouldSeeLeavesTheDayUnknown()
    {
        var days = Build(
            2,
            Activity(0, stimulus: Bouts(0)),
            Activity(1, stimulus: Unseen()),
            Activity(2, key: "a", stimulus: Unseen()),
            Activity(2, key: "b", stimulus: Bouts(1)));

        Assert.Equal([false, null, null], Legs(days).Select(region => region.HeavyOrFast));
    }

    [Fact]
    public void EnoughHardWorkSeenCountsWhateverElseWasNotSeen() =>
        Assert.True(Legs(Build(0, Activity(0, key: "a", stimulus: Unseen()), Activity(0, key: "b", stimulus: Bouts(3))))[0].HeavyOrFast);

    [Fact]
    public void AnActivityWithoutAnEntryIsNoWorkOfTheRegion() =>
        Assert.False(Legs(Build(1, Activity(0, stimulus: Bouts(3)), Activity(1, stimulus: Repetitions(8, 3, BodyRegion.Arms))))[1].HeavyOrFast);

    [Fact]
    public void ArmWorkAloneSaysNothingOfTheLegs()
    {
        var days = Build(3, Activity(0, stimulus: Repetitions(8, 3, BodyRegion.Arms)), Activity(3, stimulus: Repetitions(8, 3, BodyRegion.Arms)));

        Assert.All(Legs(days), region => Assert.Equal(RegionDay.NotCovered, region));
        Assert.Equal([0, 1, 2, 0], days.Select(day => day.Regions[BodyRegion.Arms].DaysSince));
    }

    /// <summary>Every third day of 56, 19 of them, is heavy: 19 / 56 x 14 = 4.75 in 14 days. None in the 14 days that are held against it.</summary>
    [Fact]
    public void TheUsualNumberIsThatOfTheEightWeeksBefore()
    {
        var legs = Legs(Build(69, [.. Enumerable.Range(0, 70).Select(day => Activity(day, stimulus: Bouts(day < 56 && day % 3 == 0 ? 3 : 0)))]))[69];

        Assert.Equal((0, 14, 4.75), (legs.Days14!.Value, legs.Known14, legs.Usual14!.Value));
    }

    [Fact]
    public void TheUsualNumberIsUnknownWhereLittleIsKnown()
    {
        var legs = Legs(Build(83, [.. Enumerable.Range(0, 84).Select(day => Activity(day, stimulus: day is >= 10 and < 30 ? Unseen() : Bouts(3)))]));

        Assert.Null(legs[69].Usual14);
        Assert.NotNull(legs[83].Usual14);
        Assert.Equal((7, 8, 8), (legs[37].Known7, legs[37].Known14, legs[37].Known28));
        Assert.Equal((7, 8, 8), (legs[37].Days7!.Value, legs[37].Days14!.Value, legs[37].Days28!.Value));
    }

    [Fact]
    public void ARegionIsCoveredFromItsFirstSeeingEntry()
    {
        var legs = Legs(Build(4, Activity(0, stimulus: Unseen()), Activity(2, stimulus: Bouts(1)), Activity(4)));

        Assert.Equal(RegionDay.NotCovered, legs[0]);
        Assert.Equal(RegionDay.NotCovered, legs[1]);
        Assert.Equal(new RegionDay(false, 0, 0, 0, 0, null) { Never = true, Days14 = 0, Known7 = 1, Known14 = 1, Known28 = 1 }, legs[2]);
        Assert.Equal(new RegionDay(false, 0, 0, 2, 2, null) { Never = true, Days14 = 0, Known7 = 3, Known14 = 3, Known28 = 3 }, legs[4]);
    }

    [Fact]
    public void RestIsKnownAndTheOpenTailIsNot()
    {
        var legs = Legs(Build(5, Activity(0, stimulus: Bouts(3)), Activity(3, stimulus: Bouts(0))));

        Assert.Equal([true, false, false, false, null, null], legs.Select(region => region.HeavyOrFast));
        Assert.Equal([0, 1, 2, 3, 4, 5], legs.Select(region => region.DaysSince));
        Assert.Equal([0, 1, 2, 3, 3, 3], legs.Select(region => region.KnownDaysSince));
    }

    [Fact]
    public void DaysAreCountedInTheirWindowsAndUnknownOnceNoneIsKnown()
    {
        var legs = Legs(Build(32, Activity(0, stimulus: Bouts(3)), Activity(2, stimulus: Bouts(3)), Activity(4, stimulus: Bouts(3))));

        Assert.Equal((3, 3), (legs[4].Days7, legs[4].Days28));
        Assert.Equal((2, 3), (legs[7].Days7, legs[7].Days28));
        Assert.Equal((1, 3), (legs[10].Days7, legs[10].Days28));
        Assert.Equal((null, 3), (legs[11].Days7, legs[11].Days28));
        Assert.Equal((null, 1), (legs[31].Days7, legs[31].Days28));
        Assert.Null(legs[32].Days28);
    }

    [Fact]
    public void TheUsualGapIsTheMedianOfAtLeastFourGaps()
    {
        int[] heavy = [0, 2, 5, 7, 14];
        var legs = Legs(Build(14, [.. heavy.Select(day => Activity(day, stimulus: Bouts(3)))]));

        Assert.Null(legs[13].UsualGapDays);
        Assert.Equal(2.5, legs[14].UsualGapDays);
    }

    [Fact]
    public void GapsOlderThanAYearAreForgotten()
    {
        int[] heavy = [0, 10, 20, 30, 40, 364, 366, 368, 370, 372];
        var legs = Legs(Build(380, [.. heavy.Select(day => Activity(day, stimulus: Bouts(3)))]));

        // Day 364 still looks back to day 0: gaps 10, 10, 10, 10, 324. On day 375 the days from 11 on are left: 10, 10, 324, 2, 2, 2, 2.
        Assert.Equal(10, legs[364].UsualGapDays);
        Assert.Equal(2, legs[375].UsualGapDays);
        Assert.Equal(10, legs[368].UsualGapDays);
    }

    private static List<RegionDay> Legs(IReadOnlyList<Day> days) => days.Select(day => day.Regions[BodyRegion.Legs]).ToList();
}
