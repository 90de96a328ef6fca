using CsCheck;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Plans;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Alerts;

public class AlertReviewTests
{
    private static readonly FindingKey Legs = new("anna", "stimulus_gap", BodyRegion.Legs);

    private static readonly FindingKey Load = new("anna", "load_ratio", null);

    [Fact]
    public void AFindingWithoutAnAlertRaisesOneOnTheEvaluationDate()
    {
        var result = Review(5, [], Find(Legs, 5, since: 2));

        var alert = Assert.Single(result.Alerts);
        Assert.Equal(new Alert(Legs, On(5), On(5), AlertState.Unacknowledged, Severity.Notice, "stimulus_gap on 5"), alert);
        Assert.Equal("anna|stimulus_gap|legs|2026-01-10", alert.Id);
        AssertChange(result, 1, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised);
        Assert.NotNull(result.Changes[0].Evidence);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged)]
    [InlineData(AlertState.Acknowledged)]
    public void AFindingThatStillHoldsMovesTheDateAndRefreshesTheText(AlertState state)
    {
        var result = Review(6, [Alert(state)], Find(Legs, 6));

        Assert.Equal(Alert(state) with { Judged = On(6), Text = "stimulus_gap on 6" }, Assert.Single(result.Alerts));
        Assert.Empty(result.Changes);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged)]
    [InlineData(AlertState.Acknowledged)]
    public void ARiseInSeverityIsAChangeAndAsksToBeAcknowledged(AlertState state)
    {
        var result = Review(6, [Alert(state)], Find(Legs, 6, severity: Severity.Warning));

        AssertChange(result, 4, state, AlertState.Unacknowledged, AlertChangeReason.SeverityRose);
        Assert.Equal(Severity.Warning, result.Changes[0].Severity);
        Assert.Equal(Severity.Warning, result.Alerts[0].Severity);
    }

    [Fact]
    public void AFallInSeverityLeavesItAcknowledged()
    {
        var result = Review(6, [Alert(AlertState.Acknowledged) with { Severity = Severity.Warning }], Find(Legs, 6));

        AssertChange(result, 4, AlertState.Acknowledged, AlertState.Acknowledged, AlertChangeReason.SeverityFell);
        Assert.Equal(Severity.Notice, result.Alerts[0].Severity);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged, AlertState.Returned)]
    [InlineData(AlertState.Acknowledged, AlertState.Normal)]
    public void WithoutItsFindingAnAlertReturns(AlertState from, AlertState to)
    {
        var result = Review(6, [Alert(from)]);

        AssertChange(result, 4, from, to, AlertChangeReason.ReturnedToNormal);
        Assert.Equal(Alert(from) with { State = to }, result.Alerts[0]);
        Assert.Null(result.Changes[0].Evidence);
    }

    /// <summary>I-14.</summary>
    [Theory]
    [InlineData(AlertState.Unacknowledged, AlertState.Returned)]
    [InlineData(AlertState.Acknowledged, AlertState.Normal)]
    public void WhatDidNotEvenHoldWhenItWasJudgedIsCorrected(AlertState from, AlertState to)
    {
        LocalDate? asked = null;
        var result = AlertReview.Review("anna", On(6), [Alert(from)], _ => 3, [], (_, date) =>
        {
            asked = date;
            return false;
        });

        AssertChange(result, 4, from, to, AlertChangeReason.Corrected);
        Assert.Equal(On(5), asked);
    }

    [Fact]
    public void ALateFileOnTheVeryDateOfTheReviewIsACorrection() =>
        AssertChange(Review(5, [Alert(AlertState.Unacknowledged)]), 4, AlertState.Unacknowledged, AlertState.Returned, AlertChangeReason.Corrected);

    [Fact]
    public void AReturnedAlertIsRaisedAgainByTheNextFinding()
    {
        var result = Review(9, [Alert(AlertState.Returned)], Find(Legs, 9, severity: Severity.Warning));

        AssertChange(result, 4, AlertState.Returned, AlertState.Unacknowledged, AlertChangeReason.RaisedAgain);
        Assert.Equal((On(5), On(9), Severity.Warning), (result.Alerts[0].Raised, result.Alerts[0].Judged, result.Alerts[0].Severity));
    }

    /// <summary>Returned on the 6th, never acknowledged, raised again on the 25th: it stands since then, under the id that it had.</summary>
    [Fact]
    public void WhatIsRaisedAgainStandsSinceThen()
    {
        var returned = Review(6, [Alert(AlertState.Unacknowledged)]).Alerts;
        var again = Assert.Single(Review(25, [.. returned], Find(Legs, 25)).Alerts);
        var still = Assert.Single(Review(30, [again], Find(Legs, 30)).Alerts);

        Assert.Equal((On(5), On(25), Alert(AlertState.Unacknowledged).Id), (again.Raised, again.StandsSince, again.Id));
        Assert.Equal((On(25), On(30)), (still.StandsSince, still.Judged));
        Assert.False(StaleAlerts.IsStale(again, On(26)));
        Assert.True(StaleAlerts.IsStale(still, On(40)));
    }

    /// <summary>I-14: a late file undoes what was raised on the 9th, and nothing of the 5th, which was over long before.</summary>
    [Fact]
    public void ACorrectionIsAskedAtTheLastRaising()
    {
        var again = Alert(AlertState.Unacknowledged) with { StandsSince = On(9), Judged = On(9) };

        var result = AlertReview.Review("anna", On(10), [again], _ => 3, [], (_, date) => date == On(5));

        AssertChange(result, 4, AlertState.Unacknowledged, AlertState.Returned, AlertChangeReason.Corrected);
        Assert.Equal(On(9), result.Alerts[0].StandsSince);
    }

    [Fact]
    public void AReturnedAlertWithoutFindingWaitsToBeAcknowledged()
    {
        var result = Review(9, [Alert(AlertState.Returned)]);

        Assert.Equal([Alert(AlertState.Returned)], result.Alerts);
        Assert.Empty(result.Changes);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged, AlertState.Acknowledged)]
    [InlineData(AlertState.Returned, AlertState.Normal)]
    public void Acknowledging(AlertState from, AlertState to)
    {
        var result = AlertReview.Acknowledge(Alert(from), On(7), _ => 3);

        AssertChange(result, 4, from, to, AlertChangeReason.Acknowledged);
        Assert.Empty(AlertReview.Acknowledge(result.Alerts[0], On(7), _ => 4).Changes);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged)]
    [InlineData(AlertState.Acknowledged)]
    public void ShelvingKeepsTheState(AlertState state)
    {
        var result = AlertReview.Shelve(Alert(state), On(9), On(7), _ => 3);

        AssertChange(result, 4, state, state, AlertChangeReason.Shelved);
        Assert.Equal(Alert(state) with { ShelvedUntil = On(9) }, result.Alerts[0]);
        Assert.Empty(AlertReview.Shelve(result.Alerts[0], On(9), On(7), _ => 4).Changes);
        AssertChange(AlertReview.Shelve(result.Alerts[0], On(11), On(8), _ => 4), 5, state, state, AlertChangeReason.Shelved);
        AssertChange(AlertReview.Unshelve(result.Alerts[0], On(8), _ => 4), 5, state, state, AlertChangeReason.Unshelved);
    }

    [Theory]
    [InlineData(AlertState.Normal)]
    [InlineData(AlertState.Returned)]
    public void WhatDoesNotStandIsNotShelved(AlertState state) => Assert.Empty(AlertReview.Shelve(Alert(state), On(9), On(7), _ => 3).Changes);

    /// <summary>The date 8 is evaluated on day 9, still shelved; the date 9 on day 10, the first day after.</summary>
    [Fact]
    public void ShelvingEndsByItselfOnTheDayAfterItsLastDate()
    {
        var shelved = Alert(AlertState.Acknowledged) with { ShelvedUntil = On(9) };

        var still = Review(8, [shelved], Find(Legs, 8));
        Assert.Empty(still.Changes);
        Assert.Equal(On(9), still.Alerts[0].ShelvedUntil);
        var over = Review(9, [shelved], Find(Legs, 9));
        AssertChange(over, 4, AlertState.Acknowledged, AlertState.Acknowledged, AlertChangeReason.Unshelved);
        Assert.Null(over.Alerts[0].ShelvedUntil);
    }

    [Fact]
    public void ARiseInSeverityEndsShelvingAtOnceAFallDoesNot()
    {
        var shelved = Alert(AlertState.Acknowledged) with { ShelvedUntil = On(20) };

        var risen = Review(6, [shelved], Find(Legs, 6, severity: Severity.Warning));
        Assert.Equal([(4, AlertChangeReason.SeverityRose), (5, AlertChangeReason.Unshelved)], risen.Changes.Select(change => (change.Sequence, change.Reason)));
        Assert.Null(risen.Alerts[0].ShelvedUntil);
        var fallen = Review(6, [shelved with { Severity = Severity.Warning }], Find(Legs, 6));
        AssertChange(fallen, 4, AlertState.Acknowledged, AlertState.Acknowledged, AlertChangeReason.SeverityFell);
        Assert.Equal(On(20), fallen.Alerts[0].ShelvedUntil);
    }

    [Fact]
    public void AnAlertThatIsOverIsNoLongerShelved()
    {
        var result = Review(6, [Alert(AlertState.Unacknowledged) with { ShelvedUntil = On(20) }]);

        AssertChange(result, 4, AlertState.Unacknowledged, AlertState.Returned, AlertChangeReason.ReturnedToNormal);
        Assert.Null(result.Alerts[0].ShelvedUntil);
    }

    [Fact]
    public void EachKeyHasItsOwnAlert()
    {
        var result = Review(6, [Alert(AlertState.Acknowledged)], Find(Load, 6));

        Assert.Equal([(Load, AlertState.Unacknowledged), (Legs, AlertState.Normal)], result.Alerts.Select(alert => (alert.Key, alert.State)));
        Assert.Equal([AlertChangeReason.Raised, AlertChangeReason.ReturnedToNormal], result.Changes.Select(change => change.Reason));
    }

    [Fact]
    public void OtherPeopleAndOtherDatesArePassedOver()
    {
        var result = Review(6, [], Find(Legs, 5), Find(Legs with { Person = "ben" }, 6));

        Assert.Empty(result.Alerts);
    }

    [Fact]
    public void ANoteRaisesNothingAndKeepsNothingStanding()
    {
        Assert.Empty(Review(6, [], Find(Load, 6, severity: Severity.Note)).Alerts);
        Assert.Equal(AlertState.Returned, Assert.Single(Review(6, [Alert(AlertState.Unacknowledged)], Find(Legs, 6, severity: Severity.Note)).Alerts).State);
    }

    [Theory]
    [InlineData(AlertState.Unacknowledged)]
    [InlineData(AlertState.Acknowledged)]
    [InlineData(AlertState.Returned)]
    public void ARuleThatIsSwitchedOffTakesItsAlertsOutOfServiceAndNothingElse(AlertState state)
    {
        var off = new Watching(new RuleLimits { StimulusGap = new StimulusGapLimits { Enabled = false } }, DayPlan.None);

        var result = AlertReview.Review("anna", On(6), [Alert(state), Alert(state) with { Key = Load }], _ => 3, [], NeverHeld, off);

        Assert.Equal(
            [(Load, AlertWatch.Watched), (Legs, AlertWatch.OutOfService)],
            result.Alerts.Select(alert => (alert.Key, alert.Watch)));
        Assert.Equal(AlertState.Normal, result.Alerts[1].State);
        Assert.Equal(AlertChangeReason.RuleSwitchedOff, result.Changes[^1].Reason);
    }

    /// <summary>The days were computed anew by the new limits, so the finding held on no date: no file was late.</summary>
    [Fact]
    public void WhatOnlyFormerLimitsRaisedIsOverByTheirChangeAndNotCorrected()
    {
        var limits = new RuleLimits();
        var now = new Watching(limits with { StimulusGap = new StimulusGapLimits { NoticeDays = 10 } }, DayPlan.None);
        var told = Alert(AlertState.Acknowledged) with { LimitsHash = RuleBook.LimitsHash(Legs.Rule, limits) };

        AssertChange(AlertReview.Review("anna", On(6), [told], _ => 3, [], NeverHeld, now), 4, AlertState.Acknowledged, AlertState.Normal, AlertChangeReason.LimitsChanged);
        AssertChange(
            AlertReview.Review("anna", On(6), [told], _ => 3, [], (_, _) => true, now), 4, AlertState.Acknowledged, AlertState.Normal, AlertChangeReason.ReturnedToNormal);
        AssertChange(
            AlertReview.Review("anna", On(6), [told], _ => 3, [], NeverHeld, new Watching(limits, DayPlan.None)), 4, AlertState.Acknowledged, AlertState.Normal, AlertChangeReason.Corrected);
    }

    [Fact]
    public void AFindingKeepsByWhichLimitsItHeld()
    {
        var limits = new RuleLimits();

        var result = AlertReview.Review("anna", On(5), [], _ => 0, [Find(Legs, 5)], (_, _) => true, new Watching(limits, DayPlan.None));

        Assert.Equal(RuleBook.LimitsHash(Legs.Rule, limits), Assert.Single(result.Alerts).LimitsHash);
    }

    /// <summary>Ill from the 6th to the 8th, and told only on the 7th: what held on the 5th was no error of data.</summary>
    [Fact]
    public void WhatPlanOrAnswersTurnOffIsSuppressedAndSaysSo()
    {
        var absent = new Watching(new RuleLimits(), DayPlan.None with { Absence = AbsenceWord.Ill });

        var ended = AlertReview.Review("anna", On(6), [Alert(AlertState.Unacknowledged)], _ => 3, [], NeverHeld, absent);
        AssertChange(ended, 4, AlertState.Unacknowledged, AlertState.Normal, AlertChangeReason.SuppressedByPlan);
        Assert.Equal(AlertWatch.SuppressedByDesign, ended.Alerts[0].Watch);
    }

    [Fact]
    public void WhatWouldHoldStandsUntoldUntilItIsWatchedAgain()
    {
        var absent = new Watching(new RuleLimits(), DayPlan.None with { Absence = AbsenceWord.Away });
        var hidden = AlertReview.Review("anna", On(6), [Alert(AlertState.Unacknowledged)], _ => 3, [Find(Legs, 6, severity: Severity.Suppressed)], NeverHeld, absent);
        AssertChange(hidden, 4, AlertState.Unacknowledged, AlertState.Unacknowledged, AlertChangeReason.SuppressedByPlan);
        Assert.False(hidden.Alerts[0].IsTold);

        var still = AlertReview.Review("anna", On(7), hidden.Alerts, _ => 4, [Find(Legs, 7, severity: Severity.Suppressed)], NeverHeld, absent);
        Assert.Empty(still.Changes);

        var again = AlertReview.Review("anna", On(8), still.Alerts, _ => 4, [Find(Legs, 8, severity: Severity.Warning)], (_, _) => true, new Watching(new RuleLimits(), DayPlan.None));
        Assert.Equal([(5, AlertChangeReason.WatchedAgain), (6, AlertChangeReason.SeverityRose)], again.Changes.Select(change => (change.Sequence, change.Reason)));
        Assert.True(again.Alerts[0].IsTold);
    }

    /// <summary>The run of a rule begins anew when it is watched again, so that its finding may be missing for some dates: that is no return.</summary>
    [Fact]
    public void WhatStoodUntoldAndIsNotThereWhenWatchedAgainWasSeenToEndByNobody()
    {
        var untold = Alert(AlertState.Unacknowledged) with { Watch = AlertWatch.SuppressedByDesign };

        var over = AlertReview.Review("anna", On(8), [untold], _ => 4, [], (_, _) => true, Watching.Everything);

        AssertChange(over, 5, AlertState.Unacknowledged, AlertState.Normal, AlertChangeReason.SuppressedByPlan);
    }

    [Fact]
    public void WhatIsSuppressedRaisesNothing() =>
        Assert.Empty(AlertReview.Review("anna", On(6), [], _ => 0, [Find(Legs, 6, severity: Severity.Suppressed)], NeverHeld, Watching.Everything).Alerts);

    [Fact]
    public void AnAlertJudgedOnALaterDateIsLeftAlone()
    {
        var result = Review(4, [Alert(AlertState.Unacknowledged)]);

        Assert.Equal([Alert(AlertState.Unacknowledged)], result.Alerts);
        Assert.Empty(result.Changes);
    }

    [Fact]
    public void WhatIsRaisedOnceMoreOnTheSameDateGoesOnInTheSameHistory()
    {
        var result = AlertReview.Review("anna", On(5), [], _ => 3, [Find(Legs, 5)], (_, _) => true);

        AssertChange(result, 4, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised);
    }

    /// <summary>Any state, any findings of the date: the second review finds nothing to change.</summary>
    [Fact]
    public void TheSameReviewTwiceChangesNothing() => Gen.Select(
        Gen.Enum<AlertState>(),
        Gen.Enum<Severity>(),
        Gen.Enum<Severity>(),
        Gen.Int[0, 2],
        Gen.Int[-1, 4],
        Gen.Bool,
        Gen.Bool).Sample((state, before, now, later, shelved, found, held) =>
    {
        Finding[] findings = found ? [Find(Legs, 5 + later, severity: now), Find(Load, 5 + later)] : [];
        Alert[] current = [Alert(state) with { Severity = before, ShelvedUntil = shelved >= 0 && AlertLife.IsActive(state) ? On(5 + shelved) : null }];
        var first = AlertReview.Review("anna", On(5 + later), current, _ => 3, findings, (_, _) => held);
        var second = AlertReview.Review("anna", On(5 + later), first.Alerts, _ => 4, findings, (_, _) => held);

        Assert.Empty(second.Changes);
        Assert.Equal(first.Alerts.Where(alert => alert.State != AlertState.Normal), second.Alerts);
    });

    private static bool NeverHeld(FindingKey key, LocalDate date) => false;

    private static AlertReviewResult Review(int day, Alert[] current, params Finding[] findings) =>
        AlertReview.Review("anna", On(day), current, id => current.Any(alert => alert.Id == id) ? 3 : 0, findings, (_, _) => true);

    private static Alert Alert(AlertState state) => new(Legs, On(5), On(5), state, Severity.Notice, "as told");

    private static Finding Find(FindingKey key, int day, int? since = null, Severity severity = Severity.Notice) => new(
        key.Person, On(day), key.Rule, key.Region, severity, On(since ?? day), 10, 10, "days", $"{key.Rule} on {day}",
        new Evidence("f", "a choice", []));

    private static void AssertChange(AlertReviewResult result, int sequence, AlertState from, AlertState to, AlertChangeReason reason)
    {
        var change = Assert.Single(result.Changes);
        Assert.Equal((sequence, from, to, reason), (change.Sequence, change.From, change.To, change.Reason));
        Assert.Equal((result.Alerts[0].Id, result.Alerts[0].State), (change.AlertId, to));
    }
}
