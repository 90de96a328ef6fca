using System.Text;
using System.Text.Json;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Storage.Recordings;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A sweep over recordings of real devices, one person for each file.</summary>
public sealed class RealSweepTests(RealSweep sweep) : IClassFixture<RealSweep>
{
    [Theory]
    [InlineData("r004.fit", "byte 768: cut short")]
    [InlineData("r012.fit", "byte 253838: wrong checksum")]
    [InlineData("r013.fit", "byte 769: wrong checksum")]
    [InlineData("r021.fit", "byte 403454: wrong checksum")]
    [InlineData("r023.fit", "byte 78233: cut short")]
    public void DamagedFilesAreRefusedWithThePlace(string name, string reason)
    {
        var arrival = sweep.Arrival(name);
        Assert.Equal((ArrivalState.Refused, null), (arrival.State, arrival.Person));
        Assert.StartsWith(reason, arrival.Reason);
        Assert.Empty(sweep.Activities(name));
    }

    [Theory]
    [InlineData("r005.fit", "byte 771: 83 bytes behind the last whole part")]
    [InlineData("r019.fit", "byte 1540: wrong checksum")]
    [InlineData("r020.fit", "byte 786: cut short")]
    public void WholePartsOfDamagedFilesCountAndTheDamageIsNamed(string name, string reason)
    {
        var arrival = sweep.Arrival(name);
        Assert.Equal((ArrivalState.Stored, RealSweep.PersonOf(name)), (arrival.State, arrival.Person));
        Assert.StartsWith(reason, arrival.Reason);
        Assert.Single(sweep.Activities(name));
    }

    [Theory]
    [InlineData("r026.fit")]
    [InlineData("r044.fit")]
    public void SettingsAreSetAside(string name) =>
        Assert.Equal((ArrivalState.Aside, "no training in it: settings"), (sweep.Arrival(name).State, sweep.Arrival(name).Reason));

    [Theory]
    [InlineData("r037.fit")]
    [InlineData("r051.fit")]
    public void RecordingsWithoutADateAreHeld(string name)
    {
        Assert.Equal(ArrivalState.Held, sweep.Arrival(name).State);
        Assert.StartsWith("no date", sweep.Arrival(name).Reason);
    }

    [Theory]
    [InlineData("r014.fit")]
    [InlineData("r035.fit")]
    [InlineData("r001.fit")]
    [InlineData("r049.fit")]
    public void WithoutAHeartRateThereIsNoTrainingImpulseRatherThanAZero(string name)
    {
        Assert.Equal(ArrivalState.Stored, sweep.Arrival(name).State);
        var activity = Assert.Single(sweep.Activities(name));
        Assert.DoesNotContain(activity.GetProperty("quantities").EnumerateArray(), quantity => quantity.GetProperty("name").GetString() == "banister_trimp");
        Assert.Equal(JsonValueKind.Null, activity.GetProperty("heart_rate_mean_bpm").ValueKind);
    }

    /// <summary>Seen in the files: a strap that was never worn, one that found the heart late, a ride with two stops, a speed that came and went.</summary>
    [Theory]
    [InlineData("r001.fit", "heart_rate", "out_of_range", 1)]
    [InlineData("r049.fit", "heart_rate", "out_of_range", 1)]
    [InlineData("r033.fit", "heart_rate", "spike", 0.0016)]
    [InlineData("r006.fit", null, "timer_stopped", 0.1175)]
    [InlineData("r011.fit", "speed", "no_reading", 0.9362)]
    public void WhatIsCutOfRealRecordingsIsTold(string name, string? channel, string reason, double share)
    {
        sweep.Arrival(name);
        var cuts = Assert.Single(sweep.Activities(name)).GetProperty("cuts").EnumerateArray()
            .Where(cut => cut.GetProperty("channel").GetString() == channel && cut.GetProperty("reason").GetString() == reason);
        Assert.Equal(share, cuts.Sum(cut => cut.GetProperty("share").GetDouble()), 1e-4);
    }

    /// <summary>The stops told by the timer's own events are the difference of the totals that the device states, but for the second at either end.</summary>
    [Theory]
    [InlineData("r006.fit")]
    [InlineData("r015.fit")]
    [InlineData("r033.fit")]
    [InlineData("r042.fit")]
    public void TheTimeWithoutTimerIsTheDifferenceOfTheDevicesTotals(string name)
    {
        sweep.Arrival(name);
        var activity = Assert.Single(sweep.Activities(name));
        var stood = activity.GetProperty("cuts").EnumerateArray().Where(cut => cut.GetProperty("reason").GetString() == "timer_stopped").Sum(cut => cut.GetProperty("seconds").GetDouble());
        Assert.Equal(activity.GetProperty("elapsed_s").GetDouble() - activity.GetProperty("timer_s").GetDouble(), stood, 0.1 * stood);
    }

