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

    /// <summary>Morton 1996, A 3-parameter critical power model, Ergonomics 39:611-619; computed from the equation with W' 20 kJ. Without a maximum it would be
    /// 400 to 26.67 s.</summary>
    [Theory]
    [InlineData(300, 373.33)]
    [InlineData(350, 173.33)]
    [InlineData(400, 106.67)]
    [InlineData(500, 53.33)]
    [InlineData(700, 17.78)]
    [InlineData(1000, 0)]
    [InlineData(1100, 0)]
    public void APowerLastsByMortonsEquation(double watts, double seconds) =>
        Assert.Equal(seconds, AvailablePower.SecondsToExhaustion(watts, 250, 20_000, 1000)!.Value, 5e-3);

    [Fact]
    public void AtCriticalPowerTheModelKnowsNoEnd() => Assert.Null(AvailablePower.SecondsToExhaustion(250, 250, 20_000, 1000));

    /// <summary>By hand: at the end of the time the power is all that is available.</summary>
    [Fact]
    public void AtExhaustionThePowerIsTheAvailableOne()
    {
        var spent = 100 * AvailablePower.SecondsToExhaustion(350, 250, 20_000, 1000)!.Value;

        Assert.Equal(350, AvailablePower.Watts(250, 1000, 1 - (spent / 20_000)), 1e-9);
    }
}
