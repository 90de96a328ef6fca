using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

public class LoadRatioRuleTests
{
    private static readonly LoadRatioRule Rule = new();

    [Theory]
    [InlineData(1.8, true)]
    [InlineData(1.79999999, false)]
    [InlineData(2.5, true)]
    public void IsRaisedAtTheLimit(double ratio, bool raised) => Assert.Equal(raised, Rule.Of(Ratios(ratio)).Count == 1);

    [Fact]
    public void HoldsUntilBelowTheReturnValue()
    {
        var found = Rule.Of(Ratios(1.7, 1.9, 1.7, 1.6, 1.59, 1.7, 1.8));

        Assert.Equal([On(1), On(2), On(3), On(6)], found.Select(finding => finding.Date));
        Assert.Equal([On(1), On(1), On(1), On(6)], found.Select(finding => finding.Since));
        Assert.All(found, finding => Assert.Equal((Severity.Warning, 1.8, "ratio"), (finding.Severity, finding.Limit, finding.Unit)));
        Assert.Equal([1.9, 1.7, 1.6, 1.8], found.Select(finding => finding.Value));
    }

    [Fact]
    public void AnUnknownStretchNeitherRaisesNorClears()
    {
        Assert.Empty(Rule.Of(Ratios(1.7, null, null)));
        var found = Rule.Of(Ratios(1.9, null, null, 1.5));

        Assert.Equal([On(0), On(1), On(2)], found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal(1.9, finding.Value));
    }

    /// <summary>With the day of the last load gone from the week, its scaled rest would lie above the limit.</summary>
    [Fact]
    public void ADateOfUnknownLoadIsNotReadHoweverWellItsWeekIsCovered()
    {
        Assert.Empty(Rule.Of([Ratio(0, 1.7), Ratio(1, 1.9) with { Load = null }]));
        Assert.Equal(1.9, Rule.Of([Ratio(0, 1.9), Ratio(1, 1.2) with { Load = null }])[^1].Value);
    }

    [Theory]
    [InlineData(AbsenceWord.Away, null)]
    [InlineData(null, 1)]
    [InlineData(null, 14)]
    public void IsOffInAnAbsenceAndAfterTheReturn(AbsenceWord? absence, int? returnDay)
    {
        var plan = DayPlan.None with { Absence = absence, ReturnDay = returnDay };
        var found = Rule.Of([Ratio(0, 1.9), Ratio(1, 2.5) with { Plan = plan }, Ratio(2, 1.7), Ratio(3, 1.8)]);

        Assert.Equal([On(0), On(3)], found.Select(finding => finding.Date));
        Assert.Equal([On(0), On(3)], found.Select(finding => finding.Since));
    }

