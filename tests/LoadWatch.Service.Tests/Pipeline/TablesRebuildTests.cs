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

    private static IReadOnlyList<(string Path, byte[] Bytes)> Files() =>
    [
        .. Some.Fortnight(),
        ("squad.csv", Squad()),
        ("sets.csv", Table("date,person,exercise,set,repetitions,kilograms,reserve", "2026-06-02,bo,leg_press,1,5,80,2", "2026-06-11,bo,leg_press,1,5,85,2")),
        ("cara/sessions.csv", Table("date,minutes,rating,sport", "2026-06-03,40,5,cycling", "2026-06-08,,6,cycling")),
        ("ratings.csv", Table("date,person,start,sport,minutes,rating", "2026-06-06,anna,12:00,cycling,3,7", "2026-06-12,Anna Ahola,,soccer,60,4")),
        ("tests.csv", Table("date,person,test,value,unit,exercise", "2026-06-07,anna,heart_rate_max,188,bpm,", "2026-06-05,bo,one_repetition_max,110,kg,leg_press")),
        ("days.csv", Table("date,person,day", "2026-06-09,cara,rest", "2026-06-10,bo,ill")),
        ("plan.csv", Table("from,group,until,plan,start,end,recording,sport", "2026-06-13,squad,,team_session,12:00,12:10,no,soccer", "2026-06-01,squad,2026-06-04,light_week,,,no,")),
        ("answers.csv", Table("date,person,answer,until,file", "2026-06-04,bo,belongs_to,,nobody.fit", "2026-06-02,cara,away,2026-06-04,")),
    ];

    private static byte[] Table(params string[] lines) => Some.Text(string.Join('\n', lines) + "\n");

    /// <summary>Forty minutes of two people and of somebody unknown.</summary>
    private static byte[] Squad() => Table(
    [
        "player,moment,hr",
        .. new[] { "anna", "bo", "stranger" }.SelectMany(player => Enumerable.Range(0, 241).Select(at =>
            $"{player},{(Nights.Date(1) + new LocalTime(12, 0)).PlusSeconds(10 * at):uuuu-MM-dd'T'HH:mm:ss}Z,{130 + (at % 7)}")),
    ]);
}
