using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class SpikeTests
{
    /// <summary>By hand: 3 of 123 s.</summary>
    [Fact]
    public void AHeartRateThatFallsAwayAndComesBackIsCutWithItsPlaceAndShare()
    {
        var cut = Assert.Single(Hearts((150, 60), (70, 3), (150, 60)));

        Assert.Equal((Channel.HeartRate, CutReason.Spike, 60.0, 63.0, 3, 3000L), (cut.Channel, cut.Reason, cut.From(), cut.To(), cut.Readings, cut.Milliseconds));
        Assert.Equal(3 / 123.0, cut.Share, 1e-9);
    }

    [Theory]
    [InlineData(19, true)]
    [InlineData(22, false)]
    public void OfLevelsThatLastNobodyKnowsWhichIsTrue(int seconds, bool cut) => Assert.Equal(cut, Hearts((150, 60), (80, seconds), (150, 60)).Count > 0);

    [Fact]
    public void AShortBeginningBesideALongLevelIsTheSensorFindingTheHeart()
    {
        Assert.Equal((0.0, 5.0), Assert.Single(Hearts((60, 5), (150, 60))) is var cut ? (cut.From(), cut.To()) : default);
        Assert.Empty(Hearts((60, 5), (150, 5)));
    }

    /// <summary>10 bpm in a second and 25 in five are possible by the defaults, one more is not.</summary>
    [Theory]
    [InlineData(10, false)]
    [InlineData(11, true)]
    public void AFastRiseIsNoJump(int bpm, bool cut) => Assert.Equal(cut, Hearts((150, 60), (150 - bpm, 5), (150, 60)).Count > 0);

    [Theory]
    [InlineData(5, false)]
    [InlineData(6, true)]
    public void WithinFiveSecondsItMayRiseLess(int bpmPerSecond, bool cut)
    {
        double[] slope = [.. Enumerable.Range(1, 8).Select(second => 100.0 + (second * bpmPerSecond))];
        double[] bpm = [.. Given.Steps((100, 60)), .. slope, .. Given.Steps((slope[^1], 3))];

        Assert.Equal(cut, Judging.Cuts("running", (Channel.HeartRate, [.. bpm, .. slope.Reverse(), .. Given.Steps((100, 60))])).Count > 0);
    }

    [Fact]
    public void ReadingsFarApartSayNothingOfHowFastItChanged()
    {
        var series = new SampleSeries(
            [.. Enumerable.Range(0, 20).Select(row => Given.StartMilliseconds + (row * 6000L))],
            new Dictionary<Channel, double[]> { [Channel.HeartRate] = [.. Enumerable.Range(0, 20).Select(row => row % 3 == 0 ? 100.0 : 160)] });

        Assert.Empty(Judging.Cuts(Given.Recording("cycling", series)));
    }

    [Fact]
    public void TheLimitsCanBeSet()
    {
        var recording = Given.Recording("running", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60), (70, 3), (150, 60)))));

        Assert.Empty(Judging.Cuts(recording, new QualityLimits { HeartRateBpmPerSecond = 250, HeartRateBpmInFiveSeconds = 250 }));
    }

    [Theory]
    [InlineData(1, 1201, true)]
    [InlineData(1, 1200, false)]
    [InlineData(2, 1900, false)]
    public void OnlyASingleReadingOfPowerThatTowersAboveItsNeighboursIsCut(int seconds, double watts, bool cut) =>
        Assert.Equal(cut, Judging.Cuts("cycling", (Channel.Power, Given.Steps((200, 60), (watts, seconds), (200, 60)))).Count > 0);

    [Fact]
    public void AStandingStartIsNoSpike() =>
        Assert.Empty(Judging.Cuts("cycling", (Channel.Power, [.. Given.Steps((0, 10)), 1500, 1400, 1200, 900, 500, .. Given.Steps((0, 10))])));

    [Theory]
    [InlineData(Channel.Speed, 4, 12.5)]
    [InlineData(Channel.Altitude, 400, 440)]
    public void APositionThatJumpsAndComesBackIsCut(Channel channel, double value, double there)
    {
        var cut = Assert.Single(Judging.Cuts("running", (channel, Given.Steps((value, 60), (there, 2), (value, 60)))));

        Assert.Equal((CutReason.Spike, 60.0, 62.0), (cut.Reason, cut.From(), cut.To()));
    }

    [Fact]
    public void ARunnerWhoIsTackledIsNoSpike() => Assert.Empty(Judging.Cuts("rugby", (Channel.Speed, Given.Steps((8, 3), (0, 2), (7, 3)))));

    [Fact]
    public void ADistanceThatFallsBackToNothingForAMomentIsCut()
    {
        double[] metres = [.. Enumerable.Range(0, 100).Select(second => second is 50 or 51 ? 0 : 1000 + (second * 3.0))];

        Assert.Equal(2, Assert.Single(Judging.Cuts("running", (Channel.Distance, metres))).Readings);
    }

    private static IReadOnlyList<Cut> Hearts(params (double, int)[] steps) => Judging.Cuts("running", (Channel.HeartRate, Given.Steps(steps)));
}