    [Fact]
    public void QuantitiesAreWatchedBesideTheLoad()
    {
        var limits = Stated with { LoadRatio = Stated.LoadRatio with { Quantities = ["sprints", "distance_above_7_m_s", "banister_trimp"] } };
        var series = new[]
        {
            new QuantitySeries("distance_above_7_m_s", "m", Ratios(1.9, 2)),
            new QuantitySeries("banister_trimp", "AU", Ratios(1.9, 2)),
            new QuantitySeries("unasked", "m", Ratios(1.9, 2)),
        }.ToDictionary(one => one.Quantity);
        Day[] days = [Ratio(0, 1), Ratio(1, 2) with { Plan = DayPlan.None with { ReturnDay = 1 } }];
        var found = Rule.Evaluate(new RuleSubject(Anna, days, limits) { Series = series }).Told();

        var finding = Assert.Single(found);
        Assert.Equal((On(0), "distance_above_7_m_s"), (finding.Date, finding.Quantity));
        Assert.StartsWith("Distance at 7 m/s and faster of the last 7 days is 1.9 times the usual week (380 against 200 m)", finding.Text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(28, 1)]
    [InlineData(27, 0)]
    public void TheFirstCoveredDayLiesFarEnoughBack(int days, int count) =>
        Assert.Equal(count, Rule.Of([Ratio(0, 2) with { DaysSinceFirstCovered = days }]).Count);

    [Theory]
    [InlineData(5, 22, 1)]
    [InlineData(4, 22, 0)]
    [InlineData(5, 21, 0)]
    public void EnoughDaysAreCovered(int of7, int of28, int count) =>
        Assert.Equal(
            count,
            Rule.Of([Ratio(0, 2) with { Coverage7 = Significant.Round(of7 / 7.0), Coverage28 = Significant.Round(of28 / 28.0) }]).Count);

    [Fact]
    public void ThinCoverageDoesNotClearEither() =>
        Assert.Equal(2, Rule.Of([Ratio(0, 2), Ratio(1, 1) with { Coverage7 = Significant.Round(4 / 7.0) }]).Count);

    [Theory]
    [InlineData(100, 0)]
    [InlineData(100.001, 1)]
    public void TheChronicLoadMustExceedItsShareOfTheYear(double chronic, int count) =>
        Assert.Equal(count, Rule.Of([Ratio(0, 2) with { Chronic = chronic, ChronicMedian = 250 }]).Count);

    [Fact]
    public void LimitsOfTheGroupCount()
    {
        var limits = Stated with { LoadRatio = Stated.LoadRatio with { Raise = 1.5, Return = 1.2 } };

        Assert.Equal(3, Rule.Of(Ratios(1.4, 1.5, 1.3, 1.2, 1.1), limits: limits).Count);
    }

    [Theory]
    [InlineData("Load of the last 7 days is 1.9 times the usual week (380 against 200 AU), above the limit of 1.8 since 5 January.", 1.9)]
    [InlineData("Load of the last 7 days is 1.8 times the usual week (360 against 200 AU), at the limit of 1.8 or above since 5 January.", 1.8)]
    [InlineData("Load of the last 7 days is 1.82 times the usual week (364 against 200 AU), above the limit of 1.8 since 5 January.", 1.82)]
    [InlineData(
        "Load of the last 7 days is 1.7 times the usual week (340 against 200 AU); it passed the limit of 1.8 on 5 January and returns below 1.6.",
        1.9,
        1.7)]
    [InlineData(
        "Load of the last 7 days was 1.9 times the usual week (380 against 200 AU) on 5 January, not known since, above the limit of 1.8 since 5 January.",
        1.9,
        null)]
    public void SaysWhatItIs(string sentence, params object?[] ratios) =>
        Assert.Equal(sentence, Rule.Of(Ratios([.. ratios.Select(ratio => (double?)ratio)]))[^1].Text);

    [Fact]
    public void NamesTheYearOfAnotherYear()
    {
        const int first = -6;

        Assert.EndsWith("since 30 December 2025.", Rule.Of([Ratio(first, 1.9), Ratio(0, 1.9)])[^1].Text, StringComparison.Ordinal);
        Assert.EndsWith("since 30 December.", Rule.Of([Ratio(first, 1.9)])[^1].Text, StringComparison.Ordinal);
    }

    [Fact]
    public void NamesTheUnitOfTheGroup() =>
        Assert.Contains("(380 against 200 kJ)", new LoadRatioRule().Evaluate(new RuleSubject(Anna, Ratios(1.9), Stated) { LoadUnit = "kJ" }).First().Text, StringComparison.Ordinal);

    [Fact]
    public void TheEvidenceIsEnoughToComputeTheValueAgain()
    {
        var evidence = Rule.Of(Ratios(1.9, 1.7))[^1].Evidence;
        var values = evidence.Inputs.ToDictionary(item => item.Name, item => item.Value, StringComparer.Ordinal);

        Near(1.7, values["acute"] / values["chronic_before"]);
        Assert.Equal((1.7, 1.8, 1.6), (values["ratio_uncoupled"], values["raise"], values["return"]));
        Assert.Equal((1, 100), (values["coverage_28"], values["days_since_first_covered"]));
        Assert.StartsWith("Windt and Gabbett 2018", evidence.Source, StringComparison.Ordinal);
    }

    /// <summary>By hand: 100 a day, then 180 a day: the 7-day load passes 1.8 usual weeks when the whole week is at 180.</summary>
    [Fact]
    public void FromActivitiesToTheFinding()
    {
        var found = Rule.Of(Daily([.. Enumerable.Repeat(100.0, 40), .. Enumerable.Repeat(180.0, 10)]));

        Assert.Equal(On(46), found[0].Date);
        Assert.Equal(1.8, found[0].Value);
    }

    /// <summary>An empty month is no base: 4 weeks of rest between recordings of nothing, then a session.</summary>
    [Fact]
    public void ASessionAfterANearEmptyMonthRaisesNothing()
    {
        var days = Daily([.. Enumerable.Repeat(100.0, 100), .. Enumerable.Repeat(5.0, 40), 300]);

        Assert.True(days[^1].RatioUncoupled > 1.8);
        Assert.Empty(Rule.Of(days));
    }
}
