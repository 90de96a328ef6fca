namespace LoadWatch.Stimulus;

/// <summary>
/// Constants of Potvin and Fuglevand 2017 (PLoS Comput Biol 13(6):e1005581). The maximal force is the published figure; the tables were
/// computed
/// independently from the paper's equations: they guard the equations and are no evidence.
/// </summary>
public class MotorUnitPoolTests
{
    private static readonly MotorUnitPool Pool = MotorUnitPool.Usual;

    [Fact]
    public void TheRestedMaximumIsThePublishedOne() => Assert.Equal(2215.9811474699964, Pool.MaximumForce, 1e-9);

    [Theory]
    [InlineData(1, 1, 1, 90, 35, 0.02)]
    [InlineData(20, 1.8675, 2.0861, 75.520, 34.823, 0.64)]
    [InlineData(40, 3.6042, 4.5234, 62.788, 34.469, 1.93)]
    [InlineData(60, 6.9558, 9.8084, 52.202, 33.785, 4.94)]
    [InlineData(80, 13.4242, 21.2682, 43.401, 32.464, 12.55)]
    [InlineData(100, 25.9077, 46.1175, 36.084, 29.917, 32.11)]
    [InlineData(120, 50, 100, 30, 25, 79.95)]
    public void UnitsFollowTheTable(int unit, double threshold, double twitch, double contraction, double peakRate, double percent)
    {
        Assert.Equal(threshold, Pool.Thresholds[unit - 1], 5e-5);
        Assert.Equal(twitch, Pool.Twitches[unit - 1], 5e-5);
        Assert.Equal(contraction, Pool.ContractionSeconds[unit - 1] * 1000, 5e-4);
        Assert.Equal(peakRate, Pool.PeakRates[unit - 1], 5e-4);
        Assert.Equal(percent, Pool.ForceFractions[unit - 1] * 100, 5.1e-3);
    }

    [Theory]
    [InlineData(5, 3.043)]
    [InlineData(10, 8.250)]
    [InlineData(20, 22.179)]
    [InlineData(30, 39.446)]
    [InlineData(40, 59.200)]
    [InlineData(50, 79.949)]
    [InlineData(60, 95.630)]
    [InlineData(67, 100)]
    public void ForceGrowsWithExcitation(double excitation, double percent) =>
        Assert.Equal(percent, Pool.ForceAt(excitation) / Pool.MaximumForce * 100, 5e-4);

    [Theory]
    [InlineData(0.05, 7.037, 60)]
    [InlineData(0.10, 11.458, 75)]
    [InlineData(0.20, 18.649, 90)]
    [InlineData(0.30, 24.761, 98)]
    [InlineData(0.40, 30.332, 104)]
    [InlineData(0.50, 35.496, 109)]
    [InlineData(0.60, 40.429, 113)]
    [InlineData(0.70, 45.304, 117)]
    [InlineData(0.80, 50.028, 120)]
    [InlineData(0.90, 55.861, 120)]
    public void AForceAsksForAnExcitationAndItsUnits(double fraction, double excitation, int units)
    {
        var found = Pool.ExcitationAt(fraction);

        Assert.Equal(excitation, found, 5e-4);
        Assert.Equal(units, Pool.RecruitedAt(found));
    }

    /// <summary>Where the last unit joins: the narrow pool at 62.2 %, the usual at 79.95 %.</summary>
    [Fact]
    public void ANarrowPoolIsAllInEarlier()
    {
        Assert.Equal(0.622, MotorUnitPool.Narrow.ForceFractions[^1], 5e-4);
        Assert.Equal(47, MotorUnitPool.Narrow.HighestExcitation, 1e-9);
        Assert.True(MotorUnitPool.Broad.ForceFractions[^1] > Pool.ForceFractions[^1]);
    }

    [Fact]
    public void SmallUnitsJoinBeforeLargeOnes() =>
        Assert.All(
            new[] { MotorUnitPool.Narrow, MotorUnitPool.Usual, MotorUnitPool.Broad },
            pool => Assert.True(pool.ForceFractions.Zip(pool.ForceFractions.Skip(1)).All(pair => pair.First < pair.Second)));
}
