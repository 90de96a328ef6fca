using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Versions of tables that are damaged, empty, or of nobody.</summary>
public sealed class TableTroubleTests : IDisposable
{
    private const string Named = "date,person,exercise,repetitions,kilograms";
    private const string Unnamed = "date,exercise,repetitions,kilograms";

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ADamagedVersionLeavesTheRowsBeforeAndIsNamed()
    {
        folder.PutTable("gym/sets.csv", 1, [Named, .. Days(5, day => $"{day},bo,leg_press,10,80")]);
        folder.Sweep(Nights.Before(1));
        var before = (folder.Rows(), folder.Export("activities"));

        var damaged = folder.PutTable("gym/sets.csv", 0, [Named, .. Days(6, day => $"{day},bo,leg_press,ten,80")]);
        folder.Sweep();

        Assert.Equal(ArrivalState.Refused, folder.Arrival(damaged)!.State);
        Assert.Equal(before.Item1, folder.Rows());
        Assert.Equal(before.Item2, folder.Export("activities"));
        Assert.Contains("gym/sets.csv: Not usable: ", folder.Brief(), StringComparison.Ordinal);

        folder.PutTable("gym/sets.csv", 0, [Named, .. Days(4, day => $"{day},bo,leg_press,10,80")]);
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));
        Assert.Equal(5, folder.Rows().Count); // The date before the first row is older than what the version speaks for.
        AssertSettled();
    }

    [Fact]
    public void AVersionThatCannotBeReadBackIsTriedAgain()
    {
        folder.PutTable("sets.csv", 1, Named, $"{Nights.Day(2)},bo,leg_press,10,80");
        folder.Sweep(Nights.Before(1));
        var first = folder.ArchiveNames();
        folder.PutTable("sets.csv", 0, Named, $"{Nights.Day(2)},bo,leg_press,10,90");
        folder.Sweep();
        var before = folder.Everything();
        var latest = WorkingFolder.Files(Path.Combine(folder.Data, "archive")).Single(path => !first.Contains(Path.GetFileName(path)));
        folder.Write((_, session) =>
        {
            session.TableVersions.SetApplied("inbox/sets.csv", []);
            return true;
        });
        var away = Path.Combine(folder.Root, "away");
        File.Move(latest, away);

        Assert.Contains("cannot be read back", Assert.Single(folder.Sweep().Unreadable).Sentence, StringComparison.Ordinal);
        Assert.Equal(800, Assert.Single(folder.Activities("bo")).Value("kilograms"));
        Assert.Single(folder.Sweep().Unreadable);

        File.Move(away, latest);
        Assert.Empty(folder.Sweep().Unreadable);
        Assert.Equal(before, folder.Everything());
    }

    [Theory]
    [InlineData("zip", "leave")]
    [InlineData("gz", "move")]
    public void APackedTableCountsAsTheTableInIt(string packing, string take)
    {
        using var other = new WorkingFolder(take);
        foreach (var kilograms in new[] { 80, 90 })
        {
            var table = Some.Text($"{Named}\n{Nights.Day(1)},bo,leg_press,10,{kilograms}\n");
            other.Put($"gym.{packing}", packing == "zip" ? Some.Zip(("sets.csv", table)) : Some.Gzip(table), Duration.FromMinutes(180 - kilograms));
            other.Sweep();
        }

        Assert.Equal(900, Assert.Single(other.Activities("bo")).Value("kilograms"));
        var before = other.Everything();
        other.Rebuild();
        Assert.Equal(before, other.Everything());
    }

    [Theory]
    [InlineData("sets.csv", Named, "bo,")]
    [InlineData("bo/sets.csv", Unnamed, "")]
    public void AnEmptyVersionChangesNothing(string path, string header, string person)
    {
        folder.PutTable(path, 1, header, $"{Nights.Day(1)},{person}leg_press,10,80");
        folder.Sweep();
        var before = (folder.Rows(), folder.Export("activities"));

        folder.PutTable(path, 0, header);
        folder.Sweep();

        Assert.Equal(before.Item1, folder.Rows());
        Assert.Equal(before.Item2, folder.Export("activities"));
        Assert.Single(folder.Activities("bo"));
        AssertSettled();
    }

    [Fact]
    public void ATableWithoutPeopleIsOfTheOwnerOfItsFolder()
    {
        folder.PutTable("anna/gym/sets.csv", 0, Unnamed, $"{Nights.Day(1)},leg_press,10,80");
        folder.Sweep();

        Assert.Equal(800, Assert.Single(folder.Activities("anna")).Value("kilograms"));
        AssertSettled();
    }

    [Fact]
    public void ATableOfNobodyIsHeldAndTakenUpWhenItIsMoved()
    {
        var table = folder.PutTable("sets.csv", 0, Unnamed, $"{Nights.Day(2)},leg_press,10,80", $"{Nights.Day(1)},leg_press,10,80");
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, folder.Arrival(table)!.State);
        Assert.Contains("a table that names no people", folder.Brief(), StringComparison.Ordinal);
        Assert.Empty(folder.Rows());

        Directory.CreateDirectory(Path.Combine(folder.Inbox, "bo"));
        File.Move(Path.Combine(folder.Inbox, "sets.csv"), Path.Combine(folder.Inbox, "bo", "sets.csv"));
        folder.Sweep();

        Assert.Equal((ArrivalState.Stored, "bo"), (folder.Arrival(table)!.State, folder.Arrival(table)!.Person));
        Assert.Equal([800, 800], folder.Activities("bo").Select(activity => activity.Value("kilograms")));

        folder.PutTable("bo/sets.csv", 0, Unnamed, $"{Nights.Day(2)},leg_press,10,80");
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));
        Assert.Equal(Nights.Day(2), Assert.Single(folder.Activities("bo")).GetProperty("date").GetString());
        AssertSettled();
    }

    [Fact]
    public void ARowOfAStrangerIsAskedAboutAndTakenUpByAnAlias()
    {
        folder.PutTable("sets.csv", 0, Named, $"{Nights.Day(1)},bo,leg_press,10,80", $"{Nights.Day(1)},Member 12,leg_press,10,90");
        folder.Sweep();
        Assert.Contains("sets.csv: 1 row from 13 June 2026 on is of \"Member 12\"", folder.Brief(), StringComparison.Ordinal);

        folder.Edit("roster.csv", "time_zone", "time_zone,aliases");
        folder.Edit("roster.csv", "1958,f,UTC", "1958,f,UTC,member 12");
        folder.Edit("roster.csv", "1991,m,UTC", "1991,m,UTC,");
        folder.Edit("roster.csv", "1996,f,UTC", "1996,f,UTC,");
        folder.Sweep();

        Assert.Equal(900, Assert.Single(folder.Activities("cara")).Value("kilograms"));
        Assert.DoesNotContain("Member 12", folder.Brief(), StringComparison.Ordinal);
        AssertSettled();
    }

    private static IEnumerable<string> Days(int count, Func<string, string> row) => Enumerable.Range(1, count).Reverse().Select(day => row(Nights.Day(day)));

    private void AssertSettled()
    {
        var now = WorkingFolder.Now + Duration.FromMinutes(2);
        folder.Sweep(now);
        var before = folder.Everything();
        Assert.Equal(0, folder.Sweep(now).PeopleComputed);
        folder.Rebuild(now);
        Assert.Equal(before, folder.Everything());
    }
}
