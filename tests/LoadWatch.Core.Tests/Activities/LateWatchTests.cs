using LoadWatch.Rows;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class LateWatchTests
{
    [Fact]
    public void ARecordingThatBeganWhileTheStatedSessionWentOnIsTheSame()
    {
        var result = Join([Recorded("soccer", 10, 35)], Session("tracking", start: new LocalTime(10, 0), sport: "soccer", minutes: 90, quantities: Distance(6000)));

        Assert.Equal(6000, Assert.Single(result.Activities)["distance"]);
    }

    [Fact]
    public void OneThatBeganAfterItIsAnother() =>
        Assert.Equal(2, Join([Recorded("soccer", 12, 0)], Session("tracking", start: new LocalTime(10, 0), sport: "soccer", minutes: 90, quantities: Distance(6000))).Activities.Count);

    [Fact]
    public void ARatingWithoutARecordingMayWaitForIt() =>
        Assert.True(Assert.Single(Join([], Session(rating: 7)).Questions).MayWait);

    [Fact]
    public void OneThatFitsTwoIsAskedAtOnce() =>
        Assert.False(Assert.Single(Join([Recorded("running", 8), Recorded("running", 17)], Session(rating: 7, sport: "running")).Questions).MayWait);

    [Fact]
    public void WhatOneSheetLeavesOutWasDoneAllTheSame()
    {
        var result = Join(
            [],
            Set(1, exercise: "leg_press", repetitions: 8, kilograms: 0, reserve: null, hardness: 8, layout: "machines"),
            Set(2, exercise: "leg_press", repetitions: 8, kilograms: 0, reserve: null, hardness: 8, layout: "machines"),
            Set(1, exercise: "bench_press", repetitions: 5, kilograms: 60, reserve: 1, layout: "sheet"));

        Assert.Contains(Assert.Single(result.Activities).Stimulus, region => region.Region == BodyRegion.Legs && region.HardRepetitions is not null);
    }
}
