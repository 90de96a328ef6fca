using System.Globalization;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Plans;
using NodaTime;
using LoadWatch.Tests.Days;

namespace LoadWatch.Tests.Alerts;

public class LatenessTests
{
    private static readonly FindingKey Silence = new("anna", "silence", null);

    /// <summary>Sorted: seven times 0, then 2, 4, 6; rank ceil(0.9 x 10) = 9.</summary>
    [Fact]
    public void ItIsTheValueThatNineOfTenDatesDoNotPass() =>
        Assert.Equal(new Lateness(4, 10), Lateness.Of([On(-30, -30), On(1, 1), On(2, 4), On(3, 3), On(4, 8), On(5, 5), On(6, 6), On(7, 13), On(8, 8), On(9, 9), On(10, 10)], Training.On(20)));

    [Fact]
    public void OfFewerThanSixDatesNothingIsKnown()
    {
        Assert.Equal(Lateness.Unknown, Lateness.Of([], Training.On(20)));
        Assert.Equal(Lateness.Unknown, Lateness.Of([On(0, 0), .. Late(1, 5, days: 3)], Training.On(20)));
        Assert.Equal(new Lateness(3, 6), Lateness.Of([On(0, 0), .. Late(1, 6, days: 3)], Training.On(20)));
    }

    /// <summary>An import brings the past in one night; a device that was lost and found brings what is older than 14 days.</summary>
    [Fact]
    public void WhatTheFirstNightBroughtAndABackFillSayNothing()
    {
        var import = Enumerable.Range(1, 30).Select(day => On(day, 31)).ToList();

        Assert.Equal(Lateness.Unknown, Lateness.Of(import, Training.On(60)));
        Assert.Equal(new Lateness(0, 10), Lateness.Of([.. import, .. Late(32, 41, days: 0)], Training.On(60)));
        Assert.Equal(new Lateness(0, 10), Lateness.Of([.. import, .. Late(32, 41, days: 0), On(42, 57)], Training.On(60)));
        Assert.Equal(new Lateness(14, 6), Lateness.Of([.. import, .. Late(32, 37, days: 14)], Training.On(60)));
    }

    /// <summary>The second device, or the same session exported once more, is not late: the date had its recording.</summary>
    [Fact]
    public void OfOneDateTheFirstSightCounts() =>
        Assert.Equal(new Lateness(1, 6), Lateness.Of([On(0, 0), .. Late(1, 6, days: 9), .. Late(1, 6, days: 1)], Training.On(20)));

    [Fact]
    public void WhatIsLaterThanTheDateOrBeforeTwelveWeeksIsPassedOver()
    {
        (LocalDate, LocalDate)[] came = [On(0, 0), .. Late(1, 6, days: 5), .. Late(50, 60, days: 0)];

        Assert.Equal(new Lateness(5, 6), Lateness.Of(came, Training.On(49)));
        Assert.Equal(new Lateness(0, 11), Lateness.Of(came, Training.On(6 + Lateness.LookBackDays)));
    }

    /// <summary>Silent since the 10th by the rhythm: files that come within 5 days have until the 15th.</summary>
    [Fact]
    public void SilenceOfSomebodyWhoseFilesComeLateIsToldOnceTheyHadTheirTime()
    {
        Assert.Empty(Review(14, [], Find(14, since: 10)).Alerts);
        var raised = Assert.Single(Review(15, [], Find(15, since: 10)).Alerts);

        Assert.Equal((Training.On(15), "No recording for 9 days. Files usually come within 5 days."), (raised.Raised, raised.Text));
        Assert.Contains(Review(15, [], Find(15, since: 10)).Changes[0].Evidence!.Inputs, item => item is { Name: "lateness", Value: 5, Unit: "days" });
        Assert.Equal(Training.On(10), Assert.Single(Review(10, [], Find(10, since: 10), late: 0).Alerts).Raised);
    }

