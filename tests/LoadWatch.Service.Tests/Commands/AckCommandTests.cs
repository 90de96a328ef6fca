using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage.Decisions;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

public sealed class AckCommandTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly string alert;

    public AckCommandTests()
    {
        folder.Fill(Some.Fortnight());
        folder.Sweep();
        alert = folder.Read((_, session) => Assert.Single(session.Alerts.All()).Id);
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AnAlertIsAcknowledgedWithItsDecisionItsChangeAndAnAudit()
    {
        var (code, output, errors) = Ack(alert, " Kim ", "new phone, not synced");

        Assert.Equal((ExitCode.Ok, ""), (code, errors));
        Assert.StartsWith("Acknowledged: No recording for 4 days", output, StringComparison.Ordinal);
        folder.Read((_, session) =>
        {
            Assert.Equal(AlertState.Acknowledged, session.Alerts.Get(alert)!.State);
            var change = session.Alerts.Changes.Of(alert)[^1];
            Assert.Equal(
                (2, new LocalDate(2026, 6, 15), AlertState.Unacknowledged, AlertState.Acknowledged, AlertChangeReason.Acknowledged, null),
                (change.Sequence, change.Date, change.From, change.To, change.Reason, change.Evidence));
            var decision = new Decision(DecisionKind.Acknowledge, alert, "anna", WorkingFolder.Now, "Kim", "new phone, not synced");
            Assert.Equal([decision], session.Decisions.All());
            Assert.Equal(("acknowledged", alert), (session.Audits.All()[^1].What, session.Audits.All()[^1].Detail));
            return true;
        });
    }

    [Fact]
    public void AcknowledgingTwiceSaysSoAndChangesNothing()
    {
        Ack(alert, "Kim");
        var before = folder.Export();

        var (code, output, errors) = Ack(alert, "Alex", now: WorkingFolder.Now + Duration.FromHours(1));

        Assert.Equal((ExitCode.Ok, "Already acknowledged 2026-06-15T06:00:00Z by Kim", ""), (code, output.TrimEnd(), errors));
        Assert.Equal(before, folder.Export());
        Assert.Equal((1, 2), folder.Read((_, session) => (session.Decisions.All().Count, session.Alerts.Changes.Of(alert).Count)));
    }

    [Fact]
    public void AnAlertThatIsOverHasNothingToAcknowledge()
    {
        Ack(alert);
        folder.Put("anna/late.fit", Some.Fit(Some.Yesterday, 60));
        folder.Sweep();

        var (code, output, _) = Ack(alert);

        Assert.Equal((ExitCode.Ok, "Nothing to acknowledge: the alert is normal."), (code, output.TrimEnd()));
    }

    [Fact]
    public void AnUnknownAlertIsAUsageErrorWithTheNearestOne()
    {
        var (code, output, errors) = Ack(alert.Replace("anna", "ana", StringComparison.Ordinal));

        Assert.Equal((ExitCode.Usage, ""), (code, output));
        Assert.EndsWith($"is no alert known here; did you mean \"{alert}\"?", errors.TrimEnd(), StringComparison.Ordinal);
        Assert.Empty(folder.Read((_, session) => session.Decisions.All()));
    }

    [Fact]
    public void LaterSweepsAndARebuildKeepItAndTheNextBriefAsksForNothingMore()
    {
        Assert.Contains("- Anna Ahola (notice, ", TomorrowsBrief(), StringComparison.Ordinal);

        Ack(alert);
        folder.Sweep();
        folder.Rebuild();
        folder.Sweep(WorkingFolder.Now + Duration.FromDays(1));

        Assert.Equal(AlertState.Acknowledged, folder.Read((_, session) => session.Alerts.Get(alert)!.State));
        Assert.DoesNotContain("- Anna Ahola (notice, ", TomorrowsBrief(), StringComparison.Ordinal);
        Assert.Contains("Anna Ahola", TomorrowsBrief(), StringComparison.Ordinal);
    }

    [Fact]
    public void ItIsPossibleWhileAnotherProcessHoldsTheLockAndIsExplained()
    {
        using var running = Workplace.OpenToWork(folder.ConfigPath);

        var ended = Loadwatch.Run("ack", alert, "--by", "Kim", "--note", "called her", "--config", folder.ConfigPath);

        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        var explained = Loadwatch.Run("explain", alert, "--config", folder.ConfigPath).Output;
        Assert.Matches(@"acknowledged \d{4}-\d\d-\d\dT\S+Z by Kim: called her\n", explained);
        Assert.Contains("acknowledged: unacknowledged -> acknowledged", explained, StringComparison.Ordinal);
    }

    [Fact]
    public void ThePageIsWrittenAgainAlthoughNothingElseIsNew()
    {
        var page = Path.Combine(folder.Root, "pages", "staff.html");
        using var running = Workplace.OpenToWork(folder.ConfigPath);
        running.NewSweep(WorkingFolder.Now).Run(TestContext.Current.CancellationToken);
        File.WriteAllText(page, "old");
        File.SetLastWriteTimeUtc(page, WorkingFolder.Now.ToDateTimeUtc());
        running.NewSweep(WorkingFolder.Now).Run(TestContext.Current.CancellationToken);
        Assert.Equal("old", File.ReadAllText(page));

        Ack(alert);
        running.NewSweep(WorkingFolder.Now).Run(TestContext.Current.CancellationToken);

        Assert.NotEqual("old", File.ReadAllText(page));
    }

    private string TomorrowsBrief() => Loadwatch.Run("brief", "--as-of", "2026-06-16T06:00:00Z", "--config", folder.ConfigPath).Output;

    private (int Code, string Output, string Errors) Ack(string id, string? by = null, string? note = null, Instant? now = null)
    {
        using var workplace = Workplace.OpenToDecide(folder.ConfigPath);
        using var output = new StringWriter(CultureInfo.InvariantCulture);
        using var errors = new StringWriter(CultureInfo.InvariantCulture);
        var code = AckCommand.Run(workplace, id, new Circumstances(now ?? WorkingFolder.Now, by, note), output, errors);
        return (code, output.ToString(), errors.ToString());
    }
}
