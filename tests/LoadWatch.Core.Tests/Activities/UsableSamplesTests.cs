using CsCheck;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class UsableSamplesTests
{
    private const double None = double.NaN;

    [Fact]
    public void AReadingStandsForTheTimeToTheNextOneAtMostTenSeconds()
    {
        var channel = Of(Channel.Power, (0, 100), (1, None), (3, 120), (60, 130));

        Assert.Equal([(100.0, 3000), (120.0, 10_000), (130.0, 0)], channel.Samples.Select(sample => (sample.Value, sample.Milliseconds)));
    }

    [Fact]
    public void AReadingNeverStandsForOneThatWasCut()
    {
        var channel = Of(Channel.HeartRate, (0, 100), (1, 0), (3, 102), (4, None), (5, 104));

        Assert.Equal([(100.0, 1000), (102.0, 2000), (104.0, 0)], channel.Samples.Select(sample => (sample.Value, sample.Milliseconds)));
    }

    [Fact]
    public void RowsAreSortedByTimeAndRowsOfOneTimeKeepTheirOrder()
    {
        var channel = Of(Channel.Power, (5, 1), (2, 2), (5, 3), (2, 4));

        Assert.Equal([2.0, 4, 1, 3], channel.Samples.Select(sample => sample.Value));
        Assert.Equal([0, 3000, 0, 0], channel.Samples.Select(sample => sample.Milliseconds));
    }

    [Fact]
    public void UndatedRowsAreLeftOut()
    {
        var series = new SampleSeries([SampleSeries.Undated, 1000], new Dictionary<Channel, double[]> { [Channel.Power] = [100, 200] });

        Assert.Equal(200, Assert.Single(UsableSamples.Of(Given.Recording("cycling", series), Channel.Power).Samples).Value);
    }

    [Theory]
    [InlineData(Channel.HeartRate, 0, false)]
    [InlineData(Channel.HeartRate, 24, false)]
    [InlineData(Channel.HeartRate, 25, true)]
    [InlineData(Channel.HeartRate, 250, true)]
    [InlineData(Channel.HeartRate, 254, false)]
    [InlineData(Channel.Power, 0, true)]
    [InlineData(Channel.Power, -1, false)]
    [InlineData(Channel.Power, 3000, true)]
    [InlineData(Channel.Power, 3001, false)]
    [InlineData(Channel.Speed, 45, true)]
    [InlineData(Channel.Speed, 45.1, false)]
    [InlineData(Channel.Altitude, -400, true)]
    [InlineData(Channel.Altitude, -500, false)] // A file's zero.
    [InlineData(Channel.Altitude, 8849, true)]
    [InlineData(Channel.Altitude, 12_606.6, false)] // 0.6 m below the sea, written without the zero point of 500 m.
    [InlineData(Channel.Altitude, double.PositiveInfinity, false)]
    [InlineData(Channel.Power, double.NaN, false)]
    public void LimitsCutWhatCannotBe(Channel channel, double value, bool usable) => Assert.Equal(usable, ChannelLimits.Usable(channel, value, Sport.Generic));

    [Theory]
    [InlineData("running", 13.0, true)]
    [InlineData("running", 13.1, false)]
    [InlineData("soccer", 13.1, false)]
    [InlineData("cycling", 25, true)]
    public void NobodyIsFasterOnFootThanAPositionJumps(string sport, double metresPerSecond, bool usable) =>
        Assert.Equal(usable, ChannelLimits.Usable(Channel.Speed, metresPerSecond, new Sport(sport)));

    /// <summary>By hand: usable from 0 to 4 s of 10 s; one good reading of ten is a tenth of the time.</summary>
    [Fact]
    public void TheShareIsUsableTimeOverSampledTime()
    {
        Assert.Equal(0.4, Of(Channel.HeartRate, (0, 120.0), (4, 0.0), (10, 120.0)).Share, 1e-12);
        Assert.Equal(0.1, Of(Channel.HeartRate, [.. Enumerable.Range(0, 101).Select(second => (second, second % 10 == 0 ? 120.0 : 0))]).Share, 1e-12);
        Assert.Equal(0, Of(Channel.HeartRate, (0, 0.0), (1, 254.0)).Share);
        Assert.Equal(1, Of(Channel.HeartRate, (0, 120.0)).Share);
    }

    [Fact]
    public void LateBeatsJoinWhereTheRecordsHoldNone()
    {
        var series = Series(Channel.HeartRate, (0, 120), (1, 0));
        var recording = Given.Recording("swimming", series) with
        {
            LateHeartRates = [new(Given.StartMilliseconds + 400, 90), new(Given.StartMilliseconds + 1400, 91), new(Given.StartMilliseconds + 3000, 92)],
        };

        var channel = UsableSamples.Of(recording, Channel.HeartRate);

        Assert.Equal([(120.0, 1400), (91.0, 1600), (92.0, 0)], channel.Samples.Select(sample => (sample.Value, sample.Milliseconds)));
        Assert.Equal(1, channel.Share);
    }

    [Fact]
    public void LateBeatsAloneAreAChannel()
    {
        var recording = Given.Recording("swimming", SampleSeries.Empty) with { LateHeartRates = [new(1000, 90), new(2000, 91)] };

        Assert.Equal([Channel.HeartRate], UsableSamples.ChannelsOf(recording));
        Assert.Equal(1, UsableSamples.Of(recording, Channel.HeartRate).Share);
    }

    [Fact]
    public void TheOrderOfRowsOfDifferentTimesNeverMatters() =>
        Gen.Select(Gen.Int[0, 100].HashSet[1, 30].Select(set => set.ToArray()), Gen.Int[0, 1000]).Sample((seconds, seed) =>
        {
            var rows = seconds.Select(second => (second, (double)((second * 37) % 300))).ToArray();
            var turned = rows.OrderBy(row => (row.second * 7919L + seed) % 101).ToArray();
            var (one, other) = (Of(Channel.HeartRate, rows), Of(Channel.HeartRate, turned));
            return one.Samples.SequenceEqual(other.Samples) && one.Share == other.Share && one.Share is >= 0 and <= 1;
        });

    private static UsableChannel Of(Channel channel, params (int Second, double Value)[] rows) =>
        UsableSamples.Of(Given.Recording("cycling", Series(channel, rows)), channel);

    private static SampleSeries Series(Channel channel, params (int Second, double Value)[] rows) => new(
        [.. rows.Select(row => Given.StartMilliseconds + (row.Second * 1000L))],
        new Dictionary<Channel, double[]> { [channel] = [.. rows.Select(row => row.Value)] });
}
