using System.Text.RegularExpressions;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-4: the process is killed at named places and at any moment; the next sweep ends where an undisturbed one does.</summary>
public sealed partial class KillTests : IDisposable
{
    private const int Kills = 10;
    private const int MostMilliseconds = 500;

    private static readonly string[] Points = ["archived", "waiting", "decoded", "settled", "rows", "evaluated", "delivered"];

    private static readonly Lazy<string> Undisturbed = new(() =>
    {
        using var folder = new WorkingFolder();
        FillTwoNights(folder);
        folder.Sweep();
        return folder.Everything();
    });

    private readonly WorkingFolder leaving = new();
    private readonly WorkingFolder moving = new(take: "move");

    public static TheoryData<string> KillPoints => [.. Points];

    public void Dispose()
    {
        leaving.Dispose();
        moving.Dispose();
    }

    [Theory]
    [MemberData(nameof(KillPoints))]
    public void AKillAtANamedPlaceLosesAndDoublesNothing(string point)
    {
        FillTwoNights(leaving);
        Assert.NotEqual(0, Loadwatch.RunAndKillAt(point, Sweep(leaving)).Code);
        AssertDone(Loadwatch.Run(Sweep(leaving)));
        AssertEndsWell(leaving, Undisturbed.Value);
        Assert.Contains("\"name\":\"kilograms\",\"value\":800", leaving.Export("activities"), StringComparison.Ordinal);
        Assert.Equal(leaving.InboxHashes(), leaving.ArchiveHashes());
    }

    [Theory]
    [InlineData("archived")]
    [InlineData("waiting")]
    [InlineData("decoded")]
    public void AKnownFileUnderANewNameIsJudgedAnewAfterAKill(string point)
    {
        leaving.Put("lost.csv", "time,heart_rate_bpm\n2026-06-13T10:00:00Z,120\n2026-06-13T10:00:05Z,121\n"u8.ToArray());
        leaving.Sweep();
        leaving.Put("anna/lost.csv", "time,heart_rate_bpm\n2026-06-13T10:00:00Z,120\n2026-06-13T10:00:05Z,121\n"u8.ToArray());
        Assert.Contains("\"state\":\"held\"", leaving.Export("arrivals"), StringComparison.Ordinal);

        Assert.NotEqual(0, Loadwatch.RunAndKillAt(point, Sweep(leaving)).Code);
        AssertDone(Loadwatch.Run(Sweep(leaving)));

        Assert.Contains("\"state\":\"stored\",\"reason\":null,\"person\":\"anna\"", leaving.Export("arrivals"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("waiting")]
    [InlineData("settled")]
    public void AKillBeforeTheInboxIsEmptiedLeavesTheRestToTheNextSweep(string point)
    {
        FillTwoNights(moving);
        var hashes = moving.InboxHashes();
        Assert.NotEqual(0, Loadwatch.RunAndKillAt(point, Sweep(moving)).Code);
        Assert.Equal(hashes, moving.InboxHashes());
        AssertDone(Loadwatch.Run(Sweep(moving)));
        AssertEndsWell(moving, Undisturbed.Value);
        Assert.Subset(moving.ArchiveHashes().ToHashSet(StringComparer.Ordinal), hashes.ToHashSet(StringComparer.Ordinal));
        Assert.Empty(moving.InboxHashes());
    }

    [Fact]
    public void KillsAtAnyMomentLoseAndDoubleNothing()
    {
        var files = Sixty();
        leaving.Fill(files);
        var random = new Random(20260615);
        var killed = 0;
        for (var i = 0; i < Kills; i++)
        {
            using var child = Loadwatch.Start(Sweep(leaving));
            if (IsAtWork(child) && !child.EndsWithin(TimeSpan.FromMilliseconds(random.Next(MostMilliseconds))))
            {
                child.Kill();
                killed++;
            }
        }

        Assert.True(killed > 2, $"all but {killed} sweeps were faster than the kill");
        AssertDone(Loadwatch.Run(Sweep(leaving)));
        AssertEndsWell(leaving, SweptOnce(files));
        Assert.Equal(leaving.InboxHashes(), leaving.ArchiveHashes());
    }

    [Fact]
    public void EveryKillPointOfTheSourceIsTried()
    {
        var source = Repository.Folder("src", "LoadWatch.Service");
        var named = Directory.EnumerateFiles(source, "*.cs", SearchOption.AllDirectories)
            .SelectMany(path => KillPointCall().Matches(File.ReadAllText(path)))
            .Select(match => match.Groups["name"].Value);
        Assert.Equal(Points.Order(StringComparer.Ordinal), named.Order(StringComparer.Ordinal));
    }

    /// <summary>Waits until the child holds the lock; false when it ended before.</summary>
    private bool IsAtWork(Loadwatch child)
    {
        var id = child.Id.ToString(System.Globalization.CultureInfo.InvariantCulture);
        while (leaving.LockHolder() != id)
        {
            if (child.EndsWithin(TimeSpan.FromMilliseconds(2)))
            {
                return false;
            }
        }

        return true;
    }

    private static string[] Sweep(WorkingFolder folder) => ["sweep", "--config", folder.ConfigPath, "--as-of", WorkingFolder.NowText];

    private static void AssertDone(Ended ended) => Assert.True(ended.Code == 0, ended.Output + ended.Errors);

    private static void AssertEndsWell(WorkingFolder folder, string undisturbed)
    {
        Assert.Equal(undisturbed, folder.Everything());
        Assert.Contains("\"rule\":\"silence\"", folder.Export("alerts"), StringComparison.Ordinal);
        Assert.Empty(WorkingFolder.Files(Path.Combine(folder.Data, "archive", "incoming")));
        Assert.DoesNotContain(WorkingFolder.Files(folder.Root), path => path.EndsWith(".part", StringComparison.Ordinal) || path.EndsWith(".tmp", StringComparison.Ordinal));
        Assert.Equal(1, folder.NoticeText.Split("[staff|brief|2026-06-15]").Length - 1);
    }

    /// <summary>All files but the last are in since yesterday; the last wait in the inbox, and tonight an alert and a brief are due.</summary>
    private static void FillTwoNights(WorkingFolder folder)
    {
        var last = Some.LastNight();
        folder.Fill(Some.Fortnight().SkipLast(last.Count));
        folder.Sweep(WorkingFolder.Now - Duration.FromDays(1));
        Assert.Empty(folder.Export("alerts"));
        folder.Fill(last);
        folder.Fill(
        [
            ("sets.csv", Some.Text("date,person,exercise,set,repetitions,kilograms\n2026-06-13,bo,leg_press,1,10,80\n")),
            ("plan.csv", Some.Text("from,person,plan,start,end\n2026-06-13,bo,class,10:00,11:00\n")),
        ]);
    }

    private static string SweptOnce(IReadOnlyList<(string Path, byte[] Bytes)> files)
    {
        using var folder = new WorkingFolder();
        folder.Fill(files);
        folder.Sweep();
        return folder.Everything();
    }

    /// <summary>More than go into one group of files, so that kills also fall between groups.</summary>
    private static List<(string Path, byte[] Bytes)> Sixty() =>
    [
        .. Some.Fortnight(),
        .. Enumerable.Range(0, 48).Select(i => ($"cara/more {i}.fit", Some.Fit(Some.Yesterday.PlusDays(-i), 60, 100 + i))),
    ];

    [GeneratedRegex("KillPoint\\.Pass\\(\"(?<name>[a-z]+)\"\\)", RegexOptions.ExplicitCapture, matchTimeoutMilliseconds: 1000)]
    private static partial Regex KillPointCall();
}
