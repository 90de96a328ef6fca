using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class ChannelHistogramTests
{
    [Theory]
    [InlineData(Channel.HeartRate, 149, 149)]
    [InlineData(Channel.Power, 250.9, 250)]
    [InlineData(Channel.Speed, 5.3, 53)]
    [InlineData(Channel.Speed, 5.299, 52)]
    [InlineData(Channel.Speed, 5.2999999, 53)]
    [InlineData(Channel.Speed, 0, 0)]
    public void BinsAreTheFloorOfTheValue(Channel channel, double value, int bin) => Assert.Equal(bin, ChannelHistogram.BinOf(channel, value));

    [Fact]
    public void EveryMillisecondIsCountedOnce()
    {
        var samples = Given.Samples((100, 10), (150, 20), (100, 5));

        var histogram = ChannelHistogram.Of(new UsableChannel(Channel.HeartRate, samples, 1));

        Assert.Equal([new(100, 15_000), new(150, 20_000)], histogram.Bins);
        Assert.Equal(35_000, histogram.TotalMilliseconds);
    }
}
