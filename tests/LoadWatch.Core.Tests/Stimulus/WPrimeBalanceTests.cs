using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class WPrimeBalanceTests
{
    /// <summary>Computed from the equation of Skiba et al. 2012; the row of 25 W also stands in a public implementation's test.</summary>
    [Theory]
    [InlineData(0, 862)]
    [InlineData(25, 741.2252275569871)]
    [InlineData(50, 647.17)]
    [InlineData(75, 573.91)]
    [InlineData(100, 516.86)]
    [InlineData(150, 437.83)]
    [InlineData(200, 389.89)]
    [InlineData(250, 360.82)]
    public void TheTimeConstantFallsWithTheDistanceToCriticalPower(double watts, double seconds) =>
        Assert.Equal(seconds, WPrimeBalance.Tau(watts), 5.1e-3);

    /// <summary>Computed independently in steps of 1 s: 350 W for 60 s, 150 W for 60 s, 350 W for 60 s, 150 W for 120 s; critical power
    /// 250 W, W' 20 kJ.</summary>
    [Theory]
    [InlineData(60, 14329.68)]
    [InlineData(120, 14951.15)]
    [InlineData(180, 9834.19)]
    [InlineData(300, 11940.43)]
    public void SpendsAboveAndRecoversBelow(int second, double joules)
    {
        var balances = Balances(Given.Samples((350, 60), (150, 60), (350, 60), (150, 120)), 250, 20_000);

        Assert.Equal(joules, balances[second], 5e-3);
    }

    [Fact]
    public void WithoutASecondBelowCriticalPowerNothingRecovers() =>
        Assert.Equal(20_000 - (60 * 100), Balances(Given.Samples((350, 60)), 250, 20_000)[60], 1e-9);

    /// <summary>By hand: 10 s at 350 W spend 1000 J; a stop of 600 s recovers with the time constant of 150 W (516.86 s), and the 10 s
    /// that the last reading stands for are the only ones that count.</summary>
    [Fact]
    public void AStopRecoversButDoesNotSpend()
    {
        UsableSample[] samples = [new(0, 350, 10_000), new(10_000, 150, 10_000), new(610_000, 150, 0)];

        var balances = Balances(samples, 250, 20_000);

        Assert.Equal(20_000 - (1000 * Math.Exp(-600 / 516.8624)), balances[2], 1e-2);
    }

    private static List<double> Balances(UsableSample[] samples, double criticalPowerWatts, double wPrimeJoules)
    {
        var balance = new WPrimeBalance(new UsableChannel(Channel.Power, samples, 1), criticalPowerWatts, wPrimeJoules);
        return [.. samples.Select(sample => balance.Next(sample.UnixMilliseconds, sample.Value, sample.Milliseconds / 1000.0))];
    }
}
