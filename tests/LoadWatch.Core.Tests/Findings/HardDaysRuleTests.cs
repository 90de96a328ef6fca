using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

/// <summary>Twenty days of 100: a hard day lies above 130.</summary>
public class HardDaysRuleTests
{
    private static readonly HardDaysRule Rule = new();
    private static readonly double?[] Usual = [.. Repeat(100, 20)];

    [Theory]
    [InlineData(130.1, 4, 1)]
    [InlineData(130, 4, 0)]
    [InlineData(130.1, 3, 0)]
    [InlineData(130.1, 6, 3)]
    public void FourDaysInARowAboveTheLimit(double load, int days, int count) => Assert.Equal(count, Rule.Of(DaysOf([.. Usual, .. Repeat(load, days)])).Count);

    [Fact]
    public void ItHoldsUntilTwoDaysAreKnownToBeEasier()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Repeat(150, 5), 100, 100, 150]));

        Assert.Equal([On(23), On(24), On(25)], found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal((Severity.Notice, On(23), 4.0, "days"), (finding.Severity, finding.Since, finding.Limit, finding.Unit)));
        Assert.Equal([4.0, 5.0, 5.0], found.Select(finding => finding.Value));
        Assert.Equal("4 days in a row up to 28 January above 1.3 times the usual training day (150 on the last against 100 AU); the limit is 4.", found[0].Text);
    }

    [Fact]
    public void OneRestDayAmongHardOnesDoesNotEndItAndTwoDo()
    {
        Assert.Equal([On(23), On(24)], RestedOn(24, 25));
        Assert.Equal([On(23), On(24), On(25), On(26)], RestedOn(24));

        static IEnumerable<NodaTime.LocalDate> RestedOn(params int[] rest) =>
            Rule.Of(Build(26, [.. Enumerable.Range(0, 27).Where(day => !rest.Contains(day)).Select(day => Activity(day, day < 20 ? 100 : 150))])).Select(finding => finding.Date);
    }

    /// <summary>What stands only by its delay is kept, too (I-5).</summary>
    [Fact]
    public void TakenUpBehindAnyDateItTellsTheSame()
    {
        var days = DaysOf([.. Usual, .. Repeat(150, 4), 100, 150, 125, 100, 100, .. Repeat(150, 5), 100, 100]);
        var whole = Rule.Of(days).Select(finding => (finding.Date, finding.Since, finding.Text)).ToList();
        Assert.Equal([On(24), On(27)], whole.Select(finding => finding.Date).Intersect([On(24), On(27), On(28)])); // By the delay alone, and over.
        var (carried, taken) = (Carried.Nothing, new List<Finding>());
        for (var day = 0; day < days.Count; day++)
        {
            var memory = new RuleMemory(carried);
            taken.AddRange(Rule.Evaluate(new RuleSubject(Anna, [.. days.Take(day + 1)], Stated) { From = On(day), Memory = memory }));
            carried = Carried.Read(Carried.Write(Carried.Nothing with { Runs = memory.On(On(day)) }));
        }

        Assert.Equal(whole, taken.Select(finding => (finding.Date, finding.Since, finding.Text)));
    }

    /// <summary>Between 1.2 and 1.3 times the median of 100 a day neither counts nor ends the row.</summary>
    [Theory]
    [InlineData(121, 27, 4)]
    [InlineData(119, 24, 4)]
    public void ADayBetweenTheTwoLimitsLeavesItAsItWas(double load, int last, double value)
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Repeat(150, 4), .. Repeat(load, 4)]));

        Assert.Equal((On(last), value), (found[^1].Date, found[^1].Value));
    }

    [Fact]
    public void ADayBetweenTheTwoLimitsCompletesNoRow() => Assert.Empty(Rule.Of(DaysOf([.. Usual, 150, 150, 125, 150, 150])));

    [Fact]
    public void AnUnknownDayCompletesNoRow() => Assert.Empty(Rule.Of(DaysOf([.. Usual, 150, 150, null, 150, 150, null])));

    [Fact]
    public void AnUnknownDayEndsNoRowThatStands()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Repeat(150, 4), null, 150, 100]));

        Assert.Equal([On(23), On(24), On(25), On(26)], found.Select(finding => finding.Date));
        Assert.StartsWith("4 days in a row up to 28 January", found[1].Text, StringComparison.Ordinal);
        Assert.Contains("5 days in a row up to 30 January above 1.3 times the usual training day (150 on the last against 100 AU, 1 day of unknown load between them not counted)", found[2].Text, StringComparison.Ordinal);
        Assert.Equal(On(29), Rule.Of(DaysOf([.. Usual, .. Repeat(150, 4)], unknownTail: 6))[^1].Date);
    }

    /// <summary>On the first of the hard days 11 or 12 training days lie before it.</summary>
    [Theory]
    [InlineData(12, 1)]
    [InlineData(11, 0)]
    public void EnoughTrainingDaysAreKnownBefore(int days, int count) => Assert.Equal(count, Rule.Of(DaysOf([.. Repeat(100, days), .. Repeat(150, 4)])).Count);

    /// <summary>Training days of 150 are usual once the days of 100 lie more than 56 days back.</summary>
    [Fact]
    public void OldDaysDoNotCountForTheMedian()
    {
        var loads = Enumerable.Range(0, 20).Select(_ => (double?)100).Concat(Enumerable.Range(0, 56).Select(day => (double?)(day % 4 == 0 ? 90 : 150)));

        Assert.Empty(Rule.Of(DaysOf([.. loads, .. Repeat(190, 4)])));
        Assert.Single(Rule.Of(DaysOf([.. loads, .. Repeat(196, 4)])));
    }

    /// <summary>The days 5 and 12 are the first and the last of 8.</summary>
    [Theory]
    [InlineData(5, 8, 12, 3)]
    [InlineData(5, 8, 13, 0)]
    [InlineData(5, 12, 14, 0)]
    public void ThreeMatchesWithinEightDays(int first, int second, int third, int count)
    {
        var found = Rule.Of(DaysOf(Repeat(100, 15), Matches(first, second, third)));

        Assert.Equal(count, found.Count);
        Assert.All(found, finding => Assert.Equal((On(12), 3.0, 3.0, "matches"), (finding.Since, finding.Value, finding.Limit, finding.Unit)));
        Assert.All(found, finding => Assert.Equal("3 matches within 8 days, the last on 17 January; the limit is 3.", finding.Text));
    }

    /// <summary>On the days 16 and 17 one match lies within 8 days.</summary>
    [Fact]
    public void MatchesStandUntilOneIsLeftOnTwoDays() => Assert.Equal(On(16), Rule.Of(DaysOf(Repeat(100, 25), Matches(5, 8, 12)))[^1].Date);

    [Fact]
    public void AMatchInAnAbsenceOrOnAKnownRestDayIsNotPlayed()
    {
        var plan = new PersonPlan { Entries = Matches(5, 8, 12).Entries, Absences = [new Absence(AbsenceWord.Away, On(8), On(8))] };
        var withoutDay8 = Enumerable.Range(0, 15).Where(day => day != 8).Select(day => Activity(day)).ToArray();

        Assert.Empty(Rule.Of(DaysOf(Repeat(100, 15), plan)));
        Assert.Empty(Rule.Of(LoadCalendar.Build("anna", withoutDay8, On(14), Matches(5, 8, 12))));
    }

    [Fact]
    public void MatchesAreReadOnKnownDatesOnly()
    {
        Assert.Equal(On(20), Rule.Of(DaysOf(Repeat(100, 13), Matches(5, 8, 12), unknownTail: 8))[^1].Date);
        Assert.Empty(Rule.Of(DaysOf(Repeat(100, 12), Matches(5, 8, 12), unknownTail: 8)));
    }

    [Fact]
    public void ARowAndMatchesAreOneFinding()
    {
        var found = Rule.Of(DaysOf([.. Usual, .. Repeat(150, 4), 100, 100], Matches(18, 21, 24)));

        Assert.Equal([On(23), On(24), On(25)], found.Select(finding => finding.Date));
        Assert.Equal(["days", "days", "matches"], found.Select(finding => finding.Unit));
        Assert.All(found, finding => Assert.Equal(On(23), finding.Since));
    }

    [Fact]
    public void LimitsOfTheGroupCount()
    {
        var limits = Stated with { HardDays = Stated.HardDays with { Days = 2, MedianFactor = 1.6 } };

        Assert.Empty(Rule.Of(DaysOf([.. Usual, .. Repeat(150, 4)]), limits: limits));
        Assert.Equal(2, Rule.Of(DaysOf([.. Usual, .. Repeat(161, 3)]), limits: limits).Count);
    }
}
