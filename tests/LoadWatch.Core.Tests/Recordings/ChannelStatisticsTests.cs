namespace LoadWatch.Recordings;

public class ChannelStatisticsTests
{
    private static readonly SampleSeries Samples = new(
        [0, 1000, 2000, 3000],
        new Dictionary<Channel, double[]>
        {
            [Channel.HeartRate] = [100, double.NaN, 0, 140],
            [Channel.Altitude] = [-20, -5, double.NaN, -11],
            [Channel.Power] = [double.NaN, double.NaN, double.NaN, double.NaN],
        });

    [Fact]
    public void EveryReadingCountsAsRecorded() =>
        Assert.Equal(new ChannelStatistics(3, 80, 140), ChannelStatistics.Of(Samples, Channel.HeartRate));

    [Fact]
    public void NegativeReadingsHaveANegativeMaximum() =>
        Assert.Equal(new ChannelStatistics(3, -12, -5), ChannelStatistics.Of(Samples, Channel.Altitude));

    [Theory]
    [InlineData(Channel.Power)]
    [InlineData(Channel.Speed)]
    public void AChannelWithoutReadingsHasNoMeanAndNoMaximum(Channel channel) =>
        Assert.Equal(new ChannelStatistics(0, null, null), ChannelStatistics.Of(Samples, channel));
}
