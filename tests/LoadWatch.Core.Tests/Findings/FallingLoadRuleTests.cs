using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

/// <summary>Ten weeks of 100 a day: the usual week is 700.</summary>
public class FallingLoadRuleTests
{
    private static readonly FallingLoadRule Rule = new();
    private static readonly double[] Usual = [.. Same(100, 70)];

    [Theory]
    [InlineData(60, null)]
    [InlineData(59.999, Severity.Notice)]
    [InlineData(34, Severity.Notice)]
    [InlineData(33.999, Severity.Warning)]
    [InlineData(0, Severity.Warning)]
    public void IsRaisedUnderTheLimit(double load, Severity? severity) =>
        Assert.Equal(severity, Rule.Of(DaysOf([.. Usual, .. Same(load, 14)])).LastOrDefault(finding => finding.Date == On(83))?.Severity);

    /// <summary>By hand: 14 days of 59 are 413 a week; with 3 days of 100 among them 949 / 1400 = 67.8 %, with 4 of them 990 / 1400 = 70.7 %.</summary>
    [Fact]
    public void ItHoldsUntilTheReturnValue()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Same(59, 14), .. Same(100, 6)]));

        Assert.Equal([On(83), On(84), On(85), On(86)], found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal((Severity.Notice, On(83), 0.6, "ratio"), (finding.Severity, finding.Since, finding.Limit, finding.Unit)));
        Assert.Equal(0.59, found[0].Value);
        Near(949.0 / 1400, found[^1].Value);
        Assert.Equal("Load of the last 14 days is 59 % of the usual (413 a week against 700 AU), under the limit of 60 %; low since 29 March.", found[0].Text);
        Assert.Equal(
            "Load of the last 14 days is 68 % of the usual (475 a week against 700 AU); it passed the limit of 60 % on 29 March and returns at 70 %.", found[^1].Text);
    }

    /// <summary>Of the last 14 days 4 or 5 are unknown.</summary>
    [Theory]
    [InlineData(4, 1)]
    [InlineData(5, 0)]
    public void EnoughDaysAreKnown(int unknown, int count) =>
        Assert.Equal(count, Rule.Of(DaysOf([.. Repeat(100, 70), .. Repeat(null, unknown), .. Repeat(50, 14 - unknown)])).Count(finding => finding.Date == On(83)));

    [Fact]
    public void AnUnknownTailNeitherRaisesNorClears()
    {
        Assert.Empty(Rule.Of(DaysOf(Usual, unknownTail: 40)));
        Assert.Equal(On(123), Rule.Of(DaysOf([.. Usual, .. Same(50, 14)], unknownTail: 40))[^1].Date);
    }

    /// <summary>Before the 14 days lie 5 whole weeks and 7, 5 or 4 days.</summary>
    [Theory]
    [InlineData(42, 1)]
    [InlineData(40, 1)]
    [InlineData(39, 0)]
    public void EnoughWeeksAreKnownBefore(int days, int count) =>
        Assert.Equal(count, Rule.Of(DaysOf([.. Same(100, days), .. Same(50, 14)])).Count(finding => finding.Date == On(days + 13)));

    [Theory]
    [InlineData(PlanWord.LightWeek)]
    [InlineData(PlanWord.OffSeason)]
    public void ItIsOffInAPhaseAndItsDaysDoNotCountAfterIt(PlanWord word)
    {
        var plan = Phase(word, 70, 76);

        Assert.Empty(Rule.Of(DaysOf([.. Usual, .. Same(10, 7), .. Same(100, 14)], plan)));
        Assert.NotEmpty(Rule.Of(DaysOf([.. Usual, .. Same(10, 7), .. Same(100, 14)])));
    }

    [Fact]
    public void AFadeFromBeforeALightWeekIsReadOnAfterIt()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Same(50, 14), .. Same(10, 7), .. Same(50, 3)], Phase(PlanWord.LightWeek, 84, 90)));

        Assert.Equal([On(81), On(82), On(83), On(91), On(92), On(93)], found.Select(finding => finding.Date));
        Assert.Equal(On(91), found[^1].Since);
        Assert.Equal(0.5, found[^1].Value);
    }

    /// <summary>Five of the eight weeks before are off-season.</summary>
    [Fact]
    public void AfterALongOffSeasonTheUsualIsNotKnown() =>
        Assert.Empty(Rule.Of(DaysOf([.. Usual, .. Same(10, 35), .. Same(40, 20)], Phase(PlanWord.OffSeason, 70, 104))));

    [Fact]
    public void ItIsOffInAnAbsenceAndAfterTheReturn()
    {
        double[] loads = [.. Usual, .. Same(20, 30)];

        Assert.Empty(Rule.Of(DaysOf(loads, Absent(74, 85))));
        Assert.Contains(Rule.Of(DaysOf(loads)), finding => finding.Date == On(80));
    }

    [Fact]
    public void ATravelDayIsNotCountedAndEndsNothing()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Same(50, 14), 0, 50], Phase(PlanWord.Travel, 84, 84)));

        Assert.Contains(found, finding => finding.Date == On(84));
        Assert.Equal(0.5, found[^1].Value);
    }

    [Fact]
    public void AQuantityHasFindingsOfItsOwn()
    {
        var limits = Stated with { FallingLoad = Stated.FallingLoad with { Quantities = ["distance_above_5_5_m_s"] } };
        var series = new QuantitySeries("distance_above_5_5_m_s", "m", DaysOf([.. Usual, .. Same(30, 14)]));
        var found = Rule.Evaluate(new RuleSubject(Anna, DaysOf([.. Usual, .. Same(100, 14)]), limits)
        {
            Series = new Dictionary<string, QuantitySeries> { [series.Quantity] = series },
        }).ToList();

        Assert.Equal(("distance_above_5_5_m_s", Severity.Warning), (found[^1].Quantity, found[^1].Severity));
        Assert.StartsWith("Distance at 5.5 m/s and faster of the last 14 days is 30 % of the usual (210 a week against 700 m)", found[^1].Text, StringComparison.Ordinal);
    }
}
