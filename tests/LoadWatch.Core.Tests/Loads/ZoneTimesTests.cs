using LoadWatch.People;

namespace LoadWatch.Loads;

public class ZoneTimesTests
{
    private static readonly double[] AcsmBounds = [0.30, 0.40, 0.60, 0.90];

    private static readonly Anchor[] RestAndMax = [Given.Anchor(AnchorKind.HeartRateRest, 65), Given.Anchor(AnchorKind.HeartRateMax, 155)];

    /// <summary>Classes of Garber et al. 2011 (Med Sci Sports Exerc 43:1334-1359); bounds by hand for rest 65, maximum 155: 92, 101, 119,
    /// 146.</summary>
    [Theory]
    [InlineData(91, 0)]
    [InlineData(92, 1)]
    [InlineData(100, 1)]
    [InlineData(101, 2)]
    [InlineData(118, 2)]
    [InlineData(119, 3)]
    [InlineData(145, 3)]
    [InlineData(146, 4)]
    public void WithoutThresholdsHeartRateFallsIntoThePublishedClasses(int bpm, int zone)
    {
        var time = ZoneTimes.OfHeartRate(Given.Histogram((bpm, 2)), Given.Date, Given.Person(), Given.Anchors(RestAndMax), AcsmBounds)!;

        Assert.Equal([92.0, 101, 119, 146], time.Bounds);
        Assert.Equal(120, time.Seconds[zone]);
        Assert.Equal(120, time.Seconds.Sum());
    }

    [Fact]
    public void AnchoredThresholdsMakeThreeZones()
    {
        var book = Given.Anchors([.. RestAndMax, Given.Anchor(AnchorKind.HeartRateVt1, 120), Given.Anchor(AnchorKind.HeartRateVt2, 140)]);

        var time = ZoneTimes.OfHeartRate(Given.Histogram((119, 1), (120, 2), (140, 3)), Given.Date, Given.Person(), book, AcsmBounds)!;

        Assert.Equal("ventilatory thresholds", time.Basis);
        Assert.Equal([60.0, 120, 180], time.Seconds);
    }

    [Fact]
    public void OneThresholdAloneIsNotUsed()
    {
        var book = Given.Anchors([.. RestAndMax, Given.Anchor(AnchorKind.HeartRateVt1, 120)]);

        Assert.Equal(5, ZoneTimes.OfHeartRate(Given.Histogram((119, 1)), Given.Date, Given.Person(), book, AcsmBounds)!.Seconds.Count);
    }

    [Fact]
    public void WithoutAnyReferenceHeartRateHasNoZones() =>
        Assert.Null(ZoneTimes.OfHeartRate(Given.Histogram((119, 1)), Given.Date, Given.Person(), AnchorBook.Empty, AcsmBounds));

    /// <summary>By hand: 65 % of 200 W is 130 W, 100 % is 200 W.</summary>
    [Fact]
    public void PowerZonesAreFractionsOfCriticalPower()
    {
        var anchor = Given.Anchor(AnchorKind.CriticalPower, 200, source: AnchorSource.Estimated);

        var time = ZoneTimes.OfPower(Given.Histogram((129, 1), (130, 2), (200, 3)), anchor, [0.65, 1.00]);

        Assert.Equal([60.0, 120, 180], time.Seconds);
        Assert.True(time.Estimated);
    }

    [Fact]
    public void ASpeedOnABoundBelongsToTheZoneAbove() =>
        Assert.Equal([60.0, 120], ZoneTimes.OfSpeed(Given.Histogram((54, 1), (55, 2)), [5.5]).Seconds);
}
