using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

public class LoadTrendTests
{
    /// <summary>Hand algebra: C = 4 U / (U + 3), which also makes 1.8 uncoupled the same as 1.5 coupled (Windt and Gabbett 2018).</summary>
    [Theory]
    [InlineData(0, 0)]
    [InlineData(0.5, 0.571429)]
    [InlineData(0.8, 0.842105)]
    [InlineData(1.0, 1)]
    [InlineData(1.3, 1.209302)]
    [InlineData(1.5, 1.333333)]
    [InlineData(1.8, 1.5)]
    [InlineData(2, 1.6)]
    [InlineData(3, 2)]
    [InlineData(10, 3.076923)]
    public void CoupledAndUncoupledRatioKeepTheirIdentity(double uncoupled, double coupled)
    {
        var day = Daily([.. Enumerable.Repeat(100.0, 21), .. Enumerable.Repeat(100 * uncoupled, 7)])[^1];

        Near(uncoupled, day.RatioUncoupled);
        Near(coupled, day.RatioCoupled, 1e-6);
    }

    /// <summary>Leaflet of a physiotherapy clinic (watsoniaphysiotherapy.com.au), secondary source: weeks of 3, 3.5, 3.5 and 4 km make a mean week of 3.5 km, 3.5, 3.5, 4, 4 one of 3.75 km.</summary>
    [Theory]
    [InlineData(3, 3.5, 3.5, 4, 3.5)]
    [InlineData(3.5, 3.5, 4, 4, 3.75)]
    public void TheChronicLoadIsTheMeanOfFourWeeks(double first, double second, double third, double fourth, double mean)
    {
        double[] weeks = [first, second, third, fourth];

        Near(mean, Daily([.. weeks.SelectMany(week => new[] { week, 0, 0, 0, 0, 0, 0 })])[^1].Chronic);
    }

    /// <summary>Hand calculation: a steady 100 a day, then k days of another load; lambda 2 / (N + 1) (Williams et al. 2017).</summary>
    [Theory]
    [InlineData(200, 1, 125, 106.8966, 1.169355)]
    [InlineData(200, 3, 157.8125, 119.2956, 1.322870)]
    [InlineData(200, 7, 186.6516, 139.3598, 1.339350)]
    [InlineData(200, 14, 198.2182, 163.2277, 1.214366)]
    [InlineData(0, 1, 75, 93.10345, 0.805556)]
    [InlineData(0, 3, 42.1875, 80.70442, 0.522741)]
    [InlineData(0, 7, 13.34839, 60.64016, 0.220125)]
    [InlineData(0, 14, 1.781795, 36.77229, 0.048455)]
    public void WeightedAveragesFollowAStep(double load, int days, double acute, double chronic, double ratio)
    {
        var day = Daily([.. Enumerable.Repeat(100.0, 40), .. Enumerable.Repeat(load, days)])[^1];

        Near(acute, day.EwmaAcute);
        Near(chronic, day.EwmaChronic);
        Near(ratio, day.RatioEwma, 2e-6);
    }

    /// <summary>Hand calculation.</summary>
    [Theory]
    [InlineData(1, 0.888889)]
    [InlineData(3, 0.64)]
    [InlineData(7, 0)]
    [InlineData(14, 0)]
    public void TheCoupledRatioFallsWithDaysOfNoLoad(int days, double ratio) =>
        Near(ratio, Daily([.. Enumerable.Repeat(100.0, 40), .. Enumerable.Repeat(0.0, days)])[^1].RatioCoupled);

    /// <summary>Hand calculation: the average starts at the first load.</summary>
    [Fact]
    public void WeightedAveragesStartAtTheFirstLoad()
    {
        var days = Daily(100, 0, 200, 0, 300, 0, 400);

        Assert.Equal(100, days[0].EwmaAcute);
        Near(106.25, days[2].EwmaAcute);
        Near(100.4756, days[2].EwmaChronic);
        Near(1.0575, days[2].EwmaAcute / days[2].EwmaChronic, 1e-4);
        Near(175.8057, days[6].EwmaAcute);
        Near(121.0165, days[6].EwmaChronic);
        Near(1.4527, days[6].EwmaAcute / days[6].EwmaChronic, 1e-4);
        Assert.All(days, day => Assert.Null(day.RatioEwma));
    }

    [Fact]
    public void AnUnknownDayHoldsTheWeightedAverages()
    {
        var days = Daily([100, 200, null, 200]);

        Assert.Equal(days[1].EwmaAcute, days[2].EwmaAcute);
        Assert.Equal(days[1].EwmaChronic, days[2].EwmaChronic);
        Near(125 + (0.25 * 75), days[3].EwmaAcute);
        Assert.Null(Daily([null, 100])[0].EwmaAcute);
    }

    [Fact]
    public void TheTwentyEighthDayIsTheFirstWithAChronicLoad()
    {
        var days = Daily([.. Enumerable.Repeat(100.0, 28)]);

        Assert.All(days.Take(27), day => Assert.Null(day.Chronic ?? day.ChronicBefore ?? day.RatioUncoupled ?? day.RatioEwma));
        Assert.Equal((700, 700), (days[27].Chronic, days[27].ChronicBefore));
        Assert.Equal((1, 1, 1), (days[27].RatioCoupled, days[27].RatioUncoupled, days[27].RatioEwma));
    }

