using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-5 for everything that tables tell: a rebuild ends with the same rows, and the order in which files came does not matter.</summary>
public sealed class TablesRebuildTests : IDisposable
{
    private const string Layout = """
        "layouts": [{
          "name": "tracking", "header": ["player", "moment"], "person_column": "player", "time": { "column": "moment" }, "sport": "soccer",
          "columns": [{ "column": "hr", "channel": "heart_rate", "unit": "bpm" }]
        }]
        """;

    private static readonly Duration Age = Duration.FromHours(12);

    private readonly WorkingFolder folder = Configured();

    public TablesRebuildTests()
    {
        folder.Fill(Files());
        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ARebuildEndsWithTheSameExports()
    {
        var before = folder.Everything();
        Assert.Contains("\"tables\":[\"sessions\"]", before, StringComparison.Ordinal);
        Assert.Contains("planned session left out", before, StringComparison.Ordinal);
        Assert.Equal("bo", folder.Arrival(Some.Fit(Nights.Date(10), 40))!.Person);

        folder.Rebuild();

        Assert.Equal(before, folder.Everything());
        Assert.Equal(0, folder.Sweep().PeopleComputed);
        Assert.Equal(before, folder.Everything());
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void TheOrderInWhichFilesComeDoesNotMatter(int seed)
    {
        using var other = Configured();
        var random = new Random(seed);
        var files = Files().OrderBy(file => file.Path, StringComparer.Ordinal).ToList();
        var shuffled = files.OrderBy(_ => random.Next()).ToList();
        foreach (var (night, at) in shuffled.Chunk((shuffled.Count / 4) + 1).Select((night, at) => (night, at)))
        {
            foreach (var (path, bytes) in night)
            {
                other.Put(path, bytes, Age);
            }

            other.Sweep(WorkingFolder.Now - Duration.FromHours(4 - at));
        }

        other.Sweep();
        Assert.Equal(folder.Rows(), other.Rows());
        Assert.Equal(folder.Export("arrivals"), other.Export("arrivals"));
        Assert.Equal(folder.Computed(), other.Computed());
    }

    private static WorkingFolder Configured()
    {
        var configured = new WorkingFolder();
        configured.Configure(Layout);
        return configured;
    }

    private static IReadOnlyList<(string Path, byte[] Bytes)> Files() => FortnightTables.Files(lightGroup: "squad");
}
