using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

public sealed class SweepTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void EveryArrivalHasAStateAndEveryOneThatDoesNotCountSaysWhy()
    {
        var (ride, cut, notes) = (Some.Fit(Some.Yesterday), Some.Fit(Some.Yesterday, 5)[..^9], Some.Text("felt fine\n"));
        var (loose, empty) = (Some.Fit(Some.Yesterday, 10), Array.Empty<byte>());
        folder.Put("anna/ride.fit", ride);
        folder.Put("anna/cut.fit", cut);
        folder.Put("anna/notes.txt", notes);
        folder.Put("anna/empty.fit", empty);
        folder.Put("loose.fit", loose);
        folder.Put("bo/pack.zip", Some.Zip(("a.fit", Some.Fit(Some.Yesterday, 15))));
        var report = folder.Sweep();
        Assert.Equal((ArrivalState.Stored, null, "anna"), State(ride));
        Assert.Equal(ArrivalState.Refused, State(cut).State);
        Assert.StartsWith($"byte {cut.Length}: cut short", State(cut).Reason);
        Assert.Equal(ArrivalState.Refused, State(notes).State);
        Assert.StartsWith("line 1", State(notes).Reason);
        Assert.Equal((ArrivalState.Refused, "byte 0: the file is empty", null), State(empty));
        Assert.Equal(ArrivalState.Held, State(loose).State);
        Assert.StartsWith("owner unknown", State(loose).Reason);
        Assert.Equal((6, 2, 1, 1, 3), (report.Seen, report.CountOf(ArrivalState.Stored), report.CountOf(ArrivalState.Aside), report.CountOf(ArrivalState.Held), report.CountOf(ArrivalState.Refused)));
        Assert.Equal(2, Lines("activities").Length);
    }

    [Fact]
    public void ASecondSweepChangesNothing()
    {
        folder.Fill(Some.Fortnight());

        var first = folder.Sweep();
        var before = folder.Everything();
        var second = folder.Sweep();
        Assert.Equal(before, folder.Everything());
        Assert.NotEmpty(folder.NoticeText);
        Assert.Contains("\"rule\":\"silence\"", folder.Export("alerts"), StringComparison.Ordinal);
        Assert.Equal((1, 1), (first.NoticesDecided, first.AlertChanges));
        Assert.Equal((0, 0, 0, 0), (second.NoticesDecided, second.AlertChanges, second.PeopleComputed, second.Settled.Count));
        Assert.Equal(folder.InboxHashes(), folder.ArchiveHashes());
    }

    [Fact]
    public void ASecondCopyOfAKnownFileIsIgnored()
    {
        var ride = Some.Fit(Some.Yesterday);
        folder.Put("anna/ride.fit", ride);
        folder.Sweep();
        var before = (folder.Export("activities"), folder.Export("days"));
        folder.Put("anna/copy/a.fit", ride);
        folder.Put("anna/ride (1).fit", ride);
        folder.Sweep();
        Assert.Equal(before.Item1.Replace("anna/ride.fit", "anna/copy/a.fit", StringComparison.Ordinal), folder.Export("activities"));
        Assert.Equal(before.Item2, folder.Export("days"));
        Assert.Single(folder.Arrivals());
        Assert.Single(folder.ArchiveNames());
    }

    [Theory]
    [InlineData("anna", "bo", false)]
    [InlineData("bo", "anna", false)]
    [InlineData("anna", "bo", true)]
    [InlineData("bo", "anna", true)]
    public void TheSameBytesUnderTwoPeopleAreHeld(string first, string second, bool later)
    {
        var ride = Some.Fit(Some.Yesterday);
        folder.Put($"{first}/ride.fit", ride);
        if (later)
        {
            folder.Sweep();
            Assert.Equal((ArrivalState.Stored, null, first), State(ride));
            Assert.Single(Lines("activities"));
        }

        folder.Put($"{second}/ride.fit", ride);
        folder.Sweep();
        Assert.Equal((ArrivalState.Held, "claimed by anna and bo", null), State(ride));
        Assert.Empty(Lines("activities"));
        Assert.Empty(Lines("days"));
    }

    [Fact]
    public void AHeldFileIsTakenUpOnceItsOwnerIsInTheRoster()
    {
        var ride = Some.Fit(Some.Yesterday);
        folder.Put("dora/ride.fit", ride);
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, State(ride).State);
        folder.Write("roster.csv", WorkingFolder.Roster + "dora,Dora Dahl,squad,1999,f,UTC\n");
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, null, "dora"), State(ride));
        Assert.Contains("\"person\":\"dora\"", Assert.Single(Lines("activities")), StringComparison.Ordinal);
        Assert.Contains("\"person\":\"dora\"", Assert.Single(Lines("days")), StringComparison.Ordinal);
    }

    [Fact]
    public void PackedFilesCountAsTheFilesInThem()
    {
        byte[][] rides = [.. Enumerable.Range(0, 4).Select(i => Some.Fit(Some.Yesterday, 10 * i))];
        folder.Put("anna/one.fit.gz", Some.Gzip(rides[0]));
        folder.Put("anna/pack.zip", Some.Zip(("two.fit", rides[1]), ("deep/three.fit.gz", Some.Gzip(rides[2]))));
        folder.Put("pack.zip", Some.Zip(("anna/four.fit", rides[3])));
        folder.Sweep();
        Assert.All(rides, ride => Assert.Equal((ArrivalState.Stored, null, "anna"), State(ride)));
        Assert.Equal(4, Lines("activities").Length);
        var arrivals = folder.Export("arrivals");
        Assert.Contains("\"file\":\"anna/one.fit.gz!/one.fit\"", arrivals, StringComparison.Ordinal);
        Assert.Contains("\"file\":\"anna/pack.zip!/deep/three.fit.gz!/three.fit\"", arrivals, StringComparison.Ordinal);
        Assert.Contains("\"file\":\"pack.zip!/anna/four.fit\"", arrivals, StringComparison.Ordinal);
        Assert.Equal(3, folder.ArchiveNames().Count);
    }

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void AMemberEqualToALooseFileCountsOnce(bool packedFirst)
    {
        var ride = Some.Fit(Some.Yesterday);
        (string, byte[])[] files = [("anna/ride.fit", ride), ("anna/pack.zip", Some.Zip(("inside.fit", ride)))];
        foreach (var (path, bytes) in packedFirst ? files.Reverse() : files)
        {
            folder.Put(path, bytes);
            folder.Sweep();
        }

        Assert.Single(Lines("activities"));
        Assert.Equal((ArrivalState.Stored, null, "anna"), State(ride));
        Assert.Equal(2, folder.Arrivals().Count);
        Assert.Equal(folder.InboxHashes(), folder.ArchiveHashes());
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
    }

    [Fact]
    public void AMemberOfAPackOfOnePersonThatLiesLooseWithAnotherIsHeld()
    {
        var ride = Some.Fit(Some.Yesterday);
        folder.Put("anna/pack.zip", Some.Zip(("inside.fit", ride)));
        folder.Sweep();
        folder.Put("bo/ride.fit", ride);
        folder.Sweep();
        Assert.Equal((ArrivalState.Held, "claimed by anna and bo", null), State(ride));
        Assert.Empty(Lines("activities"));
    }

    [Fact]
    public void AFileChangedLaterUnderTheSameNameIsTakenAgain()
    {
        var (first, second) = (Some.Fit(Some.Yesterday), Some.Fit(Some.Yesterday, 10));
        folder.Put("anna/ride.fit", first);
        folder.Sweep();
        folder.Put("anna/ride.fit", second, Duration.FromMinutes(30));
        folder.Sweep();
        Assert.Equal(ArrivalState.Stored, State(first).State);
        Assert.Equal(ArrivalState.Stored, State(second).State);
        Assert.Equal(2, Lines("activities").Length);
        Assert.Equal(2, folder.ArchiveNames().Count);
    }

    [Fact]
    public void TheSameSessionOfTwoDevicesIsOneActivity()
    {
        folder.Put("anna/watch.fit", Some.Fit(Some.Yesterday));
        folder.Put("anna/bike.fit", Some.Fit(Some.Yesterday, product: 2));
        folder.Sweep();
        Assert.Equal(2, folder.Arrivals().Count(arrival => arrival.State == ArrivalState.Stored));
        Assert.Single(Lines("activities"));
    }

    private string[] Lines(string table) => folder.Export(table).Split('\n', StringSplitOptions.RemoveEmptyEntries);

    private (ArrivalState? State, string? Reason, string? Person) State(byte[] bytes) =>
        folder.Arrival(bytes) is { } arrival ? (arrival.State, arrival.Reason, arrival.Person) : default;
}
