using System.Text.Json;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-5: what is derived can be dropped, and neither order nor names nor packing matter.</summary>
public sealed class RebuildTests : IDisposable
{
    private static readonly string[] Derived = ["activities", "days", "findings", "alerts"];

    private readonly WorkingFolder folder = new();

    public RebuildTests()
    {
        folder.Fill(Some.Fortnight());

        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ARebuildEndsWithTheSameRows()
    {
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
        Assert.Contains("\"rule\":\"silence\"", before, StringComparison.Ordinal);
        folder.Sweep();
        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void EmptiedTablesAreFilledAgainByTheNextSweep()
    {
        var before = folder.Everything();
        using (var workplace = Workplace.OpenToWork(folder.ConfigPath))
        {
            workplace.Store.Write(session => session.Derived.Empty());
        }

        Assert.Empty(folder.Export("activities"));
        folder.Sweep();
        Assert.Equal(before, folder.Everything());
    }

    [Fact]
    public void AnotherHighestHeartRateChangesTheLoads()
    {
        var before = Loads("anna");
        var bo = Loads("bo");
        folder.Write("anchors.csv", WorkingFolder.Anchors.Replace("heart_rate_max,190", "heart_rate_max,170", StringComparison.Ordinal));
        folder.Sweep();
        var after = Loads("anna");
        Assert.Equal(8, before.Count);
        Assert.Equal(before.Keys, after.Keys);
        Assert.All(before, day => Assert.True(after[day.Key] > day.Value * 1.2, $"{day} and {after[day.Key]}"));
        Assert.Equal(bo, Loads("bo"));
        folder.Write("anchors.csv", WorkingFolder.Anchors);
        folder.Sweep();
        Assert.Equal(before, Loads("anna"));
    }

    [Fact]
    public void NeitherOrderNorNamesNorFoldersNorPackingMatter()
    {
        using var other = new WorkingFolder();
        var files = Some.Fortnight().Where(file => !file.Path.EndsWith(".zip", StringComparison.Ordinal)).Reverse().ToList();
        foreach (var (group, at) in files.Chunk(5).Select((group, at) => (group, at)))
        {
            foreach (var ((path, bytes), i) in group.Select((file, i) => (file, i)))
            {
                Disguise(other, path, bytes, at, i);
            }

            other.Sweep(WorkingFolder.Now - Duration.FromMinutes(50 - at));
        }

        foreach (var (path, bytes) in new[] { ("bo/x/y.fit", Some.Fit(Some.Yesterday.PlusDays(-13), 30)), ("bo/z.csv", Some.Csv(Some.Yesterday.PlusDays(-12), 30)), ("bo/w.fit", Some.Fit(Some.Yesterday.PlusDays(-9), 30)) })
        {
            other.Put(path, bytes, Duration.FromHours(2));
        }

        other.Sweep();
        Assert.All(Derived, table => Assert.Equal(WithoutFiles(folder, table), WithoutFiles(other, table)));
        Assert.All(Derived, table => Assert.NotEmpty(other.Export(table)));
        Assert.Equal(States(folder), States(other));
    }

    /// <summary>The same content under another name, in other folders of the person, packed or bare.</summary>
    private static void Disguise(WorkingFolder other, string path, byte[] bytes, int group, int i)
    {
        var owner = path.Contains('/') ? path[..path.IndexOf('/')] + "/" : "";
        var age = Duration.FromHours(2);
        switch (i % 3)
        {
            case 0:
                other.Put($"{owner}{group}/deep/{9 - i}.bin", bytes, age);
                break;
            case 1:
                other.Put($"{owner}pack {group}{i}.zip", Some.Zip(($"in/{i}.dat", bytes)), age);
                break;
            default:
                other.Put($"{owner}{group}{i}.gz", Some.Gzip(bytes), age);
                break;
        }
    }

    private static string WithoutFiles(WorkingFolder folder, string table) =>
        System.Text.RegularExpressions.Regex.Replace(folder.Export(table), "\"file\":\"[^\"]*\"", "\"file\":\"\"", System.Text.RegularExpressions.RegexOptions.None, TimeSpan.FromSeconds(5));

    /// <summary>States of what is no container.</summary>
    private static IEnumerable<(string, ArrivalState, string?, string?)> States(WorkingFolder folder) =>
        folder.Arrivals().Where(arrival => arrival.Kind is not ("gzip" or "zip")).Select(arrival => (arrival.Sha, arrival.State, arrival.Reason, arrival.Person));

    private Dictionary<string, double> Loads(string person) => folder.Export("days")
        .Split('\n', StringSplitOptions.RemoveEmptyEntries)
        .Select(line => JsonDocument.Parse(line).RootElement)
        .Where(day => day.GetProperty("person").GetString() == person && day.GetProperty("state").GetString() == "recorded")
        .ToDictionary(day => day.GetProperty("date").GetString()!, day => day.GetProperty("load").GetDouble(), StringComparer.Ordinal);
}
