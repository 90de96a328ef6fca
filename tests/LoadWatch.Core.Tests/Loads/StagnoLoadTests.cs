using CsCheck;

namespace LoadWatch.Loads;

public class StagnoLoadTests
{
    /// <summary>Hand calculation: 10 x 1.25 + 20 x 1.71 + 20 x 2.54 + 15 x 3.61 + 5 x 5.16 (weights of Stagno et al. 2007, from
    /// memory); percent of a maximum of 200.</summary>
    [Fact]
    public void WeighsTheFiveZonesByTheirPublishedWeights() =>
        Assert.Equal(177.45, StagnoLoad.Of(Given.Histogram((136, 10), (150, 20), (164, 20), (178, 15), (194, 5)), 200, new()));

    /// <summary>Percent of a maximum of 200: zones begin at 130, 144, 158, 172 and 186 bpm (from memory); the gaps between them are closed (a
    /// choice).</summary>
    [Theory]
    [InlineData(129, 0)]
    [InlineData(130, 1.25)]
    [InlineData(143, 1.25)]
    [InlineData(144, 1.71)]
    [InlineData(157, 1.71)]
    [InlineData(158, 2.54)]
    [InlineData(171, 2.54)]
    [InlineData(172, 3.61)]
    [InlineData(185, 3.61)]
    [InlineData(186, 5.16)]
    [InlineData(200, 5.16)]
    [InlineData(230, 5.16)]
    public void AZoneBeginsAtItsLowerBound(int bpm, double weight) => Assert.Equal(weight, StagnoLoad.Weight(bpm, 200, new()));

    [Fact]
    public void NoTimeIsUnknownNotZero() => Assert.Null(StagnoLoad.Of(Given.Histogram(), 200, new()));

    [Fact]
    public void AFasterHeartNeverWeighsLess() =>
        Gen.Select(Gen.Int[25, 249], Gen.Double[80, 240]).Sample((bpm, max) => StagnoLoad.Weight(bpm + 1, max, new()) >= StagnoLoad.Weight(bpm, max, new()));
}
