using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

public sealed class ShelveCommandTests : IDisposable
{
    private static readonly LocalDate Today = new(2026, 6, 15);

    private readonly WorkingFolder folder = new();
    private readonly string alert;

    public ShelveCommandTests()
    {
        folder.Fill(Some.Fortnight());
        folder.Sweep();
        alert = folder.Read((_, session) => Assert.Single(session.Alerts.All()).Id);
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AnAlertIsShelvedWithItsDecisionItsChangeAndAnAudit()
    {
        var (code, output, errors) = Shelve(alert, Today.PlusDays(7), "Kim", "on holiday");

        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        Assert.StartsWith("Shelved until 2026-06-22: No recording for 4 days", output, StringComparison.Ordinal);
        folder.Read((_, session) =>
        {
            Assert.Equal((AlertState.Unacknowledged, Today.PlusDays(7)), (session.Alerts.Get(alert)!.State, session.Alerts.Get(alert)!.ShelvedUntil));
            Assert.Equal(AlertChangeReason.Shelved, session.Alerts.Changes.Of(alert)[^1].Reason);
            Assert.Equal([Decided(Today.PlusDays(7), "Kim", "on holiday")], session.Decisions.All());
            Assert.Equal("shelved", session.Audits.All()[^1].What);
            return true;
        });
        Assert.Equal("Already shelved until 2026-06-22.", Shelve(alert, Today.PlusDays(7)).Output.TrimEnd());
        Assert.Single(folder.Decisions());
    }

    [Fact]
    public void AnAnswerLeavesTheSameDecisionButForItsRow()
    {
        folder.PutRows(AnswerRows.Row("anna", Today, AnswerRows.Say(AnswerWord.Shelve, until: Today.PlusDays(7), by: "Kim", note: "on holiday"), "anna"));
        folder.TakeUp();

        Assert.Equal([Decided(Today.PlusDays(7), "Kim", "on holiday")], folder.Decisions().Select(decision => decision with { Via = null }));
    }

    [Theory]
    [InlineData(-1)]
    [InlineData(61)]
    public void ADateBehindOrTooFarAheadIsAUsageError(int days)
    {
        var (code, output, errors) = Shelve(alert, Today.PlusDays(days));

        Assert.Equal((ExitCode.Usage, ""), (code, output));
        Assert.EndsWith("is not a date from 2026-06-15 to 2026-08-14", errors.TrimEnd(), StringComparison.Ordinal);
        Assert.Empty(folder.Decisions());
    }

    [Fact]
    public void AnUnknownAlertIsAUsageErrorWithTheNearestOne()
    {
        var (code, _, errors) = Shelve(alert.Replace("anna", "ana", StringComparison.Ordinal), Today);

        Assert.Equal(ExitCode.Usage, code);
        Assert.EndsWith($"is no alert known here; did you mean \"{alert}\"?", errors.TrimEnd(), StringComparison.Ordinal);
    }

    [Fact]
    public void WhatIsOverIsNotShelved()
    {
        folder.Put("anna/late.fit", Some.Fit(Some.Yesterday, 60));
        folder.Sweep();

        Assert.Equal("Nothing to shelve: the alert is returned.", Shelve(alert, Today).Output.TrimEnd());
        Assert.Empty(folder.Decisions());
    }

    [Fact]
    public void ItIsPossibleWhileAnotherProcessHoldsTheLockAndIsListedAndExplained()
    {
        using var running = Workplace.OpenToWork(folder.ConfigPath);
        var until = SystemClock.Instance.GetCurrentInstant().InUtc().Date.PlusDays(3).ToString("uuuu-MM-dd", CultureInfo.InvariantCulture);

        var ended = Loadwatch.Run("shelve", alert, "--until", until, "--by", "Kim", "--config", folder.ConfigPath);

        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        Assert.Contains($"unacknowledged, shelved until {until}, raised 2026-06-14", Loadwatch.Run("alerts", "--config", folder.ConfigPath).Output, StringComparison.Ordinal);
        Assert.Matches($@"shelved until {until} \d{{4}}-\d\d-\d\dT\S+Z by Kim\n", Loadwatch.Run("explain", alert, "--config", folder.ConfigPath).Output);
        Assert.Equal(64, Loadwatch.Run("shelve", alert, "--config", folder.ConfigPath).Code);
    }

    private Decision Decided(LocalDate until, string by, string note) =>
        new(DecisionKind.Shelve, alert, "anna", WorkingFolder.Now, by, note) { From = Today, Until = until };

    private (int Code, string Output, string Errors) Shelve(string id, LocalDate until, string? by = null, string? note = null)
    {
        using var workplace = Workplace.OpenToDecide(folder.ConfigPath);
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var errors = new StringWriter(CultureInfo.InvariantCulture);
        var code = ShelveCommand.Run(workplace, id, until, new Circumstances(WorkingFolder.Now, by, note), output, errors);
        return (code, output.ToString(), errors.ToString());
    }
}