    [Fact]
    public void FiveKnownDaysMakeAWeekAndFourDoNot()
    {
        Assert.Equal(700, Daily([100, null, 100, 100, null, 100, 100])[^1].Acute);
        Assert.Null(Daily([100, null, 100, 100, null, 100, null])[^1].Acute);
        Assert.Equal(700, Daily(100, 100, 100, 100, 100)[^1].Acute);
        Near(5 / 7.0, Daily([100, null, 100, 100, null, 100, 100])[^1].Coverage7);
    }

    [Fact]
    public void HistoryBeginsWithTheFirstKnownLoad()
    {
        var days = Daily([null, null, .. Repeat(100, 28)]);

        Assert.Null(days[1].DaysSinceFirstCovered);
        Assert.Equal(0, days[2].DaysSinceFirstCovered);
        Assert.Null(days[28].Chronic);
        Assert.Equal(700, days[29].Chronic);
    }

    /// <summary>A steady load stays the same load however many days are unknown, as long as it is known at all.</summary>
    [Theory]
    [InlineData(4, 2, true)]
    [InlineData(5, 2, false)]
    [InlineData(4, 0, true)]
    [InlineData(5, 0, false)]
    public void TwentyTwoOf28AndSeventeenOf21DaysAreWanted(int unknownBefore, int unknownLately, bool known)
    {
        var before = Repeat(100, 1).Concat(Repeat(null, unknownBefore)).Concat(Repeat(100, 20 - unknownBefore));
        var lately = Repeat(null, unknownLately).Concat(Repeat(100, 7 - unknownLately));
        var day = Daily(before.Concat(lately))[^1];

        Assert.Equal(known ? 700 : null, day.ChronicBefore);
        Assert.Equal(known ? 1 : null, day.RatioUncoupled);
        Near((28 - unknownBefore - unknownLately) / 28.0, day.Coverage28);
    }

    [Fact]
    public void TwentyOneKnownOf28AreTooFew()
    {
        var day = Daily(Repeat(null, 4).Concat(Repeat(100, 17)).Concat(Repeat(null, 3)).Concat(Repeat(100, 4)))[^1];

        Assert.Equal(21 / 28.0, day.Coverage28);
        Assert.Null(day.Chronic ?? day.ChronicBefore ?? day.RatioCoupled ?? day.RatioUncoupled ?? day.RatioEwma);
    }

    [Fact]
    public void OverNothingThereIsNoRatio()
    {
        var day = Daily([.. Enumerable.Repeat(0.0, 28), 100])[^1];

        Assert.Equal((100, 0), (day.Acute, day.ChronicBefore));
        Assert.Null(day.RatioUncoupled);
        Assert.Null(day.WeeklyChange);
        Near(4, day.RatioCoupled);
        Assert.Null(Daily([.. Enumerable.Repeat(0.0, 28)])[^1].RatioEwma);
    }

    [Theory]
    [InlineData(140, 0.4)]
    [InlineData(100, 0)]
    [InlineData(0, -1)]
    public void TheWeeklyChangeIsAFractionOfTheWeekBefore(double load, double change) =>
        Near(change, Daily([.. Enumerable.Repeat(100.0, 7), .. Enumerable.Repeat(load, 7)])[^1].WeeklyChange);

    [Fact]
    public void BothWeeksOfAChangeNeedFiveKnownDays()
    {
        var week = Repeat(100, 7).ToList();
        var thin = Repeat(null, 3).Concat(Repeat(100, 4)).ToList();

        Assert.Null(Daily(thin.Concat(week))[^1].WeeklyChange);
        Assert.Null(Daily(week.Concat(thin))[^1].WeeklyChange);
        Assert.Null(Daily(Repeat(100, 11))[^1].WeeklyChange);
        Assert.Equal(0, Daily(Repeat(100, 12))[^1].WeeklyChange);
    }

    /// <summary>By hand: 28 days of 100, then 28 of 200: the chronic load is 700 on one day, rises by 25 a day and reaches 1400 on the 28th.</summary>
    [Fact]
    public void TheMedianOfTheChronicLoadGrowsWithTheYear()
    {
        var days = Daily([.. Enumerable.Repeat(100.0, 28), .. Enumerable.Repeat(200.0, 28)]);

        Assert.Null(days[26].ChronicMedian);
        Assert.Equal(700, days[27].ChronicMedian);
        Assert.Equal(712.5, days[28].ChronicMedian);
        Assert.Equal(1050, days[55].ChronicMedian);
    }

    /// <summary>By hand: a year later only the new load is left in the 365 days.</summary>
    [Fact]
    public void AfterAYearTheMedianHasForgotten()
    {
        var days = Daily([.. Enumerable.Repeat(100.0, 600), .. Enumerable.Repeat(200.0, 600)]);

        // The chronic load is 700 up to day 599 and 725 on day 600. The window of day 781 holds 183 values of 700 and 182 above;
        // that of day 782 holds 182 and 183.
        Assert.Equal(700, days[781].ChronicMedian);
        Assert.Equal(725, days[782].ChronicMedian);
        Assert.Equal(1400, days[1199].ChronicMedian);
    }
}
