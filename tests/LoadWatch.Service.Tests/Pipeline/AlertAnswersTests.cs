using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Rows;
using LoadWatch.Storage.Decisions;
using NodaTime;
using static LoadWatch.Service.Tests.Pipeline.AnswerRows;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Seen and shelve by a table of answers.</summary>
public sealed class AlertAnswersTests : IDisposable
{
    private static readonly LocalDate Today = new(2026, 6, 15);

    private static readonly Instant Later = WorkingFolder.Now + Duration.FromDays(1);

    private readonly WorkingFolder folder = new();

    public AlertAnswersTests() => folder.Fill(Some.Fortnight());

    public void Dispose() => folder.Dispose();

    /// <summary>The date 14 was evaluated on day 15, in the morning.</summary>
    [Theory]
    [InlineData(15, 15, null, true)]
    [InlineData(14, 15, null, true)]
    [InlineData(14, 15, "silence", true)]
    [InlineData(14, 15, "load_ratio", false)]
    [InlineData(13, 15, null, false)] // Raised after the row's date.
    [InlineData(14, 14, null, false)] // The row came before it could be told.
    public void SeenAcknowledgesWhatWasRaisedAndToldByThen(int date, int cameOn, string? rule, bool isSeen)
    {
        folder.Sweep();
        folder.PutRows(Row("anna", new LocalDate(2026, 6, date), Say(AnswerWord.Seen, rule: rule, by: "Kim"), "anna", Instant.FromUtc(2026, 6, cameOn, 5, 0)));

        folder.TakeUp();

        Assert.Equal(isSeen ? AlertState.Acknowledged : AlertState.Unacknowledged, Alert().State);
        Assert.Equal(isSeen ? [new Decision(DecisionKind.Acknowledge, Alert().Id, "anna", WorkingFolder.Now, "Kim", null)] : [], folder.Decisions().Select(decision => decision with { Via = null }));
    }

    [Fact]
    public void WhatRisesLaterIsNotTouchedAndWhatWasSeenStaysSeen()
    {
        folder.Sweep();
        folder.PutRows(Row("squad", Today, Say(AnswerWord.Seen)));
        folder.TakeUp();
        folder.Write((_, session) =>
        {
            var risen = Alert() with { State = AlertState.Unacknowledged, Severity = Severity.Warning };
            session.Alerts.Put(risen);
            session.Alerts.Changes.Append(new AlertChange(risen.Id, 3, Today, AlertState.Acknowledged, AlertState.Unacknowledged, AlertChangeReason.SeverityRose, Severity.Warning, "risen", null));
            return true;
        });

        folder.TakeUp(Later);
        Assert.Equal(AlertState.Unacknowledged, Alert().State);

        folder.PutRows(Row("anna", Today.PlusDays(1), Say(AnswerWord.Seen), "anna", Later));
        folder.TakeUp(Later);
        Assert.Equal(AlertState.Acknowledged, Alert().State);
        folder.PutRows();
        Assert.Equal(1, folder.TakeUp(Later).Withdrawn);
        Assert.Equal(AlertState.Acknowledged, Alert().State);
    }

    [Fact]
    public void ARowIsFollowedInTheVeryNightThatRaisesTheAlert()
    {
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Seen), "anna"));

        folder.Sweep();

        Assert.Equal(AlertState.Acknowledged, Alert().State);
        Assert.DoesNotContain("- Anna Ahola (notice)", folder.NoticeText, StringComparison.Ordinal);
        var before = folder.Everything();
        folder.Sweep();
        Assert.Equal(before, folder.Everything());
    }

    [Fact]
    public void ShelveHoldsAnAlertBackUpToItsDateAndNoLonger()
    {
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Shelve, until: Today.PlusDays(1)), "anna"));
        folder.Sweep();
        Assert.Equal((AlertState.Unacknowledged, Today.PlusDays(1)), (Alert().State, Alert().ShelvedUntil));
        Assert.Contains("\"shelved_until\":\"2026-06-16\"", folder.Export("alerts"), StringComparison.Ordinal);
        Assert.Contains("All quiet", folder.NoticeText, StringComparison.Ordinal);

        folder.Sweep(Later);
        Assert.Equal(Today.PlusDays(1), Alert().ShelvedUntil);

        folder.Sweep(Later + Duration.FromDays(1));
        Assert.Null(Alert().ShelvedUntil);
        Assert.Equal(
            [AlertChangeReason.Raised, AlertChangeReason.Shelved, AlertChangeReason.Unshelved],
            folder.Read((_, session) => session.Alerts.Changes.Of(Alert().Id).Select(change => change.Reason)));
        Assert.Equal(0, folder.TakeUp(Later + Duration.FromDays(1)).Made);
    }

    [Fact]
    public void ARowThatGoesTellsTheAlertAgainUnlessAnotherOneShelvesIt()
    {
        folder.Sweep();
        var longer = Row("squad", Today, Say(AnswerWord.Shelve, until: Today.PlusDays(9)));
        folder.PutRows(Row("anna", Today, Say(AnswerWord.Shelve, until: Today.PlusDays(3)), "anna"), longer);
        folder.TakeUp();
        Assert.Equal(Today.PlusDays(9), Alert().ShelvedUntil);

        folder.PutRows(Row("anna", Today, Say(AnswerWord.Shelve, until: Today.PlusDays(3)), "anna"));
        folder.TakeUp();
        Assert.Equal(Today.PlusDays(3), Alert().ShelvedUntil);

        folder.PutRows();
        folder.TakeUp();
        Assert.Null(Alert().ShelvedUntil);
    }

    private Alert Alert() => folder.Read((_, session) => Assert.Single(session.Alerts.All()));
}
