namespace LoadWatch.Stimulus;

public class AvailablePowerTests
{
    /// <summary>By hand: critical power 250 W, maximum 1000 W.</summary>
    [Theory]
    [InlineData(1, 1000)]
    [InlineData(0.5, 625)]
    [InlineData(0.1, 325)]
    [InlineData(0, 250)]
    [InlineData(-0.2, 250)]
    public void WhatIsLeftAboveCriticalPowerSaysWhatCanBeGiven(double balance, double watts) =>
        Assert.Equal(watts, AvailablePower.Watts(250, 1000, balance), 1e-9);
}
