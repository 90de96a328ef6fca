using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-4 where the inbox or an earlier sweep matters. All places, and kills at any moment, are the chaos runner's.</summary>
public sealed class KillTests : IDisposable
{
    private static readonly Lazy<string> Undisturbed = new(() =>
    {
        using var folder = new WorkingFolder();
        FillTwoNights(folder);
        folder.Sweep();
        return folder.Everything();
    });

    private readonly WorkingFolder leaving = new();
    private readonly WorkingFolder moving = new(take: "move");

    public void Dispose()
    {
        leaving.Dispose();
        moving.Dispose();
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
}
