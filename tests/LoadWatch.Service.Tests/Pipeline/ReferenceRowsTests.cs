using System.Text.Json;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>What rows of tests and ratings change in the computation of sets and recordings.</summary>
public sealed class ReferenceRowsTests : IDisposable
{
    private const string Tests = "date,person,test,value,unit,exercise,machine";

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AMeasuredMaximumOfTheMachineCountsFromItsDateOn()
    {
        folder.PutTable(
            "sets.csv",
            1,
            "date,person,exercise,machine,set,repetitions,kilograms,reserve",
            $"{Nights.Day(4)},anna,leg_press,B4,1,5,80,2",
            $"{Nights.Day(2)},anna,leg_press,B4,1,5,80,2",
            $"{Nights.Day(2)},bo,leg_press,B5,1,5,80,2");
        folder.Sweep(Nights.Before(1));
        Assert.Equal(["B", "B", "B"], Grades("anna").Concat(Grades("bo")));

        folder.PutTable(
            "tests.csv", 0, Tests,
            $"{Nights.Day(3)},anna,one_repetition_max,100,kg,leg_press,B4",
            $"{Nights.Day(3)},bo,one_repetition_max,100,kg,leg_press,B4");
        folder.Sweep();

        Assert.Equal(["B", "A"], Grades("anna"));
        Assert.Equal(["B"], Grades("bo")); // Another machine's maximum.
        var before = folder.Everything();
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
    }

    [Fact]
    public void ARecordingIsComputedAnewFromTheDateOfAMeasuredMaximumOn()
    {
        folder.Put("anna/before.fit", Some.Fit(Nights.Date(4)));
        folder.Put("anna/after.fit", Some.Fit(Nights.Date(2)));
        folder.Sweep(WorkingFolder.Now);
        var before = Loads();

        folder.PutTable("tests.csv", 0, Tests, $"{Nights.Day(3)},anna,heart_rate_max,175,bpm,,");
        folder.Sweep();

        Assert.Equal(before[0], Loads()[0]);
        Assert.True(Loads()[1] > before[1], "the reference value changed nothing");
    }

    [Fact]
    public void AHeldRecordingThatIsAssignedToItsOwnerIsTakenAsItIs()
    {
        var ride = Some.Fit(Nights.Date(2));
        folder.PutTable("tests.csv", 0, Tests, $"{Nights.Day(5)},cara,heart_rate_max,110,bpm,,");
        folder.Put("cara/ride.fit", ride);
        folder.Sweep();
        Assert.Null(folder.Arrival(ride)!.Person);

        folder.Assign(ride, "cara");
        folder.Sweep();

        Assert.Single(folder.Activities("cara"));
        var before = folder.Everything();
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
    }

    [Fact]
    public void AHeldRecordingIsTakenUpWhenTheReferenceValueIsCorrected()
    {
        var ride = Some.Fit(Nights.Date(2));
        folder.PutTable("tests.csv", 1, Tests, $"{Nights.Day(5)},cara,heart_rate_max,110,bpm,,");
        folder.Put("cara/ride.fit", ride);
        folder.Sweep();
        Assert.StartsWith("heart rate", folder.Arrival(ride)!.Reason, StringComparison.Ordinal);

        folder.PutTable("tests.csv", 0, Tests, $"{Nights.Day(5)},cara,heart_rate_max,170,bpm,,");
        folder.Sweep(WorkingFolder.Now + NodaTime.Duration.FromMinutes(1));

        Assert.Equal("cara", folder.Arrival(ride)!.Person);
        Assert.Single(folder.Activities("cara"));
    }

