using System.Globalization;
using System.Text;
using System.Text.Json.Nodes;
using LoadWatch.Recordings;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>A season in one CSV, of more rows than are held at once, gives what its sessions give as files of their own (I-11), and stays one content (I-1, I-4, I-5).</summary>
public sealed class LongCsvTests : IDisposable
{
    private const int Sessions = 21;
    private const int RowsOfSession = 100_000;
    private const string Names = "time,heart_rate_bpm,speed_m_s\n";

    private static readonly IReadOnlyList<string> Pieces = [.. Enumerable.Range(0, Sessions).Select(Session)];
    private static readonly byte[] Season = Some.Text(Names + string.Concat(Pieces));

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ItGivesWhatItsSessionsGiveAsFilesOfTheirOwn()
    {
        using var apart = new WorkingFolder();
        for (var session = 0; session < Sessions; session++)
        {
            apart.Put($"anna/{session:00}.csv", Some.Text(Names + Pieces[session]));
        }

        folder.Put("anna/season.csv", Season);
        AssertSameAfterASweep(apart);
        Assert.Equal(Sessions, Activities(folder).Count());

        // Power that the file lacks: sessions are read back from it one by one, in the second sweep from the archive.
        foreach (var place in new[] { apart, folder })
        {
            place.Put("anna/a.fit", Some.Fit(Date(3)));
            place.Put("anna/b.fit", Some.Fit(Date(17), minutesAfterNoon: 20));
        }

        AssertSameAfterASweep(apart);
        Assert.Contains("\"power", folder.Export("activities"), StringComparison.Ordinal);

        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());

        // Another reference value computes it again.
        foreach (var place in new[] { apart, folder })
        {
            place.Write("anchors.csv", WorkingFolder.Anchors + "anna,2026-01-02,heart_rate_max,181,bpm,,\n");
        }

        AssertSameAfterASweep(apart);
        Assert.NotEqual(before, folder.Export());
    }

    [Fact]
    public void AllOfItsSessionsComeInOneCommit()
    {
        folder.Put("anna/season.csv", Season);
        string[] sweep = ["sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText];

        Assert.NotEqual(0, Loadwatch.RunAndKillAt("decoded", sweep).Code);
        Assert.Equal(ArrivalState.Waiting, Assert.Single(folder.Arrivals()).State);
        Assert.Empty(folder.Export("activities"));

        var ended = Loadwatch.Run(sweep);
        Assert.True(ended.Code == 0, ended.Output + ended.Errors);
        using var undisturbed = new WorkingFolder();
        undisturbed.Put("anna/season.csv", Season);
        undisturbed.Sweep();
        Assert.Equal(undisturbed.Export(), folder.Export());
    }

    [Fact]
    public void InAZipFileItIsTheSame()
    {
        using var packed = new WorkingFolder(intake: "\"largest_file_megabytes\": 128");
        packed.Put("anna/season.zip", Some.Zip(("season.csv", Season)));
        packed.Put("anna/a.fit", Some.Fit(Date(3)));
        folder.Put("anna/season.csv", Season);
        folder.Put("anna/a.fit", Some.Fit(Date(3)));

        AssertSameAfterASweep(packed);
    }

    private void AssertSameAfterASweep(WorkingFolder other)
    {
        other.Sweep();
        folder.Sweep();
        Assert.Equal(other.Export("days"), folder.Export("days"));
        Assert.Equal(Activities(other), Activities(folder));
    }

    /// <summary>Which content and which recording of it an activity was made of differs, nothing else.</summary>
    private static IEnumerable<string> Activities(WorkingFolder place) => place.Export("activities").Split('\n', StringSplitOptions.RemoveEmptyEntries).Select(line =>
    {
        var activity = JsonNode.Parse(line)!.AsObject();
        activity.Remove("recordings");
        return activity.ToJsonString();
    });

    private static LocalDate Date(int session) => Some.Yesterday.PlusDays(session - Sessions + 1);

    /// <summary>Twenty rows a second from noon on, for 83 min.</summary>
    private static string Session(int session)
    {
        var text = new StringBuilder();
        var start = (Date(session) + new LocalTime(12, 0)).InUtc().ToDateTimeUtc();
        for (var row = 0; row < RowsOfSession; row++)
        {
            text.Append(CultureInfo.InvariantCulture, $"{start.AddMilliseconds(row * 50.0):yyyy-MM-dd'T'HH:mm:ss.fff'Z'},{120 + (row / 1_200 % 40) + (session % 5)},{2 + (row / 900 % 30 / 10.0)}\n");
        }

        return text.ToString();
    }
}
