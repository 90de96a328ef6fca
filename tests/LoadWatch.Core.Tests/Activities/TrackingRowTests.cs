using LoadWatch.Loads;
using NodaTime;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class TrackingRowTests
{
    private static Quantity Share(double value) => new("speed_top_share", value, "1", Estimated: false);

    [Theory]
    [InlineData("soccer")]
    [InlineData("team_sport")]
    [InlineData("running")]
    [InlineData("generic")]
    public void ATrackingRowJoinsTheWatchRecordingOfTheMatch(string sport)
    {
        var activity = Assert.Single(Join([Recorded(sport, 15)], Session("pods", sport: "soccer", minutes: 90, quantities: Distance(9800))).Activities);

        Assert.Equal((9800, 60), (activity["distance"], activity["minutes"]));
        Assert.Equal(sport == "generic" ? "soccer" : sport, activity.Sport.Name);
        Assert.Equal(["minutes: 60 min by the recording counts, pods says 90 min"], activity.Remarks);
    }

    [Fact]
    public void TheRecordingOfTheSameSportGoesBeforeARun()
    {
        var activities = Join([Recorded("running", 8), Recorded("soccer", 15)], Session("pods", sport: "soccer", quantities: Distance(9800))).Activities;

        Assert.Equal([null, 9800.0], activities.Select(activity => activity["distance"]));
    }

    [Fact]
    public void ARideIsNoMatch() =>
        Assert.Equal(2, Join([Recorded("cycling", 8)], Session("pods", sport: "soccer", quantities: Distance(9800))).Activities.Count);

    [Fact]
    public void ARowThatFitsTwoRecordingsIsAskedForAndNotCounted()
    {
        var result = Join([Recorded("soccer", 8), Recorded("soccer", 15)], Session("pods", quantities: Distance(9800)));

        Assert.Equal(2, result.Activities.Count);
        Assert.All(result.Activities, activity => Assert.Null(activity["distance"]));
        Assert.Equal(
            "the session of 10 March (pods) fits the recordings at 08:00 and 15:00; a session number or a start time would tell",
            Assert.Single(result.Questions).Sentence);
    }

    /// <summary>20 + 25 min, 2000 + 3000 m, the larger top speed; shares and ratings of drills say nothing about the session.</summary>
    [Fact]
    public void DrillsOfASessionAddUp()
    {
        var activity = Assert.Single(Join(
            [],
            Session("pods", drill: "warm-up", minutes: 20, rating: 3, quantities: [Distance(2000), Top(5), Share(0.6)]),
            Session("pods", drill: "game", minutes: 25, rating: 8, quantities: [Distance(3000), Top(8), Share(0.9)])).Activities);

        Assert.Equal((45, 5000, 8), (activity["minutes"], activity["distance"], activity["speed_top"]));
        Assert.Equal(["distance", "minutes", "speed_top"], activity.Quantities.Select(quantity => quantity.Name));
    }

    [Theory]
    [InlineData("distance_above_80_percent_speed_max", "m", 7.0)]
    [InlineData("accelerations", "count", 7.0)]
    [InlineData("speed_max", "m/s", 4.0)]
    [InlineData("power_top", "W", 4.0)]
    [InlineData("speed_mean", "m/s", null)]
    [InlineData("distance_per_minute", "m", null)]
    [InlineData("speed_top_share", "1", null)]
    public void AmountsAddUpTopsTakeTheLargestAndTheRestStaysUnknown(string name, string unit, double? value)
    {
        OwnedRow Drill(string drill, double told) => Session("pods", drill: drill, minutes: 10, quantities: new Quantity(name, told, unit, Estimated: false));

        Assert.Equal(value, Assert.Single(Join([], Drill("a", 3), Drill("b", 4)).Activities)[name]);
    }

    [Fact]
    public void TheRowOfTheWholeSessionWinsAndDrillsFillWhatItLacks()
    {
        var activity = Assert.Single(Join(
            [],
            Session("pods", drill: "a", minutes: 20, quantities: [Distance(2000), Top(5)]),
            Session("pods", drill: "b", minutes: 20, quantities: [Distance(3000), Top(8)]),
            Session("pods", minutes: 60, rating: 6, quantities: Distance(6000))).Activities);

        Assert.Equal((60, 6000, 8, 6), (activity["minutes"], activity["distance"], activity["speed_top"], activity["rating"]));
    }

    [Fact]
    public void DrillsOfTwoSessionsStayApart()
    {
        OwnedRow[] rows =
        [
            Session("pods", order: 1, drill: "a", quantities: Distance(1000)),
            Session("pods", order: 1, drill: "b", quantities: Distance(1500)),
            Session("pods", order: 2, drill: "a", quantities: Distance(4000)),
        ];

        Assert.Equal([2500.0, 4000.0], Join([], rows).Activities.Select(activity => activity["distance"]!.Value));
    }

    [Fact]
    public void FiguresThatAreNoNumberOrNoAmountAreLeftOut()
    {
        var activity = Assert.Single(Join(
            [],
            Session("pods", drill: "a", minutes: 20, quantities: [Distance(double.MaxValue), new("effort", double.NaN, "AU", Estimated: false)]),
            Session("pods", drill: "b", quantities: Distance(double.MaxValue))).Activities);

        Assert.Equal([Minutes(20)], activity.Quantities);
    }

    [Fact]
    public void TheStartOfTheRowTellsWhichHalfOfTheDateIsMeant()
    {
        var row = Session("pods", start: new LocalTime(15, 5), quantities: Distance(9800));

        Assert.Equal([null, 9800.0], Join([Recorded("soccer", 8), Recorded("soccer", 15)], row).Activities.Select(activity => activity["distance"]));
    }
}
