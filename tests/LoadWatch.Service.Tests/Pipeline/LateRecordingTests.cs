using LoadWatch.Service.Explain;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Ratings and the recordings of the same sessions, in whichever order they come.</summary>
public sealed class LateRecordingTests : IDisposable
{
    private const string Header = "date,person,session,start,sport,minutes,rating";

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ARatingStandsAloneUntilItsRecordingComes()
    {
        folder.PutTable("sessions.csv", 2, Header, $"{Nights.Day(2)},anna,1,,cycling,2,7");
        folder.Sweep(Nights.Before(2));
        var alone = Assert.Single(folder.Activities("anna"));
        Assert.Equal((2.0, 7.0, 14.0, null), (alone.Value("minutes"), alone.Value("rating"), alone.Value("foster_load"), alone.Value("banister_trimp")));
        Assert.Null(Load(Nights.Day(2)));

        folder.Put("anna/ride.fit", Some.Fit(Nights.Date(2)));
        folder.Sweep();

        var joined = Assert.Single(folder.Activities("anna"));
        Assert.Equal(14, joined.Value("foster_load"));
        Assert.True(joined.Value("banister_trimp") > 0);
        Assert.Equal(joined.Value("banister_trimp"), Load(Nights.Day(2)));
        Assert.Equal(["sessions"], joined.Words("tables"));
        Assert.True(joined.GetProperty("adds_load").GetBoolean());
        Assert.Equal(Nights.Day(2), joined.GetProperty("date").GetString());
    }

    [Fact]
    public void ARatingWithTwoCandidatesIsAskedAboutUntilItsStartTells()
    {
        folder.Put("anna/one.fit", Some.Fit(Some.Yesterday));
        folder.Put("anna/two.fit", Some.Fit(Some.Yesterday, 60));
        folder.PutTable("sessions.csv", 0, Header, $"{Nights.Day(0)},anna,,,cycling,,7");
        folder.Sweep();
        const string question = "A rating of 7 of 14 June (sessions) fits the recordings at 12:00 and 13:00";
        Assert.Contains(question, folder.Brief(), StringComparison.Ordinal);
        Assert.All(folder.Activities("anna"), activity => Assert.Null(activity.Value("rating")));

        folder.PutTable("sessions.csv", 0, Header, $"{Nights.Day(0)},anna,,13:00,cycling,,7");
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));

        Assert.DoesNotContain("A rating of 7", folder.Brief(), StringComparison.Ordinal);
        Assert.Equal([null, 7], folder.Activities("anna").Select(activity => activity.Value("rating")));
        AssertRebuilt();
    }

    [Fact]
    public void ADayIsExplainedWithWhatTheTableTold()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.PutTable("sessions.csv", 0, Header, $"{Nights.Day(0)},anna,1,,cycling,3,7");
        folder.Sweep();

        var text = folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", Some.Yesterday))!;

        Assert.Contains("and layout sessions", text, StringComparison.Ordinal);
        Assert.Contains("rating = 7 points", text, StringComparison.Ordinal);
        Assert.Contains("foster_load = 14 AU", text, StringComparison.Ordinal);
        Assert.Contains("minutes: 2 min by the recording counts, sessions says 3 min", text, StringComparison.Ordinal);
    }

    private double? Load(string date) => folder.OnDay("anna", date).GetProperty("load") is { ValueKind: System.Text.Json.JsonValueKind.Number } load ? load.GetDouble() : null;

    private void AssertRebuilt()
    {
        var before = folder.Everything();
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
    }
}
