using LoadWatch.Days;
using LoadWatch.Findings;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

public class SilenceRuleTests
{
    private static readonly SilenceRule Rule = new();

    private static readonly int[] MondaysWednesdaysFridays =
        [.. Enumerable.Range(0, 12).SelectMany(week => new[] { 7 * week, (7 * week) + 2, (7 * week) + 4 })];

    [Fact]
    public void ThreeDaysAWeekAreNoSilence() => Assert.Empty(Rule.Of(Recorded(81, MondaysWednesdaysFridays)));

    /// <summary>By hand: gaps of 2, 2 and 3 days, so the 90th percentile is 3 and the limit 5.</summary>
    [Fact]
    public void IsRaisedOneDayBeyondTheLimitAndReturnsWithTheNextRecording()
    {
        var found = Rule.Of(Recorded(92, [.. MondaysWednesdaysFridays, 90]));

        Assert.Equal(Enumerable.Range(87, 3).Select(On), found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal((On(87), 5, "days"), (finding.Since, finding.Limit, finding.Unit)));
        Assert.All(found, finding => Assert.Equal(Severity.Notice, finding.Severity));
        Assert.Equal([6.0, 7, 8], found.Select(finding => finding.Value));
        Assert.Equal("No recording for 8 days; usually one at least every 3 days.", found[^1].Text);
    }

    [Fact]
    public void UnknownDaysBeforeARhythmAreNoSilence()
    {
        Assert.Empty(Rule.Of(Recorded(60, 0, 2, 4, 6, 8, 10)));
        Assert.NotEmpty(Rule.Of(Recorded(60, 0, 2, 4, 6, 8, 10, 12)));
    }

    /// <summary>By hand: ten gaps of 1 to 10 days; nearest rank upward of 0.9 x 10 is the ninth.</summary>
    [Fact]
    public void TheQuantileIsTheNearestRankUpward()
    {
        var found = Rule.Of(Recorded(80, 0, 1, 3, 6, 10, 15, 21, 28, 36, 45, 55));

        Assert.Equal(11, found[0].Limit);
        Assert.Equal(On(67), found[0].Date);
    }

    /// <summary>By hand: six gaps; 0.9 x 6 = 5.4, so the sixth, 20 days.</summary>
    [Fact]
    public void OfSixGapsTheLongestCounts() => Assert.Equal(22, Rule.Of(Recorded(80, 0, 20, 22, 24, 26, 28, 30))[0].Limit);

    [Fact]
    public void GapsOlderThanTheLookBackAreForgotten()
    {
        int[] recorded = [0, 20, .. Enumerable.Range(11, 42).Select(day => 2 * day)];

        Assert.Equal(104, recorded[^1]);
        Assert.Equal(4, Rule.Of(Recorded(120, recorded))[0].Limit);
    }

    /// <summary>By hand: six gaps, the oldest begins 84 days before the last recording; a day earlier it is none, and five are too few.</summary>
    [Fact]
    public void AGapThatBeginsWhereTheLookBackBeginsCounts()
    {
        Assert.Equal(22, Rule.Of(Recorded(120, 0, 20, 36, 48, 60, 72, 84))[0].Limit);
        Assert.Empty(Rule.Of(Recorded(120, 0, 20, 36, 48, 60, 72, 85)));
    }

    [Fact]
    public void AfterSixWeeksItIsSilenceWhateverTheRhythm()
    {
        var found = Rule.Of(Recorded(200, 0, 60, 62, 64, 66, 68, 70));

        Assert.Equal(42, found[0].Limit);
        Assert.Equal(On(113), found[0].Date);
    }

    [Fact]
    public void ALongSilenceStaysOneRun()
    {
        var found = Rule.Of(Recorded(300, MondaysWednesdaysFridays));

        Assert.Equal(300 - 87 + 1, found.Count);
        Assert.Single(found.Select(finding => finding.Since).Distinct());
        Assert.Single(found.Select(finding => finding.Key).Distinct());
    }

    [Fact]
    public void EveryDayIsSaidAsSuch() =>
        Assert.Equal("No recording for 4 days; usually one every day.", Rule.Of(Recorded(23, [.. Enumerable.Range(0, 20)]))[^1].Text);

    [Fact]
    public void TheEvidenceHoldsTheRhythm()
    {
        var evidence = Rule.Of(Recorded(90, MondaysWednesdaysFridays))[^1].Evidence;
        var values = evidence.Inputs.ToDictionary(item => item.Name, item => item.Value, StringComparer.Ordinal);

        Assert.Equal((9, 3, 35, 5, 2), (values["silent_days"], values["usual_gap"], values["gaps"], values["limit"], values["extra"]));
    }

    private static IReadOnlyList<Day> Recorded(int through, params int[] days) => Build(through, [.. days.Select(day => Activity(day))]);
}
