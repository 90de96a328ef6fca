using System.Text.Json;
using LoadWatch.Decoding.Fit;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>What does not count of a session is told with its reason, its place and its share, for the file and for the day.</summary>
public sealed class ExplainCutsTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    /// <summary>By hand: two minutes, the strap without contact in the half minute from 12:00:30.</summary>
    [Fact]
    public void ALostContactIsExplainedForTheFileAndForTheDay()
    {
        folder.Put("anna/ride.fit", Ride(30, 60));
        folder.Sweep();

        Assert.All(["anna/ride.fit", "anna"], subject =>
        {
            var told = Explain(subject);
            Assert.Contains("heart rate usable in 75 % of the sampled time", told, StringComparison.Ordinal);
            Assert.Contains("outside what can be true, 12:00:30 to 12:01:00: 25 % of the sampled time, 30 readings", told, StringComparison.Ordinal);
            Assert.Contains("power usable in 100 % of the sampled time", told, StringComparison.Ordinal);
        });
    }

    [Fact]
    public void TheExportTellsTheSame()
    {
        folder.Put("anna/ride.fit", Ride(30, 60));
        folder.Sweep();

        var cut = Assert.Single(JsonDocument.Parse(folder.Export("activities")).RootElement.GetProperty("cuts").EnumerateArray());

        Assert.Equal(
            """{"channel":"heart_rate","reason":"out_of_range","from":"2026-06-14T12:00:30Z","to":"2026-06-14T12:01:00Z","readings":30,"seconds":30,"share":0.25}""",
            cut.GetRawText());
    }

    [Fact]
    public void ANameThatDoesNotFitTheContentIsTold()
    {
        folder.Put("anna/ride.csv", Some.Fit(Some.Yesterday));
        folder.Put("anna/walk.fit", Some.Fit(Some.Yesterday, 30));
        folder.Sweep();

        Assert.Contains("seen as anna/ride.csv in inbox, named .csv, but its content is fit", Explain("anna/ride.csv"), StringComparison.Ordinal);
        Assert.DoesNotContain("named", Explain("anna/walk.fit"), StringComparison.Ordinal);
    }

    [Fact]
    public void RowsOutOfOrderAreTold()
    {
        folder.Put("anna/run.csv", Some.Text("""
            time,heart_rate_bpm
            2026-06-14T12:00:05Z,120
            2026-06-14T12:00:04Z,121
            2026-06-14T12:00:06Z,122
            2026-06-14T12:00:03Z,123

            """));
        folder.Sweep();

        Assert.Contains("rows before the row above, 12:00:03 to 12:00:04: 50 % of the rows, 2 rows", Explain("anna/run.csv"), StringComparison.Ordinal);
    }

    /// <summary>Two bad rows of 301 are left out, each with its line; a bad hundredth would refuse the file.</summary>
    [Fact]
    public void EveryProblemOfAFileIsTold()
    {
        var rows = Enumerable.Range(0, 301).Select(second => $"2026-06-14T12:0{second / 60}:{second % 60:00}Z,{(second is 10 or 20 ? "x" : "130")}\n");
        folder.Put("anna/run.csv", Some.Text("time,heart_rate_bpm\n" + string.Concat(rows)));
        folder.Sweep();

        var told = Explain("anna/run.csv");

        Assert.Contains("line 12, column 2 (heart_rate_bpm)", told, StringComparison.Ordinal);
        Assert.Contains("line 22, column 2 (heart_rate_bpm)", told, StringComparison.Ordinal);
    }

    private string Explain(string subject) =>
        Loadwatch.Run(["explain", subject, "--config", folder.ConfigPath, .. subject == "anna" ? ["--date", "2026-06-14"] : Array.Empty<string>()]).Output;

    /// <summary>Heart rate 0 from one second to another.</summary>
    private static byte[] Ride(int from, int to)
    {
        var ride = Some.Ride(Some.Yesterday);
        return FitEncoder.Encode(ride with
        {
            Samples = [.. ride.Samples.Select((sample, second) => second >= from && second < to ? sample with { HeartRate = 0 } : sample)],
        });
    }
}
