using System.Globalization;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

public sealed class AssignCommandTests : IDisposable
{
    private static readonly byte[] Ride = Some.Fit(Some.Yesterday);
    private static readonly string Sha = WorkingFolder.Sha(Ride);

    private readonly WorkingFolder folder = new();

    public AssignCommandTests()
    {
        folder.Put("ride.fit", Ride);
        folder.Put("anna/notes.txt", Some.Text("felt fine\n"));
        folder.Put("bo/pack.zip", Some.Zip(("one.fit", Some.Fit(Some.Yesterday, 10)), ("two.fit", Some.Fit(Some.Yesterday, 20))));
        folder.Sweep();
    }

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("ride.fit")]
    [InlineData("6 digits")]
    [InlineData("64 DIGITS")]
    public void AFileIsNamedByItsPathOrItsDigits(string word)
    {
        var name = word switch { "6 digits" => Sha[..6], "64 DIGITS" => Sha.ToUpperInvariant(), _ => word };

        var (code, output, errors) = Assign(name, "Kim", "borrowed watch");

        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        Assert.Equal(
            $"{Sha[..12]} (ride.fit) is assigned to anna; taken up by the next sweep. Until then it is held: owner unknown: no folder above it is named after a person of the roster.",
            output.TrimEnd());
        folder.Read((_, session) =>
        {
            Assert.Equal([new Decision(DecisionKind.Assign, Sha, "anna", WorkingFolder.Now, "Kim", "borrowed watch")], session.Decisions.All());
            Assert.Equal(("assigned", $"{Sha[..12]} to anna"), (session.Audits.All()[^1].What, session.Audits.All()[^1].Detail));
            return true;
        });
    }

    [Fact]
    public void AssigningTwiceSaysSoAndDecidesNothingNew()
    {
        Assign(Sha, "Kim");

        var (code, output, _) = Assign(Sha, "Alex", now: WorkingFolder.Now + Duration.FromHours(1));

        Assert.Equal((ExitCode.Ok, $"{Sha[..12]} (ride.fit) is already assigned to anna 2026-06-15T06:00:00Z by Kim"), (code, output.TrimEnd()));
        Assert.Single(folder.Read((_, session) => session.Decisions.All()));
    }

    [Theory]
    [InlineData("rides.fit", "\"rides.fit\" is no file known here")]
    [InlineData("", "\"\" is no file known here")]
    [InlineData("anna/notes.txt", "(anna/notes.txt) has nothing to assign; it is refused: line 1")]
    [InlineData("bo/pack.zip", "(bo/pack.zip) is an archive; assign the files in it: ")]
    public void WhatCannotBeAssignedIsAUsageErrorThatSaysWhy(string word, string expected)
    {
        var (code, output, errors) = Assign(word);

        Assert.Equal((ExitCode.Usage, ""), (code, output));
        Assert.Contains(expected, errors, StringComparison.Ordinal);
        Assert.Empty(folder.Read((_, session) => session.Decisions.All()));
    }

    [Fact]
    public void TheFilesOfAnArchiveAreNamed()
    {
        var (_, _, errors) = Assign("bo/pack.zip");

        Assert.All(["(bo/pack.zip!/one.fit)", "(bo/pack.zip!/two.fit)"], member => Assert.Contains(member, errors, StringComparison.Ordinal));
    }

    [Fact]
    public void ANameThatHeldTwoContentsAsksForTheDigits()
    {
        folder.Put("ride.fit", Some.Fit(Some.Yesterday, 30), Duration.FromMinutes(30));
        folder.Sweep();

        var (code, _, errors) = Assign("ride.fit");

        Assert.Equal(ExitCode.Usage, code);
        Assert.StartsWith("\"ride.fit\" is more than one file; name one by its digits: ", errors, StringComparison.Ordinal);
        Assert.Contains(Sha[..12], errors, StringComparison.Ordinal);
    }

    [Fact]
    public void ItIsPossibleWhileAnotherProcessHoldsTheLockAndIsExplained()
    {
        using var running = Workplace.OpenToWork(folder.ConfigPath);

        var ended = Loadwatch.Run("assign", Sha[..8], "ANNA", "--by", "Kim", "--note", "borrowed watch", "--config", folder.ConfigPath);

        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        var explained = Loadwatch.Run("explain", "ride.fit", "--config", folder.ConfigPath).Output;
        Assert.Matches(@"    assigned to anna \d{4}-\d\d-\d\dT\S+Z by Kim: borrowed watch\n", explained);
        running.NewSweep(WorkingFolder.Now).Run(TestContext.Current.CancellationToken);
        Assert.Equal("anna", folder.Arrival(Ride)!.Person);
    }

    [Fact]
    public void APersonWhoIsNotInTheRosterIsAUsageErrorWithTheNearestOne()
    {
        var ended = Loadwatch.Run("assign", Sha, "ana", "--config", folder.ConfigPath);

        Assert.Equal((64, ""), (ended.Code, ended.Output));
        Assert.Contains("\"ana\" is not in the roster; did you mean \"anna\"?", ended.Errors, StringComparison.Ordinal);
    }

    private (int Code, string Output, string Errors) Assign(string file, string? by = null, string? note = null, Instant? now = null)
    {
        using var workplace = Workplace.OpenToDecide(folder.ConfigPath);
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var errors = new StringWriter(CultureInfo.InvariantCulture);
        var code = AssignCommand.Run(workplace, file, "anna", new Circumstances(now ?? WorkingFolder.Now, by, note), output, errors);
        return (code, output.ToString(), errors.ToString());
    }
}
