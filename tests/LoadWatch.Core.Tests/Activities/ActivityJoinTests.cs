using LoadWatch.Rows;
using NodaTime;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class ActivityJoinTests
{
    private static readonly RecordedActivity Morning = Recorded("running", 9, 10);
    private static readonly RecordedActivity Evening = Recorded("running", 17, 30);

    [Fact]
    public void ARecordingWithoutRowsStaysAsItIs()
    {
        var stimulus = Region("power", Stimulus.Grade.B, 4, null);
        var activity = Assert.Single(Join([Morning.With(stimulus)]).Activities);

        Assert.Equal((Morning.Winner.Key, Morning.Winner.Start, "running"), (activity.Key, activity.Start, activity.Sport.Name));
        Assert.Equal(["device 1"], activity.Sources);
        Assert.Equal([stimulus], activity.Stimulus);
        Assert.Equal([Minutes(60)], activity.Quantities);
        Assert.Empty(activity.Tables);
    }

    /// <summary>7 x 60 min = 420.</summary>
    [Fact]
    public void ARatingWithOnlyADateJoinsTheOnlyRun()
    {
        var result = Join([Morning], Session(rating: 7));

        var activity = Assert.Single(result.Activities);
        Assert.Equal((Morning.Winner.Key, 7, 420), (activity.Key, activity["rating"], activity["foster_load"]));
        Assert.Equal(["device 1", "layout ratings"], activity.Sources);
        Assert.Equal(["ratings"], activity.Tables);
        Assert.Empty(result.Questions);
    }

    /// <summary>The minutes are of the recording, the load is computed: neither is the table's.</summary>
    [Fact]
    public void OnlyWhatATableStatesIsTheTables()
    {
        var activity = Assert.Single(Join([Morning], Session(rating: 7, minutes: 60, quantities: new Loads.Quantity("distance", 9000, "m", Estimated: false))).Activities);

        Assert.Equal([("distance", "ratings"), ("rating", "ratings")], activity.StatedBy.OrderBy(one => one.Key, StringComparer.Ordinal).Select(one => (one.Key, one.Value)));
        Assert.Equal(420, activity["foster_load"]);
    }

    [Fact]
    public void ARatingWithNumberTwoJoinsTheEveningRun()
    {
        var activities = Join([Evening, Morning], Session(rating: 7, order: 2)).Activities;

        Assert.Equal([null, 7.0], activities.Select(activity => activity["rating"]));
    }

    [Fact]
    public void ARatingThatFitsTwoRunsIsAQuestion()
    {
        var result = Join([Evening, Morning], Session(rating: 7));

        Assert.Equal(2, result.Activities.Count);
        Assert.All(result.Activities, activity => Assert.Null(activity["rating"]));
        Assert.Equal(
            [new JoinQuestion(
                Given.Date, "a rating of 7 of 10 March (ratings) fits the recordings at 09:10 and 17:30; a session number or a start time would tell")],
            result.Questions);
    }

    [Theory]
    [InlineData(8, 40, true)]
    [InlineData(8, 39, false)]
    [InlineData(9, 40, true)]
    [InlineData(10, 10, true)]
    [InlineData(10, 11, false)]
    public void AStartWithinHalfAnHourOfTheRecordingsOrWhileItRanTells(int hour, int minute, bool joins)
    {
        var result = Join([Morning, Evening], Session(rating: 7, start: new LocalTime(hour, minute)));

        Assert.Equal(joins ? 7 : null, result.Activities[0]["rating"]);
        Assert.Equal(joins ? 0 : 1, result.Questions.Count);
    }

    [Fact]
    public void OfTwoRecordingsThatRanAtTheStartTheOneThatBeganThenIsMeant()
    {
        var activities = Join([Morning, Recorded("running", 10, 5)], Session(rating: 7, start: new LocalTime(10, 0))).Activities;

        Assert.Equal([null, 7.0], activities.Select(activity => activity["rating"]));
    }

    [Fact]
    public void ANumberCountsTheSportBeforeTheDate()
    {
        var ride = Recorded("cycling", 7);

        Assert.Equal([null, 7.0, null], Ratings(Session(rating: 7, order: 1, sport: "running")));
        Assert.Equal([null, null, 7.0], Ratings(Session(rating: 7, order: 2, sport: "running")));
        Assert.Equal([7.0, null, null], Ratings(Session(rating: 7, order: 1)));
        Assert.Equal([null, 7.0], Join([ride, Morning], Session(rating: 7, order: 2, sport: "running")).Activities.Select(one => one["rating"]));

        IEnumerable<double?> Ratings(OwnedRow row) => Join([ride, Morning, Evening], row).Activities.Select(activity => activity["rating"]);
    }

    [Fact]
    public void ARatingWithoutARecordingOrMinutesIsAQuestion()
    {
        var result = Join([Recorded("cycling", 9)], Session(rating: 7, sport: "running"));

        Assert.Null(Assert.Single(result.Activities)["rating"]);
        Assert.Equal(
            "a rating of 7 of 10 March (ratings) has no recording and no minutes; it counts once one of them comes",
            Assert.Single(result.Questions).Sentence);
    }

    [Fact]
    public void ALineOfAListThatNobodyFilledInAsksNothingAndAddsNothing()
    {
        Assert.Empty(Join([], Session()).Activities);
        Assert.Empty(Join([], Session()).Questions);
        Assert.Empty(Join([Morning, Evening], Session()).Questions);
    }

    /// <summary>7 x 45 min = 315.</summary>
    [Fact]
    public void ARowWithMinutesStandsForASessionThatNobodyRecorded()
    {
        var activity = Assert.Single(Join([], Session(rating: 7, minutes: 45, sport: "rowing")).Activities);

        Assert.Equal(("rows/2026-03-10/ratings/1", Given.Date, null), (activity.Key, activity.Date, activity.Start));
        Assert.Equal(("rowing", 315), (activity.Sport.Name, activity["foster_load"]));
        Assert.Equal(["layout ratings"], activity.Sources);
        Assert.All(activity.Stimulus, region => Assert.False(region.SeesHardWork));
        Assert.Equal(3, activity.Stimulus.Count);
    }

    [Fact]
    public void NumberOrStartNameASessionOfRowsAlone()
    {
        Assert.Equal("rows/2026-03-10/ratings/2", Join([], Session(minutes: 45, order: 2)).Activities[0].Key);

        var timed = Join([], Session(minutes: 45, start: new LocalTime(18, 30))).Activities[0];
        Assert.Equal(("rows/2026-03-10/ratings/18:30:00", Instant.FromUtc(2026, 3, 10, 18, 30)), (timed.Key, timed.Start));
    }

    [Fact]
    public void ALateRecordingTakesInTheRowThatStoodAlone()
    {
        var row = Session(rating: 7, minutes: 45);

        Assert.Equal("rows/2026-03-10/ratings/1", Assert.Single(Join([], row).Activities).Key);
        Assert.Equal(Morning.Winner.Key, Assert.Single(Join([Morning], row).Activities).Key);
    }

    [Fact]
    public void ARecordingOfAnotherDateIsNoCandidate() =>
        Assert.Equal(2, Join([Recorded("running", 9, date: Given.Date.PlusDays(1))], Session(rating: 7, minutes: 45)).Activities.Count);

    [Fact]
    public void ASessionNumberBeyondTheRecordingsStandsAlone()
    {
        var activities = Join([Morning], Session(minutes: 60, rating: 5, order: 1), Session(minutes: 30, rating: 8, order: 2)).Activities;

        Assert.Equal([5.0, 8.0], activities.Select(activity => activity["rating"]));
    }

    /// <summary>The only recording is the first session of the table; what is left has none.</summary>
    [Fact]
    public void ATableTellsOfARecordingOnce()
    {
        var activities = Join([Morning], Session(rating: 5, start: new LocalTime(9, 0)), Session(minutes: 30, rating: 8)).Activities;

        Assert.Equal(
            [(Morning.Winner.Key, 5.0), ("rows/2026-03-10/ratings/1", 8.0)],
            activities.Select(activity => (activity.Key, activity["rating"]!.Value)));
    }

    [Fact]
    public void TheRecordedValueWinsAndAStatedOneFarFromItIsTold()
    {
        var run = Recorded("running", 9, quantities: Distance(5000));
        var near = Assert.Single(Join([run], Session("pods", quantities: [Distance(5550), Top(8)])).Activities);
        var far = Assert.Single(Join([run], Session("pods", quantities: Distance(5600))).Activities);

        Assert.Equal((5000, 8, 5000), (near["distance"], near["speed_top"], far["distance"]));
        Assert.Empty(near.Remarks);
        Assert.Equal(["distance: 5000 m by the recording counts, pods says 5600 m"], far.Remarks);
    }

    [Fact]
    public void TwoTablesFillEachOtherAndTheFirstByNameWinsWhereTheyContradict()
    {
        var activity = Assert.Single(Join([Morning], Session("pods", rating: 6, quantities: Top(8)), Session("diary", rating: 7)).Activities);

        Assert.Equal((7, 8, 420), (activity["rating"], activity["speed_top"], activity["foster_load"]));
        Assert.Equal(["rating: 7 points by diary counts, pods says 6 points"], activity.Remarks);
        Assert.Equal(["diary", "pods"], activity.Tables);
    }

    [Fact]
    public void TwoTablesAboutOneSessionThatNobodyRecordedAreOneSession()
    {
        var activity = Assert.Single(Join([], Session("pods", minutes: 90, sport: "soccer"), Session("diary", rating: 7)).Activities);

        Assert.Equal(("rows/2026-03-10/pods/1", 630), (activity.Key, activity["foster_load"]));
        Assert.Equal(["layout diary", "layout pods"], activity.Sources);
    }

    [Theory]
    [InlineData(10, 30, 1)]
    [InlineData(10, 50, 1)]
    [InlineData(10, 51, 2)]
    [InlineData(9, 30, 1)]
    [InlineData(9, 29, 2)]
    public void StartsFarFromEachOtherAreTwoSessions(int hour, int minute, int sessions) => Assert.Equal(
        sessions,
        Join([], Session("pods", minutes: 50, start: new LocalTime(10, 0)), Session("diary", minutes: 20, start: new LocalTime(hour, minute))).Activities.Count);

    [Fact]
    public void ARatingThatFitsTwoUnrecordedSessionsIsAQuestion()
    {
        var result = Join([], Session("pods", minutes: 50, order: 1), Session("pods", minutes: 20, order: 2), Session("diary", rating: 7));

        Assert.Equal(2, result.Activities.Count);
        Assert.Contains("fits 2 sessions of that date that were not recorded", Assert.Single(result.Questions).Sentence, StringComparison.Ordinal);
    }

    [Fact]
    public void RowsOfATableWithoutNumberOrStartAreSessionsOfTheirOwn()
    {
        OwnedRow[] rows = [Session(rating: 8, minutes: 30, key: "n=10"), Session(rating: 5, minutes: 60, key: "n=2")];

        Assert.Equal(
            [("rows/2026-03-10/ratings/1", 300.0), ("rows/2026-03-10/ratings/1-2", 240.0)],
            Join([], rows).Activities.Select(activity => (activity.Key, activity["foster_load"]!.Value)));
        Assert.Equal([8.0, 5.0], Join([Morning], rows).Activities.Select(activity => activity["rating"]!.Value).OrderDescending());
        Assert.Equal(2, Join([Morning], rows).Activities.Count);
        Assert.Equal(2, Join([Morning, Evening], rows).Activities.Count);
        Assert.Single(Join([Morning, Evening], rows).Questions);
    }

    [Fact]
    public void OtherKindsOfRowsArePassedOver() =>
        Assert.Empty(Join([], new OwnedRow("calendar", Given.Date, "1", new DayRow(DayWord.Rest))).Activities);
}
