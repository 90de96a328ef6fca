using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Stimulus;
using LoadWatch.Tests.Days;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

public class StimulusGapRuleTests
{
    private static readonly StimulusGapRule Rule = new();

    /// <summary>Ages on 31 December 2026: born 1967 is 59, born 1966 is 60.</summary>
    [Theory]
    [InlineData(1967, 9, null, null, null)]
    [InlineData(1967, 10, null, Severity.Notice, 10)]
    [InlineData(1967, 13, null, Severity.Notice, 10)]
    [InlineData(1967, 14, null, Severity.Warning, 14)]
    [InlineData(1967, 14, 9.0, Severity.Warning, 14)]
    [InlineData(null, 14, null, Severity.Warning, 14)]
    [InlineData(1966, 9, null, null, null)]
    [InlineData(1966, 10, null, Severity.Notice, 10)]
    [InlineData(1966, 14, 3.0, Severity.Notice, 10)]
    [InlineData(1966, 20, 3.0, Severity.Notice, 10)]
    [InlineData(1966, 21, 3.0, Severity.Warning, 21)]
    [InlineData(1966, 13, 7.0, null, null)]
    [InlineData(1966, 14, 7.0, Severity.Notice, 14)]
    [InlineData(1966, 17, 8.5, Severity.Notice, 17)]
    [InlineData(1966, 23, 8.5, Severity.Notice, 17)]
    [InlineData(1966, 24, 8.5, Severity.Warning, 24)]
    public void LimitsGoByAgeAndFromSixtyByTheUsualGap(int? birthYear, int gap, double? usual, Severity? severity, int? limit)
    {
        var last = Rule.Of(GapOf(gap, usual), birthYear).LastOrDefault();

        Assert.Equal((severity, (double?)limit), (last?.Severity, last?.Limit));
        Assert.Equal(severity is null ? null : gap, last?.Value);
    }

    [Fact]
    public void AHeavyOrFastDayEndsItAndTheNextRunBeginsAnew()
    {
        var found = Rule.Of([.. GapOf(11), .. Enumerable.Range(0, 11).Select(gap => Gap(12 + gap, gap))]);

        Assert.Equal([Training.On(10), Training.On(11), Training.On(22)], found.Select(finding => finding.Date));
        Assert.Equal([Training.On(10), Training.On(10), Training.On(22)], found.Select(finding => finding.Since));
        Assert.All(found, finding => Assert.Equal((BodyRegion?)BodyRegion.Legs, finding.Region));
    }

    [Theory]
    [InlineData(7, 1)]
    [InlineData(6, 0)]
    public void SevenOfTenDaysOfTheGapAreKnown(int known, int count) => Assert.Equal(count, Rule.Of([Gap(10, 10, known)]).Count);

    [Fact]
    public void UnknownDaysRaiseNothing()
    {
        List<Day> days = [.. GapOf(9), .. Enumerable.Range(10, 30).Select(gap => Gap(gap, gap, known: 9, seen: false))];

        Assert.Empty(Rule.Of(days));
    }

    [Fact]
    public void UnknownDaysNeitherWorsenNorClear()
    {
        List<Day> days = [.. GapOf(12), .. Enumerable.Range(13, 30).Select(gap => Gap(gap, gap, known: 12, seen: false))];
        var found = Rule.Of(days);

        Assert.Equal(days.Count - 10, found.Count);
        Assert.All(found, finding => Assert.Equal((Severity.Notice, Training.On(10)), (finding.Severity, finding.Since)));
        Assert.Equal(12, found[^1].Value);
        Assert.Equal("No heavy or fast leg work for 12 days up to 17 January, not known since; last on 5 January.", found[^1].Text);
    }

    [Fact]
    public void AnUncoveredRegionRaisesNothing()
    {
        var uncovered = new Dictionary<BodyRegion, RegionDay> { [BodyRegion.Legs] = RegionDay.NotCovered };

        Assert.Empty(Rule.Of(GapOf(40).Select(day => day with { Regions = uncovered }).ToList()));
        Assert.Empty(Rule.Of(GapOf(40).Select(day => day with { Regions = new Dictionary<BodyRegion, RegionDay>() }).ToList()));
    }

    [Fact]
    public void SaysTheGapTheUsualAndTheLastDay()
    {
        Assert.Equal("No heavy or fast leg work for 15 days (usual gap 3 days); last on 5 January.", Rule.Of(GapOf(15, 3))[^1].Text);
        Assert.Equal("No heavy or fast leg work for 15 days; last on 5 January.", Rule.Of(GapOf(15))[^1].Text);
        Assert.Equal(
            "No heavy or fast leg work for 10 days (8 of them known; usual gap 1 day); last on 26 December 2025.",
            Rule.Of([Gap(0, 10, 8, usual: 1)])[^1].Text);
    }

    [Fact]
    public void CountsFromTheFirstCoveredDayWhereThereWasNone()
    {
        var days = Training.Build(15, [.. Enumerable.Range(0, 16).Select(day => Training.Activity(day, stimulus: Training.Bouts(1)))]);
        var last = Rule.Of(days)[^1];

        Assert.Equal((15, Severity.Warning), (last.Value, last.Severity));
        Assert.Equal("No heavy or fast leg work for 15 days; none since it can be seen, from 5 January.", last.Text);
    }

    [Fact]
    public void TheEvidenceHoldsGapCoverageAgeAndLimits()
    {
        var evidence = Rule.Of(GapOf(15, 3), 1966)[^1].Evidence;
        var values = evidence.Inputs.ToDictionary(item => item.Name, item => item.Value, StringComparer.Ordinal);

        Assert.Equal("a choice", evidence.Source);
        Assert.Equal((15, 15, 3, 60), (values["days_since"], values["known_days_since"], values["usual_gap"], values["age"]));
        Assert.Equal((10, 21, 0.7), (values["notice"], values["warning"], values["known_share_wanted"]));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void InAbsenceAndInTheFirstDaysBackNobodyIsSentToHeavyWork(bool away)
    {
        var plan = away
            ? LoadWatch.Plans.DayPlan.None with { Absence = LoadWatch.Plans.AbsenceWord.Injured }
            : LoadWatch.Plans.DayPlan.None with { ReturnDay = 3 };
        var days = GapOf(20);

        Assert.NotEmpty(Rule.Of(days));
        Assert.Empty(Rule.Of([.. days.Select(day => day with { Plan = plan })]));
    }

    [Fact]
    public void RegionsOfTheLimitsAreWatchedEachByItself()
    {
        var days = GapOf(12).Select(day => day with
        {
            Regions = new Dictionary<BodyRegion, RegionDay>(day.Regions) { [BodyRegion.Arms] = day.Regions[BodyRegion.Legs] },
        }).ToList();
        var limits = Stated with { StimulusGap = Stated.StimulusGap with { Regions = [BodyRegion.Arms, BodyRegion.Legs, BodyRegion.Trunk, BodyRegion.Arms] } };

        Assert.All(Rule.Of(days), finding => Assert.Equal(BodyRegion.Legs, finding.Region));
        Assert.Equal([BodyRegion.Legs, BodyRegion.Arms], Rule.Of(days, limits: limits).Where(finding => finding.Date == Training.On(12)).Select(finding => finding.Region!.Value).Order());
        Assert.Empty(Rule.Of(days, limits: Stated with { StimulusGap = Stated.StimulusGap with { Regions = [] } }));
    }
}
