using System.Globalization;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>One tracking export of six players: ten minutes of training, then a quarter of an hour on the bus.</summary>
public sealed class SquadFileTests : IDisposable
{
    private const string Layout = """
        "layouts": [{
          "name": "tracking", "header": ["player", "moment"], "person_column": "player", "time": { "column": "moment" }, "sport": "soccer",
          "columns": [{ "column": "hr", "channel": "heart_rate", "unit": "bpm" }, { "column": "v", "channel": "speed", "unit": "m/s" }]
        }]
        """;

    private const string Roster = """
        person,name,group,birth_year,sex,time_zone,aliases
        anna,Anna Ahola,squad,1996,f,UTC,
        bo,Bo Björk,squad,1991,m,UTC,
        cara,Cara Costa,squad,1958,f,UTC,7
        dora,Dora Dahl,squad,1999,f,UTC,
        emil,Emil Ek,squad,1999,m,UTC,

        """;

    private const string KilometresAnHour = "emil";
    private const string Plan = "from,group,plan,start,end,recording,sport";

    private const int Step = 5;
    private const int Minutes = 40;

    private static readonly string[] Players = ["anna", "Bo Björk", "7", "1001", KilometresAnHour, "Ghost"];
    private static readonly byte[] Export = Some.Text(Text());

    private readonly WorkingFolder folder = new(roster: Roster);

    public SquadFileTests()
    {
        folder.Configure(Layout);
        folder.Write("devices.csv", "serial,person,from,to,session\n1001,dora,,,\n");
        folder.Put("squad.csv", Export);
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void EverybodyIsFoundByNameAliasOrDeviceAndAStrangerIsAskedAbout()
    {
        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, null), (folder.Arrival(Export)!.State, folder.Arrival(Export)!.Person));
        Assert.All(["anna", "bo", "cara", "dora", "emil"], person => Assert.Single(folder.Activities(person)));
        Assert.Equal(1, Nights.Count(folder.Brief(), "\"Ghost\" is not in the roster"));

        folder.Write("roster.csv", Roster.Replace("dora,Dora Dahl,squad,1999,f,UTC,", "dora,Dora Dahl,squad,1999,f,UTC,\nfia,Fia Falk,squad,,,UTC,ghost", StringComparison.Ordinal));
        folder.Sweep();
        Assert.Single(folder.Activities("fia"));
        Assert.DoesNotContain("Ghost", folder.Brief(), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void SpeedInAnotherUnitIsNotUsed()
    {
        folder.Sweep();

        var (anna, emil) = (folder.Activities("anna")[0], folder.Activities(KilometresAnHour)[0]);
        Assert.Equal((true, false), (anna.Value("speed_top") > 0, emil.Value("speed_top") > 0));
        Assert.True(emil.GetProperty("heart_rate_mean_bpm").GetDouble() > 100);
        Assert.Contains("emil: speeds 3.6 times those of the others: another unit?", WithoutStranger().Reason, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void TheBusRideAfterThePlannedSessionIsLeftOutWheneverThePlanComes(bool planFirst)
    {
        if (!planFirst)
        {
            folder.Sweep(Nights.Before(0) - Duration.FromHours(1) + Duration.FromMinutes(5));
            Assert.All(folder.Activities("anna"), activity => Assert.True(activity.Value("speed_top") > 8));
        }

        folder.PutTable("plan.csv", 0, Plan, $"{Nights.Day(0)},squad,team_session,12:00,12:10,yes,soccer");
        folder.Sweep();

        var anna = Assert.Single(folder.Activities("anna"));
        Assert.Contains("15 min after the planned session left out", anna.Words("remarks"));
        Assert.True(anna.Value("speed_top") < 5, "the bus is still in it");
        AssertSettled();

        folder.PutTable("plan.csv", 0, Plan, $"{Nights.Day(1)},squad,team_session,12:00,12:10,yes,soccer");
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));
        Assert.True(folder.Activities("anna")[0].Value("speed_top") > 8, "the planned session that is gone still cuts");
    }

    [Fact]
    public void APlayerWhoseRecordingIsImplausibleIsLeftOutUntilTheReferenceValueIsCorrected()
    {
        const string header = "date,person,test,value,unit";
        folder.PutTable("tests.csv", 0, header, "2026-06-01,anna,heart_rate_max,120,bpm", "2026-06-01,bo,heart_rate_max,190,bpm");
        folder.Sweep();
        Assert.Empty(folder.Activities("anna"));
        Assert.Contains("The recording of \"anna\" is left out: heart rate", folder.Brief(), StringComparison.Ordinal);

        folder.PutTable("tests.csv", 0, header, "2026-06-01,anna,heart_rate_max,191,bpm", "2026-06-01,bo,heart_rate_max,190,bpm");
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));

