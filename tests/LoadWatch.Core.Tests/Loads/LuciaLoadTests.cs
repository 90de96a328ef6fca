using CsCheck;
using LoadWatch.People;

namespace LoadWatch.Loads;

public class LuciaLoadTests
{
    private static readonly double[] Weights = [1, 2, 3];

    private static readonly HeartRateThresholds Thresholds = new(140, 170, Estimated: false);

    /// <summary>Hand calculation: 60 + 2 x 25 + 3 x 5 (multipliers of Lucia et al. 2003, from memory).</summary>
    [Fact]
    public void WeighsTheThreeZonesOneToThree() =>
        Assert.Equal(125, LuciaLoad.Of(Given.Histogram((120, 60), (155, 25), (180, 5)), Thresholds, Weights));

    /// <summary>A threshold belongs to the zone above (a choice).</summary>
    [Theory]
    [InlineData(25, 1)]
    [InlineData(139, 1)]
    [InlineData(140, 2)]
    [InlineData(169, 2)]
    [InlineData(170, 3)]
    [InlineData(250, 3)]
    public void AThresholdBelongsToTheZoneAbove(int bpm, int weight) => Assert.Equal(weight, LuciaLoad.Zone(bpm, Thresholds));

    [Fact]
    public void NoTimeIsUnknownNotZero() => Assert.Null(LuciaLoad.Of(Given.Histogram(), Thresholds, Weights));

    [Fact]
    public void ItLiesBetweenTheMinutesAndThreeTimesTheMinutes() =>
        Gen.Select(Gen.Int[25, 250], Gen.Int[1, 600], Gen.Double[60, 150], Gen.Double[1, 80]).Sample((bpm, minutes, first, more) =>
            LuciaLoad.Of(Given.Histogram((bpm, minutes)), new HeartRateThresholds(first, first + more, Estimated: false), Weights) is { } load
            && load >= minutes && load <= 3 * minutes);

    [Fact]
    public void BothThresholdsAreNeededInTheirOrder()
    {
        var first = Given.Anchor(AnchorKind.HeartRateVt1, 140);
        var second = Given.Anchor(AnchorKind.HeartRateVt2, 170, source: AnchorSource.Estimated);

        Assert.Equal(new HeartRateThresholds(140, 170, Estimated: true), On(first, second));
        Assert.Null(On(first));
        Assert.Null(On(second));
        Assert.Null(On(first, second with { Value = 140 }));
    }

    private static HeartRateThresholds? On(params Anchor[] anchors) => HeartRateThresholds.On(Given.Date, Given.Person(), Given.Anchors(anchors));
}
