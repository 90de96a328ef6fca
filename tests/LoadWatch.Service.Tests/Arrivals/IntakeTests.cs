using System.Diagnostics;
using LoadWatch.Notices;
using LoadWatch.Recordings;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Arrivals;

public sealed class IntakeTests : IDisposable
{
    private static readonly Duration JustNow = Duration.FromSeconds(10);

    private readonly WorkingFolder folder = new(intake: "\"settle_seconds\": 60, \"largest_file_megabytes\": 1");

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ACsvIsTakenOnlyAfterItHasStoodStill()
    {
        folder.Put("anna/ride.csv", Some.Csv(Some.Yesterday), JustNow);
        Assert.Equal(1, folder.Sweep().Settling);
        Assert.Empty(folder.Arrivals());
        Assert.Equal(1, folder.Sweep(WorkingFolder.Now + Duration.FromSeconds(49)).Settling);
        Assert.Empty(folder.Arrivals());
        Assert.Equal(0, folder.Sweep(WorkingFolder.Now + Duration.FromSeconds(50)).Settling);
        Assert.Equal(ArrivalState.Stored, Assert.Single(folder.Arrivals()).State);
    }

    [Fact]
    public void TheSameBytesInGroupsBehindEachOtherAreClaimedByBoth()
    {
        var twice = Some.Fit(Some.Yesterday, 1);
        folder.Fill(Enumerable.Range(0, 63).Select(number => ($"anna/{number:00}.fit", Some.Fit(Some.Yesterday.PlusDays(-number), 2))));
        folder.Put("anna/zz.fit", twice);
        folder.Put("bo/00.fit", twice);
        folder.Put("bo/01.fit", Some.Fit(Some.Yesterday, 3));

        folder.Sweep();

        Assert.Equal((ArrivalState.Held, "claimed by anna and bo"), (folder.Arrival(twice)!.State, folder.Arrival(twice)!.Reason));
        Assert.Equal(64, folder.Arrivals().Count(arrival => arrival.State == ArrivalState.Stored));
        Assert.Equal(66, folder.Read((_, session) => session.Sightings.CountLatest("inbox")));
    }