    /// <summary>Twelve rated rides of May give the line; from June on heart rate is declared not to say anything.</summary>
    [Fact]
    public void WithoutValidHeartRateTheRatingStandsInByThePersonsOwnLine()
    {
        folder.Edit("roster.csv", "time_zone", "time_zone,heart_rate_valid");
        folder.Edit("roster.csv", "anna,Anna Ahola,squad,1996,f,UTC", "anna,Anna Ahola,squad,1996,f,UTC,no since 2026-06-01");
        folder.Edit("roster.csv", "1991,m,UTC", "1991,m,UTC,");
        folder.Edit("roster.csv", "1958,f,UTC", "1958,f,UTC,");
        var rides = Enumerable.Range(0, 12).Select(ride => (Date: Nights.Date(42 - (2 * ride)), HeartRate: 120 + (4 * ride), Rating: 2 + (ride / 2))).ToList();
        folder.Fill(rides.Select(ride => ($"anna/{ride.Date:MMdd}.fit", Some.Fit(ride.Date, heartRate: ride.HeartRate))));
        folder.Put("anna/june.fit", Some.Fit(Nights.Date(2)));
        folder.PutTable(
            "sessions.csv", 0,
            ["date,person,session,sport,minutes,rating", .. rides.Select(ride => $"{ride.Date:uuuu-MM-dd},anna,1,cycling,,{ride.Rating}"), $"{Nights.Day(2)},anna,1,cycling,,6"]);
        folder.Sweep();

        var activities = folder.Activities("anna");
        Assert.Equal(13, activities.Count);
        Assert.Null(activities[^1].Value("banister_trimp"));
        Assert.Equal(12, activities[^1].Value("foster_load"));
        var pairs = activities.SkipLast(1).Select(one => (X: one.Value("foster_load")!.Value, Y: one.Value("banister_trimp")!.Value)).ToList();
        Assert.Equal(LeastSquares(pairs, 12), folder.OnDay("anna", Nights.Day(2)).GetProperty("load").GetDouble(), 6);
    }

    [Theory]
    [InlineData(10, true)]
    [InlineData(9, false)]
    public void ASessionThatOnlyARatingTellsOfTakesItsLoadByALineOfTenPairs(int pairs, bool isKnown)
    {
        folder.Edit("loadwatch.json", "\"name\": \"Squad\"", "\"name\": \"Squad\", \"load_fallbacks\": [\"foster_load\"]");
        var rides = Enumerable.Range(0, pairs).Select(ride => (Date: Nights.Date(40 - (2 * ride)), HeartRate: 120 + (4 * ride), Rating: 2 + (ride / 2))).ToList();
        folder.Fill(rides.Select(ride => ($"anna/{ride.Date:MMdd}.fit", Some.Fit(ride.Date, heartRate: ride.HeartRate))));
        folder.PutTable(
            "sessions.csv", 0,
            ["date,person,session,sport,minutes,rating", .. rides.Select(ride => $"{ride.Date:uuuu-MM-dd},anna,1,cycling,,{ride.Rating}"), $"{Nights.Day(2)},anna,1,cycling,3,5"]);
        folder.Sweep();

        var told = folder.Activities("anna").SkipLast(1).Select(one => (X: one.Value("foster_load")!.Value, Y: one.Value("banister_trimp")!.Value)).ToList();
        var load = folder.OnDay("anna", Nights.Day(2)).GetProperty("load");
        Assert.Equal(isKnown ? JsonValueKind.Number : JsonValueKind.Null, load.ValueKind);
        Assert.True(!isKnown || Math.Abs(LeastSquares(told, 15) - load.GetDouble()) < 1e-6, load.ToString());
    }

    /// <summary>The straight line by its definition: slope = covariance / variance, through the means.</summary>
    private static double LeastSquares(List<(double X, double Y)> pairs, double at)
    {
        var (meanX, meanY) = (pairs.Average(pair => pair.X), pairs.Average(pair => pair.Y));
        var slope = pairs.Sum(pair => (pair.X - meanX) * (pair.Y - meanY)) / pairs.Sum(pair => (pair.X - meanX) * (pair.X - meanX));
        return meanY + (slope * (at - meanX));
    }

    private List<double> Loads() => folder.Activities("anna").Select(activity => activity.Value("banister_trimp")!.Value).ToList();

    private IEnumerable<string?> Grades(string person) => folder.Activities(person).Select(Legs).Select(legs => legs.GetProperty("grade").GetString());

    private static JsonElement Legs(JsonElement activity) =>
        activity.GetProperty("stimulus").EnumerateArray().First(region => region.GetProperty("region").GetString() == "legs");
}
