using System.Text.Json;
using LoadWatch.Decoding.Fit;
using LoadWatch.Service.Tests.Pipeline;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Service.Tests.Commands;

public sealed class InspectTests : IDisposable
{
    private const string Keys = "file,kind,part,sport,first_sample,last_sample,samples,elapsed_s,timer_s,distance_m,channels,laps,sets,lengths,device,problems";

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void EveryRecordingOfEveryFileIsALineInTheOrderAskedFor()
    {
        var ride = folder.Put("ride.fit", Some.Fit(Some.Yesterday));
        var zip = folder.Put("pack.zip", Some.Zip(("b.csv", Some.Csv(Some.Yesterday)), ("a.fit.gz", Some.Gzip(Some.Fit(Some.Yesterday, 10)))));
        var cut = folder.Put("cut.fit", Some.Fit(Some.Yesterday)[..300]);
        var absent = Path.Combine(folder.Inbox, "absent.fit");
        var lines = Inspect(null, zip, cut, ride, absent);
        Assert.Equal([$"{zip}!/b.csv", $"{zip}!/a.fit.gz!/a.fit", cut, ride, absent], lines.Select(line => line.GetProperty("file").GetString()));
        Assert.Equal(["csv", "fit", "fit", "fit", "unknown"], lines.Select(line => line.GetProperty("kind").GetString()));
        Assert.Equal([1, 1, null, 1, null], lines.Select(Part));
        Assert.All(lines, line => Assert.Equal(Keys, string.Join(',', line.EnumerateObject().Select(property => property.Name))));
        var problem = Assert.Single(lines[2].GetProperty("problems").EnumerateArray());
        Assert.Equal(("error", 300L), (problem.GetProperty("severity").GetString(), problem.GetProperty("byte_offset").GetInt64()));
        Assert.Equal("no such file", Assert.Single(lines[4].GetProperty("problems").EnumerateArray()).GetProperty("reason").GetString());
        Assert.Empty(WorkingFolder.Files(folder.Data));
    }

    [Fact]
    public void TheNumbersOfARideAreThoseThatWereWritten()
    {
        var line = Assert.Single(Inspect(null, folder.Put("ride.fit", Some.Fit(Some.Yesterday))));
        Assert.Equal("cycling", line.GetProperty("sport").GetString());
        Assert.Equal(("2026-06-14T12:00:00Z", "2026-06-14T12:02:00Z"), (line.GetProperty("first_sample").GetString(), line.GetProperty("last_sample").GetString()));
        Assert.Equal((121, 120.0, 120.0, 960.0), (line.GetProperty("samples").GetInt32(), Number(line, "elapsed_s"), Number(line, "timer_s"), Number(line, "distance_m")));
        Assert.Equal((1, 0, 0), (line.GetProperty("laps").GetInt32(), line.GetProperty("sets").GetInt32(), line.GetProperty("lengths").GetInt32()));
        Assert.Equal("""{"manufacturer":255,"product":1,"serial":4711}""", line.GetProperty("device").GetRawText());

        // Heart rate: 140 to 151 ten times each, then 152: (10 * (140 + ... + 151) + 152) / 121. Power: 180 to 300.
        var channels = line.GetProperty("channels");
        Assert.Equal(["heart_rate", "power", "distance"], channels.EnumerateObject().Select(channel => channel.Name));
        Assert.Equal("n,mean,max", string.Join(',', channels.GetProperty("power").EnumerateObject().Select(property => property.Name)));
        Assert.Equal((121, 152.0), (channels.GetProperty("heart_rate").GetProperty("n").GetInt32(), Number(channels.GetProperty("heart_rate"), "max")));
        Assert.Equal(((10 * 1746) + 152) / 121.0, Number(channels.GetProperty("heart_rate"), "mean"), 1e-9);
        Assert.Equal((121, 240.0, 300.0), (channels.GetProperty("power").GetProperty("n").GetInt32(), Number(channels.GetProperty("power"), "mean"), Number(channels.GetProperty("power"), "max")));
    }

    [Fact]
    public void WhatAnAppStatesBesideTheDeviceIsShownAndDoesNotCount()
    {
        const int start = 1_000_000_000;
        var description = new FitDefinition(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(8, Text, 4), new(14, Unsigned16), new(15, Unsigned8));
        var path = folder.Put("twice.fit", new FitPartWriter().Define(0, new(0, new FitFieldLayout(0, Enumeration))).Message(0, 4)
            .Define(1, description).Message(1, 0, 0, (int)Unsigned16, "W", 20, 7).Message(1, 0, 1, (int)Unsigned32, "km", 18, 9)
            .Define(2, new(20, new(253, Unsigned32), new(7, Unsigned16)) { Developer = [new(0, Unsigned16, 0)] })
            .Message(2, start, 200, 230).Message(2, start + 1, 210, 250)
            .Define(3, new(18, new(2, Unsigned32), new(9, Unsigned32)) { Developer = [new(1, Unsigned32, 0)] }).Message(3, start, 50_000, 2).ToBytes());
        var line = Assert.Single(Inspect(null, path));
        Assert.Equal(205, Number(line.GetProperty("channels").GetProperty("power"), "mean"));
        Assert.Equal("""{"elapsed_s":null,"timer_s":null,"distance_m":2000,"channels":{"power":{"n":2,"mean":240,"max":250}}}""", line.GetProperty("shadowed").GetRawText());
        var text = Loadwatch.Run("inspect", path).Output;
        Assert.Contains("    power            2 readings by an app beside the device's own, not used: mean 240, highest 250\n    distance   2000 m by an app beside the device's own, not used\n", text, StringComparison.Ordinal);
    }

    [Fact]
    public void ADayWornBesideAWalkIsNamedInTheTextOfItsFile()
    {
        var path = folder.Put("days.fit", MonitoringTests.Log(Some.Yesterday.PlusDays(-2), walkedMinutes: 30, wornDaysBehind: 1));
        Assert.Contains("    beside it a table of days by layout monitoring: 1 rows", Loadwatch.Run("inspect", path).Output, StringComparison.Ordinal);
    }

    [Fact]
    public void NamesAreTakenFromStandardInputToo()
    {
        var (one, two) = (folder.Put("one.fit", Some.Fit(Some.Yesterday)), folder.Put("two å.fit", Some.Fit(Some.Yesterday, 10)));
        var lines = Inspect($"{two}\n\n{one}\n", "--from-list", "-");
        Assert.Equal([two, one], lines.Select(line => line.GetProperty("file").GetString()));
    }

    [Fact]
    public void NoFileGivesAnEmptyArray() => Assert.Empty(Inspect("", "--from-list", "-"));

    private static List<JsonElement> Inspect(string? input, params string[] words)
    {
        var ended = Loadwatch.RunWithInput(input ?? "", ["inspect", "--json", .. words]);
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        return [.. JsonDocument.Parse(ended.Output).RootElement.EnumerateArray()];
    }

    private static int? Part(JsonElement line) => line.GetProperty("part").ValueKind == JsonValueKind.Null ? null : line.GetProperty("part").GetInt32();

    private static double Number(JsonElement line, string name) => line.GetProperty(name).GetDouble();
}
