using System.Globalization;
using LoadWatch.Plans;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Pipeline;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

public sealed class AwayCommandTests : IDisposable
{
    private static readonly LocalDate Today = new(2026, 6, 15);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData(DecisionKind.Ill, AnswerWord.Ill, null)]
    [InlineData(DecisionKind.Injured, AnswerWord.Injured, 9)]
    [InlineData(DecisionKind.Away, AnswerWord.Away, 0)]
    [InlineData(DecisionKind.Returning, AnswerWord.Returning, null)]
    [InlineData(DecisionKind.Rest, AnswerWord.Rest, null)]
    [InlineData(DecisionKind.Match, AnswerWord.Match, null)]
    public void TheCommandAndAnAnswerLeaveTheSameDecisionButForItsRow(DecisionKind kind, AnswerWord word, int? untilDays)
    {
        var until = untilDays is { } days ? Today.PlusDays(days) : (LocalDate?)null;
        var (code, output, errors) = Away(kind, until: until, by: "Kim", note: "told by phone");
        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        Assert.StartsWith($"anna: {kind.ToString().ToLowerInvariant()} ", output, StringComparison.Ordinal);

        using var other = new WorkingFolder();
        other.PutRows(AnswerRows.Row("anna", Today, AnswerRows.Say(word, until: until, by: "Kim", note: "told by phone"), "anna"));
        other.TakeUp();

        var expected = new Decision(kind, "anna", "anna", WorkingFolder.Now, "Kim", "told by phone") { From = Today, Until = until };
        Assert.Equal([expected], folder.Decisions());
        Assert.Equal([expected], other.Decisions().Select(decision => decision with { Via = null }));
        Assert.Equal(Today, folder.Read((_, session) => Assert.Single(session.People.Behind(LocalDate.MinIsoValue)).DirtyFrom));
    }

    [Fact]
    public void WithoutADateItBeginsTodayByThePersonsClock()
    {
        folder.Write("roster.csv", WorkingFolder.Roster.Replace("f,UTC\nbo", "f,Pacific/Honolulu\nbo", StringComparison.Ordinal));

        Away(DecisionKind.Away);

        Assert.Equal(Today.PlusDays(-1), Assert.Single(folder.Decisions()).From); // Eight in the evening of the day before.
    }

    [Fact]
    public void ReturningEndsTheOpenAbsence()
    {
        Away(DecisionKind.Ill, from: Today.PlusDays(-9));
        Assert.DoesNotContain("No absence", Away(DecisionKind.Returning, now: WorkingFolder.Now + Duration.FromMinutes(1)).Output, StringComparison.Ordinal);

        Assert.Equal(
            [new Absence(AbsenceWord.Ill, Today.PlusDays(-9), Today.PlusDays(-1))],
            folder.Read((workplace, session) => new PersonPlans(workplace.Configuration).Of(session)["anna"].Absences));
    }

    [Fact]
    public void ReturningFromNothingSaysSo() =>
        Assert.EndsWith("No absence stood until then.", Away(DecisionKind.Returning).Output.TrimEnd(), StringComparison.Ordinal);

    [Fact]
    public void TheSameAgainSaysSoAndChangesNothing()
    {
        Away(DecisionKind.Injured, by: "Kim");

        Assert.Equal(
            "anna is already injured from 2026-06-15 2026-06-15T06:00:00Z by Kim",
            Away(DecisionKind.Injured, by: "Alex", now: WorkingFolder.Now + Duration.FromHours(1)).Output.TrimEnd());
        Assert.Single(folder.Decisions());
    }

    [Theory]
    [InlineData(DecisionKind.Returning, 3, "--until: returning has no last date")]
    [InlineData(DecisionKind.Ill, -1, "--until: 2026-06-14 lies before 2026-06-15")]
    public void AWrongLastDateIsAUsageError(DecisionKind kind, int days, string reason)
    {
        var (code, output, errors) = Away(kind, until: Today.PlusDays(days));

        Assert.Equal((ExitCode.Usage, "", reason), (code, output, errors.TrimEnd()));
        Assert.Empty(folder.Decisions());
    }

    [Fact]
    public void ItIsPossibleWhileAnotherProcessHoldsTheLockAndIsListedAndExplained()
    {
        using var running = Workplace.OpenToWork(folder.ConfigPath);

        var ended = Loadwatch.Run("away", "ANNA", "--from", "2026-03-02", "--as", "injured", "--by", "Kim", "--note", "ankle", "--config", folder.ConfigPath);

        Assert.Equal((0, "", "anna: injured from 2026-03-02; computed by the next sweep."), (ended.Code, ended.Errors, ended.Output.TrimEnd()));
        Assert.Contains("injured since 2026-03-02", Loadwatch.Run("people", "--config", folder.ConfigPath).Output, StringComparison.Ordinal);
        Assert.Matches(
            @"    injured from 2026-03-02 \d{4}-\d\d-\d\dT\S+Z by Kim: ankle\n",
            Loadwatch.Run("explain", "anna", "--date", "2026-04-01", "--config", folder.ConfigPath).Output);
        Assert.Equal(64, Loadwatch.Run("away", "anna", "--as", "sick", "--config", folder.ConfigPath).Code);
        Assert.Equal(64, Loadwatch.Run("away", "ana", "--config", folder.ConfigPath).Code);
    }

    private (int Code, string Output, string Errors) Away(
        DecisionKind kind, LocalDate? from = null, LocalDate? until = null, string? by = null, string? note = null, Instant? now = null)
    {
        using var workplace = Workplace.OpenToDecide(folder.ConfigPath);
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var errors = new StringWriter(CultureInfo.InvariantCulture);
        var code = AwayCommand.Run(workplace, "anna", kind, from, until, new Circumstances(now ?? WorkingFolder.Now, by, note), output, errors);
        return (code, output.ToString(), errors.ToString());
    }
}