    /// <summary>Planned sessions were given two days by the rule.</summary>
    [Fact]
    public void WhatTheRuleHasWaitedIsNotWaitedTwice()
    {
        Assert.Empty(Review(12, [], Find(12, since: 10, unit: "sessions")).Alerts);
        Assert.Single(Review(13, [], Find(13, since: 10, unit: "sessions")).Alerts);
        Assert.Single(Review(10, [], Find(10, since: 10, unit: "sessions"), late: 2).Alerts);
    }

    [Fact]
    public void WhatStandsGoesOnAndWhatHasReturnedWaits()
    {
        var standing = new Alert(Silence, Training.On(3), Training.On(11), AlertState.Unacknowledged, Severity.Notice, "as told");

        var on = Review(12, [standing], Find(12, since: 10));
        Assert.Empty(on.Changes);
        Assert.Equal(Training.On(12), on.Alerts[0].Judged);

        var returned = standing with { State = AlertState.Returned };
        var waits = Review(12, [returned], Find(12, since: 10));
        Assert.Empty(waits.Changes);
        Assert.Equal([returned], waits.Alerts);
        var again = Review(15, [.. waits.Alerts], Find(15, since: 10));
        Assert.Equal([AlertChangeReason.RaisedAgain], again.Changes.Select(change => change.Reason));
        Assert.Equal(Training.On(15), again.Alerts[0].StandsSince);
    }

    /// <summary>
    /// Silence, and what tells that little was done, for a recording to come may hold more; what tells that much was done only where it was made whole from a part.
    /// Nobody asks where the others hold how late files come.
    /// </summary>
    [Theory]
    [InlineData("silence", true)]
    [InlineData("stimulus_gap", true)]
    [InlineData("stimulus_low", true)]
    [InlineData("falling_load", true)]
    [InlineData("weekly_jump", true, "acute 800", "acute_known 600")]
    [InlineData("weekly_jump", false, "acute 800", "acute_known 800")]
    [InlineData("weekly_jump", false)]
    [InlineData("load_ratio", true, "coverage_7 0.857142857")]
    [InlineData("load_ratio", false, "coverage_7 1")]
    [InlineData("load_ratio", false)]
    [InlineData("session_spike", false)]
    [InlineData("hard_days", false)]
    [InlineData("monotony", false)]
    [InlineData("not_usable", false)]
    public void WhatRestsOnRecordingsThatAreMissingWaitsAndNothingElse(string rule, bool waits, params string[] inputs)
    {
        var finding = Find(12, since: 10) with { Rule = rule, Evidence = new Evidence("f", "a choice", [.. inputs.Select(Item)]) };
        var asked = false;
        var watching = new Watching(new RuleLimits(), DayPlan.None) { Lateness = () => Told(new Lateness(5, 20)) };

        Assert.Equal(waits ? 0 : 1, AlertReview.Review("anna", Training.On(12), [], _ => 0, [finding], (_, _) => true, watching).Alerts.Count);
        Assert.Equal(waits, asked);

        Lateness Told(Lateness late)
        {
            asked = true;
            return late;
        }
    }

    private static EvidenceItem Item(string text) => new(text.Split(' ')[0], double.Parse(text.Split(' ')[1], CultureInfo.InvariantCulture), "");

    private static AlertReviewResult Review(int day, Alert[] current, Finding finding, int late = 5) => AlertReview.Review(
        "anna", Training.On(day), current, _ => 0, [finding], (_, _) => true, new Watching(new RuleLimits(), DayPlan.None) { Lateness = () => new Lateness(late, 20) });

    private static Finding Find(int day, int since, string unit = "days") => new(
        "anna", Training.On(day), "silence", null, Severity.Notice, Training.On(since), 9, 5, unit, "No recording for 9 days.", new Evidence("f", "a choice", []));

    private static IEnumerable<(LocalDate, LocalDate)> Late(int from, int to, int days) => Enumerable.Range(from, to - from + 1).Select(day => On(day, day + days));

    private static (LocalDate Recorded, LocalDate Came) On(int recorded, int came) => (Training.On(recorded), Training.On(came));
}
