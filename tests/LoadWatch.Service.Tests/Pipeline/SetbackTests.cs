using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>What goes wrong with one thing stays with that thing (I-10), and what is put right is taken up by itself.</summary>
public sealed class SetbackTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AFileMovedOutOfTheWrongFolderBelongsToItsOwner()
    {
        var ride = Some.Fit(Some.Yesterday);
        var wrong = folder.Put("anna/ride.fit", ride);
        folder.Sweep();
        folder.Put("bo/ride.fit", ride);
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, folder.Arrival(ride)!.State);

        File.Delete(wrong);
        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, "bo"), (folder.Arrival(ride)!.State, folder.Arrival(ride)!.Person));
        Assert.Contains("\"file\":\"bo/ride.fit\"", folder.Export("arrivals"), StringComparison.Ordinal);
        Assert.DoesNotContain("\"person\":\"anna\"", folder.Export("activities"), StringComparison.Ordinal);
    }

    [Fact]
    public void AnArchiveMovedOutOfTheWrongFolderBelongsToItsOwner()
    {
        var ride = Some.Fit(Some.Yesterday);
        var zip = Some.Zip(("ride.fit", ride));
        var wrong = folder.Put("anna/week.zip", zip);
        folder.Put("bo/week.zip", zip);
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, folder.Arrival(ride)!.State);

        File.Delete(wrong);
        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, "bo"), (folder.Arrival(ride)!.State, folder.Arrival(ride)!.Person));
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void AFileThatIsGoneFromEverywhereKeepsItsOwner()
    {
        var ride = Some.Fit(Some.Yesterday);
        File.Delete(Sweep(folder.Put("anna/ride.fit", ride)));

        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, "anna"), (folder.Arrival(ride)!.State, folder.Arrival(ride)!.Person));
    }

    [Fact]
    public void AMissingOriginalIsNamedAndTheOthersAreRebuilt()
    {
        var (lost, kept) = (Some.Fit(Some.Yesterday), Some.Fit(Some.Yesterday, 200));
        folder.Put("anna/lost.fit", lost);
        folder.Put("anna/kept.fit", kept);
        folder.Sweep();
        var original = WorkingFolder.Files(Path.Combine(folder.Data, "archive")).Single(path => Path.GetFileName(path) == WorkingFolder.Sha(lost));
        var bytes = File.ReadAllBytes(original);
        File.Delete(original);

        folder.Rebuild();

        Assert.Equal(ArrivalState.Refused, folder.Arrival(lost)!.State);
        Assert.Contains("missing or damaged", folder.Arrival(lost)!.Reason, StringComparison.Ordinal);
        Assert.Equal(ArrivalState.Stored, folder.Arrival(kept)!.State);

        File.WriteAllBytes(original, bytes);
        folder.Rebuild();
        Assert.Equal(ArrivalState.Stored, folder.Arrival(lost)!.State);
    }

    [Fact]
    public void ARebuildOnALaterMorningEndsWithTheSameRows()
    {
        folder.Fill(Some.Fortnight());
        folder.Sweep();
        var before = folder.Export();

        folder.Rebuild(WorkingFolder.Now + Duration.FromDays(3));

        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void ABrokenFileInAnArchiveIsShownAndTheOthersCount()
    {
        var zip = Some.Zip(("ride.fit", Some.Fit(Some.Yesterday)), ("cut.fit", Some.Fit(Some.Yesterday, 200)));
        folder.Put("anna/week.zip", Broken(zip));

        folder.Sweep();

        Assert.Contains(folder.Arrivals(), arrival => arrival.State == ArrivalState.Stored);
        Assert.Contains("anna/week.zip", Page("staff"), StringComparison.Ordinal);
        Assert.Contains("of the 2 files in it", Page("staff"), StringComparison.Ordinal);
    }

    [Fact]
    public void AZipRefusedInsideAZipIsTakenWhenItLiesLoose()
    {
        var inner = Some.Zip(("ride.fit", Some.Fit(Some.Yesterday)));
        folder.Put("anna/outer.zip", Some.Zip(("inner.zip", inner)));
        folder.Sweep();
        Assert.Equal(ArrivalState.Refused, folder.Arrival(inner)!.State);

        folder.Put("anna/inner.zip", inner);
        folder.Sweep();

        Assert.Equal(ArrivalState.Aside, folder.Arrival(inner)!.State);
        Assert.Equal(ArrivalState.Stored, folder.Arrival(Some.Fit(Some.Yesterday))!.State);
    }

    [Fact]
    public void AnInboxThatIsAwayStopsNothingElse()
    {
        folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();
        Directory.Delete(folder.Inbox, recursive: true);

        var report = folder.Sweep();

        Assert.Equal(["inbox"], report.MissingInboxes);
        Assert.Contains("\"person\":\"anna\"", folder.Export("activities"), StringComparison.Ordinal);
    }

    [Fact]
    public void AFileOverTheLimitIsShownToTheOneWhoseFolderItIsIn()
    {
        using var small = new WorkingFolder(intake: "\"largest_file_megabytes\": 1");
        small.Put("anna/huge.fit", new byte[(1024 * 1024) + 1]);
        small.Sweep();
        Assert.Contains("huge.fit", File.ReadAllText(Path.Combine(small.Root, "pages", "staff.html")), StringComparison.Ordinal);
    }

    /// <summary>The second member's content is changed, its checksum is not.</summary>
    private static byte[] Broken(byte[] zip)
    {
        var name = System.Text.Encoding.ASCII.GetBytes("cut.fit");
        var at = zip.AsSpan().IndexOf(name) + name.Length + 20;
        zip[at] ^= 0xFF;
        return zip;
    }

    private string Sweep(string path)
    {
        folder.Sweep();
        return path;
    }

    private string Page(string contact) => File.ReadAllText(Path.Combine(folder.Root, "pages", $"{contact}.html"));
}