    [Fact]
    public void AWholeFitFileIsTakenAtOnce()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday), Duration.Zero);
        folder.Put("anna/packed.fit.gz", Some.Gzip(Some.Fit(Some.Yesterday, 10)), Duration.Zero);
        folder.Put("anna/pack.zip", Some.Zip(("ride.fit", Some.Fit(Some.Yesterday, 20))), Duration.Zero);
        Assert.Equal((0, 3), (folder.Sweep().Settling, folder.Arrivals().Count(arrival => arrival.State == ArrivalState.Stored)));
    }

    [Fact]
    public void ACutFitFileWaitsAndIsThenRefusedWithTheByte()
    {
        var cut = Some.Fit(Some.Yesterday)[..^100];
        folder.Put("anna/ride.fit", cut, JustNow);
        Assert.Equal(1, folder.Sweep().Settling);
        Assert.Empty(folder.Arrivals());
        Assert.Empty(folder.ArchiveNames());
        folder.Sweep(WorkingFolder.Now + Duration.FromSeconds(50));
        var arrival = folder.Arrival(cut)!;
        Assert.Equal(ArrivalState.Refused, arrival.State);
        Assert.StartsWith($"byte {cut.Length}: cut short", arrival.Reason);
    }

    [Fact]
    public void ACutFileThatGrowsWholeIsStored()
    {
        var whole = Some.Fit(Some.Yesterday);
        folder.Put("anna/ride.fit", whole[..^100], JustNow);
        folder.Sweep();
        folder.Put("anna/ride.fit", whole, JustNow);
        folder.Sweep();
        Assert.Equal((WorkingFolder.Sha(whole), ArrivalState.Stored), (Assert.Single(folder.Arrivals()).Sha, folder.Arrivals()[0].State));
    }

    [Fact]
    public void BytesBehindTheLastPartWaitAndAreThenNamedWhileTheRecordingCounts()
    {
        var whole = Some.Fit(Some.Yesterday);
        byte[] longer = [.. whole, 1, 2, 3];
        folder.Put("anna/ride.fit", longer, JustNow);
        Assert.Equal(1, folder.Sweep().Settling);
        folder.Sweep(WorkingFolder.Now + Duration.FromSeconds(50));
        var arrival = folder.Arrival(longer)!;
        Assert.Equal(ArrivalState.Stored, arrival.State);
        Assert.StartsWith($"byte {whole.Length}: 3 bytes behind the last whole part", arrival.Reason);
    }

    [Fact]
    public void AnInboxThatIsTakenFromIsEmptyAndTheArchiveHoldsWhatWasThere()
    {
        using var moving = new WorkingFolder(take: "move");
        moving.Fill(Some.Fortnight());

        using var leaving = new WorkingFolder();
        leaving.Fill(Some.Fortnight());

        var hashes = moving.InboxHashes();
        moving.Sweep();
        leaving.Sweep();
        Assert.Empty(moving.InboxHashes());
        Assert.Equal(hashes, moving.ArchiveHashes());
        Assert.NotEmpty(leaving.InboxHashes());
        Assert.Equal(leaving.Export(), moving.Export());
    }

    [Fact]
    public void AFileSentAgainToAnInboxThatIsTakenFromGoesTooAndCountsOnce()
    {
        using var moving = new WorkingFolder(take: "move");
        var ride = Some.Fit(Some.Yesterday);
        moving.Put("anna/ride.fit", ride);
        moving.Sweep();
        var before = moving.Export();
        moving.Put("anna/ride.fit", ride);
        moving.Sweep();
        Assert.Empty(moving.InboxHashes());
        Assert.Equal(before, moving.Export());
    }

    [Fact]
    public void AFileThatStoodBeforeTheInboxWasTakenFromGoesAsWell()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        folder.Write("loadwatch.json", File.ReadAllText(folder.ConfigPath).Replace("\"leave\"", "\"move\"", StringComparison.Ordinal));
        folder.Sweep();
        Assert.Empty(folder.InboxHashes());
        Assert.Single(folder.ArchiveNames());
    }

    [Fact]
    public void UnfinishedAndHiddenNamesArePassedOver()
    {
        string[] names = ["ride.fit.part", "ride.fit.tmp", "ride.crdownload", ".ride.fit", ".trash/ride.fit", "~$ride.csv", "Ride.FIT.PART"];
        foreach (var (name, i) in names.Select((name, i) => (name, i)))
        {
            folder.Put($"anna/{name}", Some.Fit(Some.Yesterday, i));
        }

        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday, 30));
        Assert.Equal(1, folder.Sweep().Seen);
        Assert.Single(folder.Arrivals());
    }

    [Fact]
    public void PipesLinksAndFoldersArePassedOver()
    {
        Assert.SkipUnless(OperatingSystem.IsLinux(), "pipes and links are made on Linux only");
        using var elsewhere = new WorkingFolder();
        var ride = folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        var other = elsewhere.Put("secret.fit", Some.Fit(Some.Yesterday, 10));
        Directory.CreateDirectory(Path.Combine(folder.Inbox, "anna", "folder.fit"));
        File.CreateSymbolicLink(Path.Combine(folder.Inbox, "anna", "link.fit"), other);
        File.CreateSymbolicLink(Path.Combine(folder.Inbox, "anna", "near.fit"), ride);
        Directory.CreateSymbolicLink(Path.Combine(folder.Inbox, "anna", "linked"), elsewhere.Inbox);
        using var made = Process.Start("mkfifo", Path.Combine(folder.Inbox, "anna", "pipe.fit"));
        made.WaitForExit();
        Assert.Equal(0, made.ExitCode);
        folder.Sweep();
        Assert.Equal([WorkingFolder.Sha(File.ReadAllBytes(ride))], folder.ArchiveNames());
        Assert.Single(folder.Arrivals());
    }

    [Fact]
    public void AFileLargerThanTheLimitIsReportedAndStopsNothing()
    {
        folder.Put("anna/huge.fit", new byte[(1024 * 1024) + 1]);
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        Assert.Equal(new BriefLine("anna/huge.fit", "larger than 1 MB"), Assert.Single(folder.Sweep().Unreadable));
        Assert.Equal(ArrivalState.Stored, Assert.Single(folder.Arrivals()).State);
        Assert.Single(folder.ArchiveNames());
    }

    [Fact]
    public void AFileInAContainerMayBeAsLargeAsAFileElsewhere()
    {
        // The settings say 1 MB.
        var small = Some.Gzip(new byte[900_000]);
        var large = Some.Gzip(new byte[1_100_000]);
        folder.Put("anna/small.gz", small);
        folder.Put("anna/large.gz", large);

        folder.Sweep();

        Assert.Equal(ArrivalState.Aside, folder.Arrival(small)!.State);
        Assert.Equal((ArrivalState.Refused, "byte 10: unpacks to more than 1048576 bytes"), (folder.Arrival(large)!.State, folder.Arrival(large)!.Reason));
    }

    [Fact]
    public void AnInboxThatGoesMissingIsReportedAndTheDaysGoOn()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        Directory.Move(folder.Inbox, folder.Inbox + " away");
        Assert.Equal(["inbox"], workplace.NewSweep(WorkingFolder.Now + Duration.FromDays(2)).Run(TestContext.Current.CancellationToken).MissingInboxes);
        Directory.Move(folder.Inbox + " away", folder.Inbox);
        Assert.Equal(3, folder.Export("days").Split('\n', StringSplitOptions.RemoveEmptyEntries).Length);
    }
}
