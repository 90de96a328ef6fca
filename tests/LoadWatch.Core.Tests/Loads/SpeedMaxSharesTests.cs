using LoadWatch.People;

namespace LoadWatch.Loads;

public class SpeedMaxSharesTests
{
    private static readonly Anchor Best = Given.Anchor(AnchorKind.SpeedMax, 9);

    /// <summary>By hand: 80 % of 9 m/s is 7.2 m/s, 90 % is 8.1 m/s; 60 s each at 7.15, 7.25 and 8.15 m/s, the middles of the bins:
    /// 60 x (7.25 + 8.15) = 924 m, 60 x 8.15 = 489 m; 8.1 / 9 = 0.9.</summary>
    [Fact]
    public void DistanceCountsFromTheShareOn() =>
        Assert.Equal(
            [
                new Quantity("speed_top_share", 0.9, "1", Estimated: false),
                new Quantity("distance_above_80_percent_speed_max", 924, "m", Estimated: false),
                new Quantity("distance_above_90_percent_speed_max", 489, "m", Estimated: false),
            ],
            SpeedMaxShares.Of(Given.Histogram((71, 1), (72, 1), (81, 1)), top: 8.1, Best, [0.8, 0.9]));

    [Fact]
    public void AnEstimatedBestMarksWhatRestsOnIt() =>
        Assert.All(
            SpeedMaxShares.Of(Given.Histogram((71, 1)), top: 7.1, Best with { Source = AnchorSource.Estimated }, [0.8]),
            quantity => Assert.True(quantity.Estimated));

    [Fact]
    public void WithoutATopOrWithoutTimeTheyAreUnknownNotZero() =>
        Assert.Empty(SpeedMaxShares.Of(Given.Histogram(), top: null, Best, [0.8, 0.9]));

    [Theory]
    [InlineData(0.8, "distance_above_80_percent_speed_max")]
    [InlineData(0.57, "distance_above_57_percent_speed_max")]
    [InlineData(0.925, "distance_above_92_5_percent_speed_max")]
    [InlineData(1, "distance_above_100_percent_speed_max")]
    public void ANameHoldsThePercentage(double share, string name) => Assert.Equal(name, SpeedMaxShares.Name(share));

    [Fact]
    public void EveryShareWithinTheRangeHasItsOwnQuantity() =>
        Assert.Equal([0.5, 0.8, 1], SpeedMaxShares.Distinct([0.49, 0.5, 0.8, 0.800000000001, 1, 1.01, double.NaN]));
}
