using CsCheck;
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

    /// <summary>Below, among and far above the bins that heart rate, power and speed have.</summary>
    [Fact]
    public void ValuesOfAnySizeHaveTheirBin()
    {
        var samples = Given.Samples((-1.5, 1), (9000, 2), (4.2, 3), (-0.0, 4));

        Assert.Equal(
            [new(-2, 1000), new(0, 4000), new(4, 3000), new(9000, 2000)],
            ChannelHistogram.Of(new UsableChannel(Channel.Altitude, samples, 1)).Bins);
    }

    [Fact]
    public void BinsAreInOrderWhateverTheOrderOfAdding() =>
        Gen.Select(Gen.Int[-50, 50], Gen.Long[0, 9]).Array[0, 80].Sample(added =>
        {
            var histogram = new Histogram();
            foreach (var (bin, milliseconds) in added)
            {
                histogram.Add(bin, milliseconds);
            }

            var wanted = added.GroupBy(one => one.Item1).Select(bin => (Bin: bin.Key, Sum: bin.Sum(one => one.Item2))).Where(bin => bin.Sum > 0).OrderBy(bin => bin.Bin);
            Assert.Equal(wanted, histogram.Bins.Select(bin => (bin.Key, bin.Value)));
            Assert.Equal(added.Sum(one => one.Item2), histogram.TotalMilliseconds);
        });
}
