namespace LoadWatch.Stimulus;

public class ClassSharesTests
{
    /// <summary>Computed independently from the pool of Potvin and Fuglevand 2017 cut by summed twitch force; shares of Staron et al. 2000
    /// first.</summary>
    [Theory]
    [InlineData(0.43, 0.34, 99, 14, 7)]
    [InlineData(0.46, 0.34, 100, 14, 6)]
    [InlineData(0.50, 0.35, 102, 14, 4)]
    public void SharesOfForceCutThePoolByUnits(double slow, double medium, int slowUnits, int mediumUnits, int largeUnits) =>
        Assert.Equal((slowUnits, mediumUnits, largeUnits), new ClassShares(slow, medium).Split(MotorUnitPool.Usual));

    /// <summary>The usual split: the medium class joins at 0.321, the largest at 0.614 of the maximum, all are in by 0.7995.</summary>
    [Fact]
    public void TheClassesJoinAtTheirFirstUnits()
    {
        Assert.Equal(0.321, MotorUnitPool.Usual.ForceFractions[99], 5e-4);
        Assert.Equal(0.614, MotorUnitPool.Usual.ForceFractions[113], 5e-4);
        Assert.Equal(0.7995, MotorUnitPool.Usual.ForceFractions[119], 5e-5);
    }
}
