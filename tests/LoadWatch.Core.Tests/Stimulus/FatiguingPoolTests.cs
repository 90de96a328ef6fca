namespace LoadWatch.Stimulus;

/// <summary>
/// The tiring pool of Potvin and Fuglevand 2017 (PLoS Comput Biol 13(6):e1005581). Its three published times to exhaustion are in <c>Published/PoolChecks</c>; the
/// numbers here were computed independently from the equations: they guard the equations and are no evidence.
/// </summary>
public class FatiguingPoolTests
{
    private static readonly MotorUnitPool Pool = MotorUnitPool.Usual;

    private static readonly Recruitment Estimator = new(Pool, ClassShares.Usual);

    [Theory]
    [InlineData(0.15, 773.9)]
    [InlineData(0.25, 361.1)]
    [InlineData(0.30, 266.8)]
    [InlineData(0.35, 204.6)]
    [InlineData(0.40, 159.6)]
    [InlineData(0.45, 124.1)]
    [InlineData(0.55, 71.8)]
    [InlineData(0.60, 53.0)]
    [InlineData(0.65, 38.8)]
    [InlineData(0.70, 28.2)]
    [InlineData(0.75, 20.5)]
    [InlineData(0.85, 10.2)]
    [InlineData(0.90, 6.4)]
    [InlineData(0.95, 3.1)]
    public void AForceIsHeldForItsTime(double fraction, double seconds) => Assert.Equal(seconds, Seconds(fraction), 0.05);

    /// <summary>
    /// Frey Law and Avin 2010, Ergonomics 53:109-129 (coefficients as two pages print them): the 95 % band is 29 to 47 % of the mean. Within 29 % of the general curve up to 60 %
    /// of the maximum (<c>Published/PoolChecks</c>); from 70 % on the pool tires sooner, by 36 % there and by more than the band at 80 %. Against the curve of the knee
    /// it lasts longer up to 50 %, at most by the 47 %.
    /// </summary>
    [Theory]
    [InlineData(0.70, 21.92, -1.98, -0.37, -0.36)]
    [InlineData(0.80, 21.92, -1.98, -0.58, -0.56)]
    [InlineData(0.20, 19.38, -1.88, 0.27, 0.29)]
    [InlineData(0.30, 19.38, -1.88, 0.42, 0.44)]
    [InlineData(0.40, 19.38, -1.88, 0.46, 0.48)]
    [InlineData(0.50, 19.38, -1.88, 0.33, 0.35)]
    [InlineData(0.60, 19.38, -1.88, 0.04, 0.06)]
    [InlineData(0.70, 19.38, -1.88, -0.27, -0.25)]
    public void WhereThePoolLeavesTheCurvesOfEnduranceIsKnown(double fraction, double factor, double exponent, double least, double most) =>
        Assert.InRange((Seconds(fraction) / (factor * Math.Pow(fraction, exponent))) - 1, least, most);

    [Theory]
    [InlineData(0.20, 0, 90, 27.8)]
    [InlineData(0.20, 250, 99, null)]
    [InlineData(0.20, 300, null, 41.7)]
    [InlineData(0.20, 400, 112, 57.4)]
    [InlineData(0.20, 500, 120, 84.9)]
    [InlineData(0.50, 0, 109, 53.0)]
    [InlineData(0.50, 30, 114, null)]
    [InlineData(0.50, 60, 118, 69.9)]
    [InlineData(0.50, 80, 120, 78.9)]
    [InlineData(0.80, 0, 120, null)]
    public void TiredUnitsCallForMoreExcitationAndLargerUnits(double fraction, int second, int? units, double? percent)
    {
        var tired = new FatiguingPool(Pool);
        Hold(tired, fraction, second);
        tired.Hold(fraction);

        Assert.Equal(units ?? tired.Recruited, tired.Recruited);
        Assert.Equal(percent ?? 0, percent is null ? 0 : tired.Excitation / Pool.HighestExcitation * 100, 0.06);
    }

    [Theory]
    [InlineData(0.20, 0.18, 0.00, 0.07, 0.93)]
    [InlineData(0.50, 0.84, 0.63, 0.44, 0.94)]
    public void MiddleUnitsAreTheMostTiredAtTheEnd(double fraction, double unit60, double unit80, double unit100, double unit120)
    {
        var tired = new FatiguingPool(Pool);
        Hold(tired, fraction, Seconds(fraction));

        double[] wanted = [unit60, unit80, unit100, unit120];
        Assert.All(wanted.Zip([60, 80, 100, 120]), row => Assert.Equal(row.First, tired.TwitchesLeft[row.Second - 1], 0.01));
    }

