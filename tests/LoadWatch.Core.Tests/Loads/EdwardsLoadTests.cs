using CsCheck;

namespace LoadWatch.Loads;

public class EdwardsLoadTests
{
    private static readonly double[] Weights = [1, 2, 3, 4, 5];

    /// <summary>Hand calculation: 10 + 2 x 15 + 3 x 20 + 4 x 10 + 5 x 5 (weights of Edwards 1993, from memory).</summary>
    [Fact]
    public void WeighsTheFiveZonesOneToFive() =>
        Assert.Equal(165, EdwardsLoad.Of(Given.Histogram((110, 10), (130, 15), (150, 20), (170, 10), (190, 5)), 200, Weights));

    /// <summary>The lower bound belongs to the zone (a choice): percent of a maximum of 200.</summary>
    [Theory]
    [InlineData(99, 0)]
    [InlineData(100, 1)]
    [InlineData(119, 1)]
    [InlineData(120, 2)]
    [InlineData(140, 3)]
    [InlineData(160, 4)]
    [InlineData(180, 5)]
    [InlineData(200, 5)]
    [InlineData(230, 5)]
    public void ABoundBelongsToTheZoneAbove(int bpm, int zone) => Assert.Equal(zone, EdwardsLoad.Zone(bpm, 200));

    [Fact]
    public void NoTimeIsUnknownNotZero() => Assert.Null(EdwardsLoad.Of(Given.Histogram(), 200, Weights));

    [Fact]
    public void MoreTimeNeverLowersIt() =>
        Gen.Select(Gen.Int[25, 250], Gen.Int[25, 250], Gen.Int[1, 600], Gen.Double[80, 240]).Sample((bpm, other, minutes, max) =>
            EdwardsLoad.Of(Given.Histogram((bpm, 10), (other, minutes)), max, Weights) >= EdwardsLoad.Of(Given.Histogram((bpm, 10)), max, Weights));
}
