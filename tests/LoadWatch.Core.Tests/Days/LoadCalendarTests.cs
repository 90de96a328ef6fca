using CsCheck;
using LoadWatch.Days;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

public class LoadCalendarTests
{
    private static readonly Dictionary<BodyRegion, RegionDay> NoRegions = [];

    private static readonly Gen<ActivityOnDay[]> Activities = Gen.Select(
            Gen.Int[0, 90],
            Gen.Double[0, 500],
            Gen.Int[0, 9],
            Gen.Int[0, 3],
            Gen.Int[0, 6],
            (day, load, luck, source, stimulus) =>
                Activity(day, luck == 0 ? null : load, source == 0 ? "bike" : "watch", $"k{luck}{source}{stimulus}", Stimulus(stimulus)))
        .Array[0, 45];

    private static readonly Gen<(ActivityOnDay[] Activities, int Through, int More)> TwoLooks =
        Gen.Select(Activities, Gen.Int[0, 90], Gen.Int[0, 30], (activities, through, more) => (activities, through, more));

    [Fact]
    public void WithoutActivitiesThereAreNoDays() => Assert.Empty(Build(10));

    [Fact]
    public void DatesAreUnbrokenFromTheFirstActivityToTheLastDateAskedFor()
    {
        var days = Build(12, Activity(9), Activity(3));

        Assert.Equal(Enumerable.Range(3, 10).Select(On), days.Select(day => day.Date));
        Assert.Equal(Enumerable.Range(0, 10), days.Select(day => day.DaysSinceFirstCovered!.Value));
        Assert.All(days, day => Assert.Equal("anna", day.Person));
    }

    [Fact]
    public void ActivitiesAfterTheLastDateAreIgnored()
    {
        var days = Build(4, Activity(0), Activity(5));

        Assert.Equal(5, days.Count);
        Assert.Equal(DayState.Unknown, days[4].State);
        Assert.Empty(Build(4, Activity(5)));
    }

    [Fact]
    public void TheLoadOfADateIsTheSumOfItsActivities() =>
        Assert.Equal(70, Build(0, Activity(0, 50, key: "b"), Activity(0, 20, key: "a"))[0].Load);

    [Fact]
    public void OneActivityWithoutLoadLeavesTheDateUnknown()
    {
        var day = Build(0, Activity(0, 50, key: "b"), Activity(0, null, key: "a"))[0];

        Assert.Equal(DayState.Recorded, day.State);
        Assert.Null(day.Load);
        Assert.Equal(0, day.Coverage7);
    }

    [Theory]
    [InlineData(null)]
    [InlineData(30.0)]
    public void AnActivityWhoseLoadIsCountedElsewhereAddsItsStimulusAlone(double? load)
    {
        var day = Build(0, Activity(0, 50), Activity(0, load, key: "b", stimulus: Bouts(3)) with { AddsLoad = false })[0];

        Assert.Equal(50, day.Load);
        Assert.True(day.Regions[BodyRegion.Legs].HeavyOrFast);
        Assert.Null(Build(0, Activity(0, load) with { AddsLoad = false })[0].Load);
    }

    [Fact]
    public void TheOrderOfTheActivitiesChangesNothing() => Activities.Sample(activities =>
    {
        var distinct = activities.DistinctBy(activity => activity.Key).ToArray();
        AssertSame(Build(95, distinct), Build(95, [.. distinct.Reverse()]));
        AssertSame(Build(95, distinct), Build(95, [.. distinct.OrderBy(activity => activity.Load)]));
    });

    /// <summary>I-5 with I-6: recordings of the 7 days after a date may settle states, so anything 7 days before the last date is final.</summary>
    [Fact]
    public void WhatCameLaterChangesNoDayOlderThanTheSevenThatMayBeSettled() => TwoLooks.Sample(look =>
    {
        var (early, late) = (Build(look.Through, look.Activities), Build(look.Through + look.More, look.Activities));
        var final = early.TakeWhile(day => day.Date <= On(look.Through - 7)).ToList();
        AssertSame(final, late.Take(final.Count));
    });

    /// <summary>I-5: a value rests on nothing dated later but the states that were settled since.</summary>
    [Fact]
    public void UpToTheFirstDateWhoseStateWasSettledSinceEveryValueIsTheSame() => TwoLooks.Sample(look =>
    {
        var (early, late) = (Build(look.Through, look.Activities), Build(look.Through + look.More, look.Activities));
        var same = early.Zip(late, (before, after) => (before.State, before.StateSource) == (after.State, after.StateSource)).TakeWhile(equal => equal).Count();
        AssertSame(early.Take(same), late.Take(same));
    });

    /// <summary>I-5: the value of a date is what the series would hold if nothing dated later had ever come, once no state is open.</summary>
    [Fact]
    public void OnARecordedDateAfterAFullWeekOfRecordingsTheValueIsFinalAtOnce()
    {
        var activities = Enumerable.Range(0, 60).Select(day => Activity(day, 50 + (day * 7 % 30), stimulus: Bouts(day % 5))).ToArray();
        var late = Build(59, activities);

        Assert.All(Enumerable.Range(0, 60), day => AssertSame([Build(day, activities)[^1]], [late[day]]));
    }

    [Fact]
    public void UnknownIsNeverZero() => Activities.Sample(activities =>
    {
        foreach (var day in Build(100, activities).Where(day => day.State == DayState.Unknown))
        {
            Assert.Null(day.Load);
            Assert.All(day.Regions.Values, region => Assert.Null(region.HeavyOrFast));
        }
    });

    [Fact]
    public void EveryValueIsFiniteAndRatiosAreNotNegative() => Activities.Sample(activities =>
    {
        foreach (var day in Build(100, activities))
        {
            double?[] loads = [day.Acute, day.Chronic, day.ChronicBefore, day.ChronicMedian, day.EwmaAcute, day.EwmaChronic];
            double?[] values = [.. loads, day.RatioCoupled, day.RatioUncoupled, day.RatioEwma, day.Monotony, day.Strain];
            Assert.All(values, value => Assert.True(value is null || (double.IsFinite(value.Value) && value >= 0)));
        }
    });

    [Fact]
    public void LongZeroYearsAreNoTrouble()
    {
        var days = Daily([400, .. Enumerable.Repeat(0.0, 4000)]);

        Assert.Equal(0, days[^1].EwmaAcute);
        Assert.Null(days[^1].RatioUncoupled);
    }

    private static RegionStimulus[] Stimulus(int kind) => kind switch
    {
        0 => [Bouts(4)],
        1 => [Bouts(1), Repetitions(8, 3, BodyRegion.Arms)],
        2 => [Repetitions(6, 2)],
        3 => [Unseen()],
        _ => [],
    };

    private static void AssertSame(IEnumerable<Day> expected, IEnumerable<Day> actual)
    {
        Assert.Equal(expected.Select(Plain), actual.Select(Plain));
        Assert.Equal(expected.SelectMany(day => day.Regions), actual.SelectMany(day => day.Regions));
        Assert.Equal(expected.Select(day => Carried.Write(day.Carried)), actual.Select(day => Carried.Write(day.Carried)));
    }

    private static Day Plain(Day day) => day with { Regions = NoRegions, Sessions = [], Carried = Carried.Nothing };
}