        Assert.Single(folder.Activities("anna"));
        Assert.DoesNotContain("is left out", folder.Brief(), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void AFileOfSeveralPeopleIsAssignedToNobody()
    {
        folder.Sweep();
        folder.PutTable("answers.csv", 0, "date,person,answer,file", "2026-06-15,anna,belongs_to,squad.csv");

        Assert.Contains("holds recordings of several people", Assert.Single(folder.Sweep().OpenAnswers).Sentence, StringComparison.Ordinal);

        Assert.Equal(0, folder.Sweep().PeopleComputed);
        Assert.Single(folder.Activities("bo"));
    }

    [Fact]
    public void APodIsWhoseItWasOnTheDateOfTheOwnZone()
    {
        folder.Write("roster.csv", Roster.Replace("UTC", "Europe/Helsinki", StringComparison.Ordinal));
        folder.Write("devices.csv", "serial,person,from,to,session\n1001,dora,2026-06-14,,\n1001,bo,,2026-06-13,\n");
        var minutes = Enumerable.Range(0, 60).SelectMany(at => new[] { "1001", "anna" }.Select(player => $"{player},2026-06-13T22:00:{at:00}Z,130,3"));
        folder.PutTable("night.csv", 0, ["player,moment,hr,v", .. minutes]);

        folder.Sweep();

        Assert.Equal(["2026-06-14", "2026-06-14"], folder.Activities("dora").Select(activity => activity.GetProperty("date").GetString()));
        Assert.DoesNotContain(folder.Activities("bo"), activity => activity.GetProperty("start").GetString()!.Contains("T01:00", StringComparison.Ordinal));
    }

    /// <summary>The reason of an arrival is its first problem: with everybody in the roster it is what was wrong with the numbers.</summary>
    private LoadWatch.Storage.Recordings.Arrival WithoutStranger()
    {
        folder.Edit("roster.csv", "emil,Emil Ek,squad,1999,m,UTC,", "emil,Emil Ek,squad,1999,m,UTC,\nfia,Fia Falk,squad,,,UTC,ghost");
        folder.Sweep();
        return folder.Arrival(Export)!;
    }

    private void AssertSettled()
    {
        var before = folder.Everything();
        Assert.Equal(0, folder.Sweep(WorkingFolder.Now).PeopleComputed);
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
    }

    private static string Text() => string.Join('\n', Players.SelectMany(Lines).Prepend("player,moment,hr,v")) + "\n";

    private static IEnumerable<string> Lines(string player) => Enumerable.Range(0, (Minutes * 60 / Step) + 1).Select(at =>
    {
        var second = at * Step;
        var (heartRate, speed) = second < 25 * 60 ? (140 + (at % 5), 2.5 + (at % 4 * 0.5)) : (85, 9.0);
        var moment = (Some.Yesterday + new LocalTime(12, 0)).PlusSeconds(second);
        var told = player == KilometresAnHour ? 3.6 * speed : speed;
        return string.Create(CultureInfo.InvariantCulture, $"{player},{moment:uuuu-MM-dd'T'HH:mm:ss}Z,{heartRate},{told:0.0}");
    });
}
