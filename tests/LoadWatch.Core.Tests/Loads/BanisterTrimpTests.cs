using CsCheck;
using LoadWatch.People;

namespace LoadWatch.Loads;

public class BanisterTrimpTests
{
    /// <summary>Hand calculation from the equation with the published pairs (Banister 1991; Morton, Fitz-Clarke and Banister
    /// 1990).</summary>
    [Theory]
    [InlineData(30, 130, 40, 200, Sex.Male, 31.8025)]
    [InlineData(30, 130, 40, 200, Sex.Female, 37.1285)]
    [InlineData(60, 150, 50, 190, Sex.Male, 108.0954)]
    [InlineData(60, 150, 50, 190, Sex.Female, 121.4991)]
    [InlineData(45, 120, 65, 165, Sex.Female, 53.3302)]
    [InlineData(1, 200, 40, 200, Sex.Male, 4.3654)]
    [InlineData(1, 200, 40, 200, Sex.Female, 4.5685)]
    public void MatchesTheEquationByHand(double minutes, int bpm, double rest, double max, Sex sex, double expected)
    {
        var load = BanisterTrimp.Of(Given.Histogram((bpm, minutes)), new HeartRateReserve(rest, max, Estimated: false), sex, new());

        Assert.Equal(expected, load!.Value, 5e-5);
    }

    /// <summary>Hand calculation: 25.0723 + 106.0234; at the mean of 150 bpm it would be 108.0954.</summary>
    [Fact]
    public void IntervalsCountSampleBySampleNotAtTheirMean()
    {
        var load = BanisterTrimp.Of(Given.Histogram((120, 30), (180, 30)), new HeartRateReserve(50, 190, Estimated: false), Sex.Male, new());

        Assert.Equal(131.0956, load!.Value, 1e-4);
    }

    /// <summary>By hand: 0.75 exp(1.795) at x = 1 for one minute.</summary>
    [Fact]
    public void AnUnstatedSexTakesTheMeanOfThePairs()
    {
        var load = BanisterTrimp.Of(Given.Histogram((200, 1)), new HeartRateReserve(40, 200, Estimated: false), sex: null, new());

        Assert.Equal(0.75 * Math.Exp(1.795), load!.Value, 1e-7);
    }

    [Fact]
    public void AboveTheMaximumCountsAsTheMaximumAndBelowRestAsNothing()
    {
        var reserve = new HeartRateReserve(50, 150, Estimated: false);

        Assert.Equal(BanisterTrimp.Of(Given.Histogram((150, 5)), reserve, Sex.Male, new()), BanisterTrimp.Of(Given.Histogram((180, 5)), reserve, Sex.Male, new()));
        Assert.Equal(0, BanisterTrimp.Of(Given.Histogram((40, 5)), reserve, Sex.Male, new()));
    }

    [Fact]
    public void NoTimeIsUnknownNotZero() =>
        Assert.Null(BanisterTrimp.Of(Given.Histogram(), new HeartRateReserve(50, 150, Estimated: false), Sex.Male, new()));

    [Fact]
    public void MoreTimeNeverLowersItAndTwiceTheTimeIsTwiceTheLoad() =>
        Gen.Select(Gen.Int[25, 250], Gen.Int[1, 600], Gen.Int[25, 250], Gen.Int[1, 600], Gen.Double[30, 90], Gen.Double[100, 220])
            .Sample((bpm, minutes, otherBpm, otherMinutes, rest, max) =>
            {
                var reserve = new HeartRateReserve(rest, max, Estimated: false);
                var one = BanisterTrimp.Of(Given.Histogram((bpm, minutes)), reserve, Sex.Female, new())!.Value;
                var both = BanisterTrimp.Of(Given.Histogram((bpm, minutes), (otherBpm, otherMinutes)), reserve, Sex.Female, new())!.Value;
                var twice = BanisterTrimp.Of(Given.Histogram((bpm, 2 * minutes)), reserve, Sex.Female, new())!.Value;
                return double.IsFinite(both) && both >= one && Math.Abs(twice - (2 * one)) <= 1e-7 * Math.Max(1, one);
            });
}
