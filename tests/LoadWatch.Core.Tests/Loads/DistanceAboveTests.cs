using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class DistanceAboveTests
{
    /// <summary>By hand: 60 s at 5.45, 5.55 and 7.05 m/s, the middles of the bins; from 5.5 on 60 x (5.55 + 7.05).</summary>
    [Theory]
    [InlineData(5.4, 1083)]
    [InlineData(5.5, 756)]
    [InlineData(5.51, 423)]
    [InlineData(7, 423)]
    [InlineData(7.1, 0)]
    public void CountsTheMiddleOfEveryBinFromTheBoundOn(double bound, double metres) =>
        Assert.Equal(metres, DistanceAbove.Metres(Given.Histogram((54, 1), (55, 1), (70, 1)), bound));

    [Fact]
    public void NoTimeIsUnknownNotZero() => Assert.Null(DistanceAbove.Metres(Given.Histogram(), 5.5));

    [Fact]
    public void OnlyFastBoundsHaveAQuantityEachItsOwn()
    {
        double[] bounds = [2, 4, 5.5, 5.500000000001, 7, 8.25, double.PositiveInfinity];

        Assert.Equal(["distance_above_5_5_m_s", "distance_above_7_m_s", "distance_above_8_25_m_s"], DistanceAbove.Bounds(bounds).Select(DistanceAbove.Name));
    }

    /// <summary>The histogram costs 0.05 m/s at most, half of a bin.</summary>
    [Fact]
    public void ItIsOffByHalfABinAtMost() =>
        Gen.Int[5_500, 12_000].Array[1, 60].Sample(thousandths =>
        {
            var samples = thousandths.Select(one => new UsableSample(0, one / 1000.0, 1000)).ToArray();
            var metres = DistanceAbove.Metres(ChannelHistogram.Of(new UsableChannel(Channel.Speed, samples, 1)), 5.5)!.Value;
            return Math.Abs(metres - thousandths.Sum(one => one / 1000.0)) <= (0.05 * samples.Length) + 1e-6;
        });
}