    [Fact]
    public void EveryOtherFileIsStoredWithEveryRecording()
    {
        string[] others = ["r004", "r012", "r013", "r021", "r023", "r026", "r044", "r037", "r051"];
        foreach (var file in RealSweep.Names.Where(name => !others.Contains(name[..4], StringComparer.Ordinal)))
        {
            Assert.Equal((file, ArrivalState.Stored), (file, sweep.Arrival(file).State));
            Assert.Equal((file, FitDecoder.Decode(RealFiles.Bytes(file)).Recordings.Count), (file, sweep.Activities(file).Sum(activity => activity.GetProperty("recordings").GetArrayLength())));
        }
    }

    [Fact]
    public void TheSameRecordingInTwoFilesOfOnePersonIsOneActivity()
    {
        RealFiles.Get("r045.fit");
        using var folder = new WorkingFolder();
        folder.Put("anna/r005.fit", RealFiles.Bytes("r005.fit"));
        folder.Put("anna/r045.fit", RealFiles.Bytes("r045.fit"));
        folder.Sweep();
        Assert.All(folder.Arrivals(), arrival => Assert.Equal(ArrivalState.Stored, arrival.State));
        Assert.Equal(2, folder.Arrivals().Count);
        var activity = JsonDocument.Parse(Assert.Single(folder.Export("activities").Split('\n', StringSplitOptions.RemoveEmptyEntries))).RootElement;
        Assert.Equal(2, activity.GetProperty("recordings").GetArrayLength());
    }

    [Fact]
    public void AnotherSweepAndARebuildChangeNothing()
    {
        var before = sweep.Folder.Export();
        sweep.Folder.Sweep();
        Assert.Equal(before, sweep.Folder.Export());
        sweep.Folder.Rebuild();
        Assert.Equal(before, sweep.Folder.Export());
    }
}

/// <summary>The swept folder, made once for the class.</summary>
public sealed class RealSweep : IDisposable
{
    private readonly Lazy<WorkingFolder> folder = new(Swept);
    private readonly Lazy<ILookup<string, JsonElement>> activities;

    public RealSweep() => activities = new(() => Folder.Export("activities")
        .Split('\n', StringSplitOptions.RemoveEmptyEntries)
        .Select(line => JsonDocument.Parse(line).RootElement)
        .ToLookup(activity => activity.GetProperty("person").GetString()!, StringComparer.Ordinal));

    internal WorkingFolder Folder => folder.Value;

    internal static IEnumerable<string> Names => RealFiles.Paths.Select(path => Path.GetFileName(path));

    internal static string PersonOf(string name) => $"p-{Path.GetFileNameWithoutExtension(name)}";

    /// <summary>Skips where the real files are not on the machine.</summary>
    internal Arrival Arrival(string name)
    {
        RealFiles.Get(name);
        return Folder.Arrival(RealFiles.Bytes(name))!;
    }

    internal IEnumerable<JsonElement> Activities(string name) => activities.Value[PersonOf(name)];

    public void Dispose()
    {
        if (folder.IsValueCreated)
        {
            Folder.Dispose();
        }
    }

    private static WorkingFolder Swept()
    {
        RealFiles.Get("r001.fit");
        var people = RealFiles.Paths.Select(path => PersonOf(Path.GetFileName(path))).ToList();
        var roster = new StringBuilder("person,name,group,birth_year,sex,time_zone\n").AppendJoin("", people.Select(person => $"{person},{person},squad,1990,m,UTC\n"));
        var anchors = new StringBuilder("person,date,anchor,value,unit,source,exercise\n")
            .AppendJoin("", people.Select(person => $"{person},,heart_rate_rest,50,bpm,,\n{person},,heart_rate_max,190,bpm,,\n"));
        var filled = new WorkingFolder(roster: roster.ToString(), anchors: anchors.ToString());
        filled.Fill(RealFiles.Paths.Select(path => ($"{PersonOf(Path.GetFileName(path))}/{Path.GetFileName(path)}", File.ReadAllBytes(path))));
        filled.Sweep();
        return filled;
    }
}