    /// <summary>Computed: 74.6 % of the maximum are left after 20 s of all that is there, a fall of 1.27 % a second, and 49.3 % after 70 s.</summary>
    [Fact]
    public void AMaximalEffortFallsFastAtFirst()
    {
        var tired = new FatiguingPool(Pool);
        Hold(tired, 1, 20);
        Assert.Equal(1.27, (1 - tired.Capacity) * 100 / 20, 0.005);

        Hold(tired, 1, 50);
        Assert.Equal(0.493, tired.Capacity, 0.0005);
    }

    /// <summary>
    /// Facts of the trade (common practice, no published source): work that asks for the whole pool from the start lasts seconds, 20 to 30 at the most; work
    /// between the thresholds of the medium and of the largest class from under one to some minutes; work within the small class goes on and on.
    /// </summary>
    [Fact]
    public void ClassesLastAsTheTradeKnowsThem()
    {
        var (slow, medium, _) = ClassShares.Usual.Split(Pool);

        Assert.InRange(Seconds(0.80), 10, 30);
        Assert.Equal(49, Seconds(Pool.ForceFractions[slow + medium]), 1.0);
        Assert.Equal(238, Seconds(Pool.ForceFractions[slow]), 1.0);
        Assert.InRange(Seconds(0.10), 1200, double.PositiveInfinity);
        Assert.Null(FatiguingPool.EnduranceSeconds(0.02, 3600, Pool));
    }

    /// <summary>
    /// A fact of the trade (common practice, no published source): breathing and lactate turn up where medium and large units join. Thresholds of trained runners in
    /// speed and of athletes in speed: Esteve-Lanao et al. 2026, Sports 14:29 (73.9 and 87.6 % of the speed at maximal oxygen uptake); Condello et al. 2014 (67 and 84 %).
    /// The drive at the second is that of the estimator's anchor.
    /// </summary>
    [Theory]
    [InlineData(73.9, 87.6)]
    [InlineData(67, 84)]
    public void ThresholdsLieWhereTheClassesJoin(double first, double second)
    {
        var (slow, medium, _) = ClassShares.Usual.Split(Pool);
        var driveAtFirst = Drive.Of(first, second, null, 1, Variant.Mid.CriticalDrive);

        Assert.InRange(driveAtFirst, Pool.ForceFractions[slow], Pool.ForceFractions[slow + medium]);
        Assert.Equal(Pool.ForceFractions[slow + medium], Drive.Of(second, second, null, 1, Variant.Mid.CriticalDrive), 0.04);
    }

    /// <summary>
    /// The fast estimator lets capacity fall evenly to the load at exhaustion and reads the rested pool at load / capacity. Against the tiring pool at the same
    /// load, over the whole hold: from 40 % of the maximum on capacity within 0.06, the medium class within 0.08 and the largest within 0.24 (two of its seven
    /// units); below, where the pool keeps its strength until late, within 0.26, 0.17 and 0.29.
    /// </summary>
    [Theory]
    [InlineData(0.20, 0.26, 0.17, 0.29)]
    [InlineData(0.30, 0.26, 0.17, 0.29)]
    [InlineData(0.40, 0.06, 0.08, 0.24)]
    [InlineData(0.50, 0.06, 0.08, 0.24)]
    [InlineData(0.60, 0.06, 0.08, 0.24)]
    [InlineData(0.70, 0.06, 0.08, 0.24)]
    [InlineData(0.80, 0.06, 0.08, 0.24)]
    public void TheFastEstimatorFollowsTheTiringPool(double load, double capacity, double medium, double large)
    {
        var (slowUnits, mediumUnits, largeUnits) = ClassShares.Usual.Split(Pool);
        var (end, tired) = (Seconds(load), new FatiguingPool(Pool));
        while (tired.Seconds < end)
        {
            var even = 1 - ((1 - load) * tired.Seconds / end);
            Assert.Equal(tired.Capacity, even, capacity);

            tired.Hold(load);
            var estimate = Estimator.At(load / even);
            Assert.Equal(Share(tired.Recruited - slowUnits, mediumUnits), estimate.Medium, medium);
            Assert.Equal(Share(tired.Recruited - slowUnits - mediumUnits, largeUnits), estimate.Large, large);
        }
    }

    private static double Share(int units, int size) => Math.Clamp((double)units / size, 0, 1);

    private static double Seconds(double fraction) => FatiguingPool.EnduranceSeconds(fraction, 3600, Pool) ?? double.NaN;

    private static void Hold(FatiguingPool tired, double fraction, double seconds)
    {
        for (var step = 0; step < Math.Round(seconds * 10); step++)
        {
            tired.Hold(fraction);
        }
    }
}
