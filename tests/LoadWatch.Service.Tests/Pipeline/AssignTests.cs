using System.Text.RegularExpressions;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>A decision names an arrival's owner before any folder does, whenever it is made.</summary>
public sealed class AssignTests : IDisposable
{
    private static readonly string[] Computed = ["activities", "days", "findings"];

    /// <summary>A ride of the day before yesterday: whose it is decides whether anna has been silent for four days.</summary>
    private static readonly byte[] Ride = Some.Fit(Some.Yesterday.PlusDays(-1), 60);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("ride.fit", null)]
    [InlineData("bo/ride.fit", "anna/ride.fit")]
    [InlineData("bo/ride.fit", "cara/ride.fit")]
    public void AHeldFileIsTakenUpByTheNextSweep(string path, string? other)
    {
        folder.Put(path, Ride);
        folder.Put(other ?? path, Ride);
        folder.Sweep();
        Assert.Equal((ArrivalState.Held, null), State(Ride));
        folder.Assign(Ride, "anna");
        var report = folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "anna"), State(Ride));
        Assert.Equal((1, 1), (report.CountOf(ArrivalState.Stored), report.PeopleComputed));
        Assert.Contains("\"person\":\"anna\"", Assert.Single(Lines("activities")), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void AWrongOwnerIsPutRightAsIfTheFileHadComeToTheRightOneAtOnce()
    {
        using var right = new WorkingFolder();
        right.Fill([.. Some.Fortnight(), ("anna/late.fit", Ride)]);
        right.Sweep();
        folder.Fill([.. Some.Fortnight(), ("cara/late.fit", Ride)]);
        folder.Sweep();
        Assert.All(["activities", "days"], table => Assert.NotEqual(WithoutFiles(right, table), WithoutFiles(folder, table)));
        Assert.Contains("\"state\":\"unacknowledged\"", SilenceOfAnna(), StringComparison.Ordinal);
        folder.Assign(Ride, "anna");
        var report = folder.Sweep();
        Assert.Equal(2, report.PeopleComputed);
        Assert.All(Computed, table => Assert.Equal(WithoutFiles(right, table), WithoutFiles(folder, table)));
        Assert.Contains("\"state\":\"returned\"", SilenceOfAnna(), StringComparison.Ordinal);
        Assert.Empty(right.Export("alerts"));
        AssertSettled();
    }

    [Fact]
    public void WhoeverLosesTheFileIsSilentAgain()
    {
        folder.Fill([.. Some.Fortnight(), ("anna/late.fit", Ride)]);
        folder.Sweep();
        Assert.Empty(folder.Export("alerts"));
        folder.Assign(Ride, "bo");
        folder.Sweep();
        Assert.Contains("\"state\":\"unacknowledged\"", SilenceOfAnna(), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void AMemberOfAnArchiveIsAssignedAlone()
    {
        var other = Some.Fit(Some.Yesterday, 30);
        folder.Put("anna/pack.zip", Some.Zip(("one.fit", Ride), ("deep/two.fit.gz", Some.Gzip(other))));
        folder.Sweep();
        folder.Assign(other, "bo");
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "anna"), State(Ride));
        Assert.Equal((ArrivalState.Stored, "bo"), State(other));
        Assert.Equal(2, Lines("activities").Length);
        AssertSettled();
    }

    [Fact]
    public void ACopyInAnotherFolderDoesNotOverruleTheDecision()
    {
        folder.Put("anna/ride.fit", Ride);
        folder.Sweep();
        folder.Assign(Ride, "bo");
        folder.Put("cara/ride.fit", Ride);
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "bo"), State(Ride));
        AssertSettled();
    }

    [Fact]
    public void TheLastOfSeveralDecisionsCounts()
    {
        folder.Put("ride.fit", Ride);
        folder.Sweep();
        folder.Assign(Ride, "anna");
        folder.Sweep();
        folder.Assign(Ride, "cara", WorkingFolder.Now + Duration.FromMinutes(1));
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "cara"), State(Ride));
        Assert.All(Lines("activities").Concat(Lines("days")), line => Assert.Contains("\"person\":\"cara\"", line, StringComparison.Ordinal));
        AssertSettled();
    }

    [Fact]
    public void ASecondDeviceOfTheOwnerWinsAgainOnceTheFirstIsAssignedAway()
    {
        var (watch, bike) = (Some.Fit(Some.Yesterday), Some.Fit(Some.Yesterday, product: 2));
        folder.Put("anna/watch.fit", watch);
        folder.Put("anna/bike.fit", bike);
        folder.Sweep();
        Assert.Single(Lines("activities"));
        folder.Assign(watch, "bo");
        folder.Sweep();
        Assert.All(["anna", "bo"], person => Assert.Single(Lines("activities"), line => line.Contains($"\"person\":\"{person}\"", StringComparison.Ordinal)));
        AssertSettled();
    }

    [Fact]
    public void AnOwnerWhoLeftTheRosterHoldsTheFileUntilTheyAreBack()
    {
        folder.Put("bo/ride.fit", Ride);
        folder.Sweep();
        folder.Assign(Ride, "cara");
        folder.Write("roster.csv", WorkingFolder.Roster.Replace("cara,", "dora,", StringComparison.Ordinal));
        folder.Write("anchors.csv", WorkingFolder.Anchors.Replace("cara,", "dora,", StringComparison.Ordinal));
        folder.Sweep();
        Assert.Equal((ArrivalState.Held, "assigned to cara, who is not in the roster"), (folder.Arrival(Ride)!.State, folder.Arrival(Ride)!.Reason));
        Assert.Empty(Lines("activities"));
        folder.Write("roster.csv", WorkingFolder.Roster);
        folder.Write("anchors.csv", WorkingFolder.Anchors);
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "cara"), State(Ride));
    }

    [Fact]
    public void ADecisionOnAFileWhoseOriginalIsGoneIsToldAndStopsNothing()
    {
        folder.Put("bo/ride.fit", Ride);
        folder.Sweep();
        folder.Assign(Ride, "anna");
        File.Delete(WorkingFolder.Files(Path.Combine(folder.Data, "archive")).Single(path => Path.GetFileName(path) == WorkingFolder.Sha(Ride)));
        var later = Some.Fit(Some.Yesterday);
        folder.Put("cara/later.fit", later);
        var report = folder.Sweep();
        Assert.Equal("bo/ride.fit", Assert.Single(report.Unreadable).Subject);
        Assert.Equal((ArrivalState.Stored, "bo"), State(Ride));
        Assert.Equal((ArrivalState.Stored, "cara"), State(later));
    }

    /// <summary>Neither another sweep nor a rebuild changes anything.</summary>
    private void AssertSettled()
    {
        var before = folder.Everything();
        Assert.Equal(0, folder.Sweep().PeopleComputed);
        Assert.Equal(before, folder.Everything());
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
        folder.Sweep();
        Assert.Equal(before, folder.Everything());
    }

    private string SilenceOfAnna() =>
        Assert.Single(Lines("alerts"), line => line.Contains("\"person\":\"anna\"", StringComparison.Ordinal) && line.Contains("\"rule\":\"silence\"", StringComparison.Ordinal));

    private static string WithoutFiles(WorkingFolder folder, string table) =>
        Regex.Replace(folder.Export(table), "\"file\":\"[^\"]*\"", "\"file\":\"\"", RegexOptions.None, TimeSpan.FromSeconds(5));

    private string[] Lines(string table) => folder.Export(table).Split('\n', StringSplitOptions.RemoveEmptyEntries);

    private (ArrivalState State, string? Person) State(byte[] bytes) => (folder.Arrival(bytes)!.State, folder.Arrival(bytes)!.Person);
}
