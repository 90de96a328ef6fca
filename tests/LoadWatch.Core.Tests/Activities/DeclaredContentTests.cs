using LoadWatch.Days;
using LoadWatch.Rows;
using LoadWatch.Stimulus;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class DeclaredContentTests
{
    [Theory]
    [InlineData(DeclaredContent.Heavy, true)]
    [InlineData(DeclaredContent.Fast, true)]
    [InlineData(DeclaredContent.Match, true)]
    [InlineData(DeclaredContent.Easy, false)]
    [InlineData(DeclaredContent.Rehabilitation, false)]
    public void DeclaredContentAloneIsASessionAsStated(DeclaredContent content, bool isHeavyOrFast)
    {
        var activity = Assert.Single(Join([], Session("diary", sport: "soccer", content: content)).Activities);

        var legs = Assert.Single(activity.Stimulus);
        Assert.Equal((BodyRegion.Legs, "declared", Grade.D), (legs.Region, legs.Channel, legs.Grade));
        Assert.Equal(isHeavyOrFast, IsHeavyOrFast(activity));
    }

    [Fact]
    public void AHardSessionOfAnUnknownSportAsksForItsRegions()
    {
        var result = Join([], Session("diary", content: DeclaredContent.Heavy));

        Assert.Null(IsHeavyOrFast(Assert.Single(result.Activities)));
        Assert.Equal("heavy session of 10 March: which body regions? Its sport would tell", Assert.Single(result.Questions).Sentence);
    }

    [Fact]
    public void AnEasySessionOfAnUnknownSportIsEasyForEveryRegion()
    {
        var result = Join([], Session("diary", content: DeclaredContent.Easy));

        Assert.Empty(result.Questions);
        Assert.Equal([0.0, 0.0, 0.0], Assert.Single(result.Activities).Stimulus.Select(region => region.HardBouts!.Value.Mid));
    }

    /// <summary>Heart rate cannot see bouts; what it told of the slow class stays.</summary>
    [Fact]
    public void WhereHeartRateAloneWasRecordedTheDeclarationTells()
    {
        var watch = Recorded("running", 9).With(Region("heart_rate", Grade.E, null, null));
        var activity = Assert.Single(Join([watch], Session("diary", sport: "soccer", content: DeclaredContent.Match)).Activities);

        Assert.Equal(new Band(0, 3, 3), Assert.Single(activity.Stimulus).HardBouts);
        Assert.Equal(new Band(100, 100, 100), activity.Stimulus[0].SlowSeconds);
        Assert.True(IsHeavyOrFast(activity));
    }

    [Fact]
    public void WhatAChannelSawWins()
    {
        var ride = Recorded("cycling", 9).With(Region("power", Grade.B, 1, null));
        var activity = Assert.Single(Join([ride], Session("diary", content: DeclaredContent.Heavy)).Activities);

        Assert.Equal(("power", 1), (Assert.Single(activity.Stimulus).Channel, activity.Stimulus[0].HardBouts?.Mid));
        Assert.False(IsHeavyOrFast(activity));
    }

    [Fact]
    public void LoggedSetsWinOverADeclaration()
    {
        var activity = Assert.Single(Join([], Set(1, kilograms: 40, reserve: 12), Session("diary", content: DeclaredContent.Heavy)).Activities);

        Assert.Equal(("sets", 0), (Assert.Single(activity.Stimulus).Channel, activity.Stimulus[0].HardRepetitions?.Mid));
    }

    /// <summary>Work that nothing saw is unknown, never none.</summary>
    [Fact]
    public void ASessionOfRowsWithoutContentIsUnknown() =>
        Assert.Null(IsHeavyOrFast(Assert.Single(Join([], Session("pods", sport: "soccer", minutes: 90)).Activities)));

    /// <summary>The day before makes the region a covered one.</summary>
    private static bool? IsHeavyOrFast(JoinedActivity activity)
    {
        var before = new ActivityOnDay("0", Given.Date.PlusDays(-1), ["a"], 0, [Region("power", Grade.B, 0, null)]);
        var day = new ActivityOnDay(activity.Key, activity.Date, activity.Sources, 0, activity.Stimulus);
        return LoadCalendar.Build("p1", [before, day], activity.Date)[^1].Regions[BodyRegion.Legs].HeavyOrFast;
    }
}
