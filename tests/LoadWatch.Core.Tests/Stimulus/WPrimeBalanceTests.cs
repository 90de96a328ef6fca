using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class WPrimeBalanceTests
{
    /// <summary>Computed independently in steps of 1 s from the differential form and the time constant of Weigend et al. 2022: 350 W for 60 s, 150 W for 60 s,
    /// 350 W for 60 s, 150 W for 120 s; critical power 250 W, W' 20 kJ.</summary>
    [Theory]
    [InlineData(60, 14_000)]
    [InlineData(120, 15_010.9585)]
    [InlineData(180, 9_010.9585)]
    [InlineData(300, 12_402.1355)]
    public void SpendsAboveAndRecoversBelow(int second, double joules) =>
        Assert.Equal(joules, Balances(Given.Samples((350, 60), (150, 60), (350, 60), (150, 120)), 250, 20_000)[second], 1e-3);

    [Fact]
    public void WithoutASecondBelowCriticalPowerNothingRecovers() =>
        Assert.Equal(20_000 - (60 * 100), Balances(Given.Samples((350, 60)), 250, 20_000)[60], 1e-9);

    /// <summary>Nothing came back at critical power in the observations of Bartram et al. 2018 either, as `WPrimeRecoveryTests` quotes them.</summary>
    [Fact]
    public void AtCriticalPowerNothingIsSpentAndNothingRecovers()
    {
        var balances = Balances(Given.Samples((350, 60), (250, 600), (249, 1)), 250, 20_000);

        Assert.Equal(14_000, balances[60], 1e-9);
        Assert.Equal(14_000, balances[660], 1e-9);
    }

    /// <summary>By hand: 10 s at 350 W spend 1000 J; 10 s at 150 W recover with 325.18 s, the stop of 590 s as rest does, with 267.22 s.</summary>
    [Fact]
    public void AStopRecoversAsRestDoesAndDoesNotSpend()
    {
        UsableSample[] samples = [new(0, 350, 10_000), new(10_000, 150, 10_000), new(610_000, 150, 0)];

        var balances = Balances(samples, 250, 20_000);

        Assert.Equal(20_000 - (1000 * Math.Exp(-10 / 325.1756) * Math.Exp(-590 / 267.2240)), balances[2], 1e-2);
    }

    /// <summary>By hand from the balances above: 15 010.9585 J after a rest, less 100 s and then 10 s more of 100 W above critical power; what comes back later changes nothing of it.</summary>
    [Fact]
    public void TheLowestBalanceHoldsTheWorkOfTheLastReadingToo()
    {
        var balance = new WPrimeBalance(250, 20_000);
        foreach (var sample in Given.Samples((350, 60), (150, 60), (350, 100)))
        {
            balance.Advance(sample.UnixMilliseconds, sample.Value, sample.Milliseconds / 1000.0);
        }

        Assert.Equal(5_010.9585, balance.Lowest, 1e-3);

        balance.Advance(Given.StartMilliseconds + 220_000, 350, 10);
        Assert.Equal(4_010.9585, balance.Lowest, 1e-3);

        balance.Advance(Given.StartMilliseconds + 230_000, 0, 600);
        balance.Advance(Given.StartMilliseconds + 830_000, 0, 0);
        Assert.Equal(4_010.9585, balance.Lowest, 1e-3);
        Assert.True(balance.Left > 15_000);
    }

    [Fact]
    public void WhatComesLaterChangesNothing()
    {
        var first = Balances(Given.Samples((350, 60), (150, 60)), 250, 20_000);
        var longer = Balances(Given.Samples((350, 60), (150, 60), (20, 600), (600, 30)), 250, 20_000);

        Assert.Equal(first, longer[..first.Count]);
    }

    /// <summary>Between whole watts the rate is interpolated: within a tenth of a per mille of the equation.</summary>
    [Theory]
    [InlineData(249.9)]
    [InlineData(200.5)]
    [InlineData(150.25)]
    [InlineData(0.5)]
    public void RecoveryFollowsTheForm(double watts)
    {
        var balances = Balances(Given.Samples((350, 60), (watts, 300)), 250, 20_000);
        var back = WPrimeForm.Fitted.Recovered(20_000, 250 - watts, 300);

        Assert.Equal(14_000 + (6000 * back), balances[360], 6000 * back * 1e-4);
    }

    /// <summary>An assumption, by hand: half of the critical speed recovers as half of 250 W does.</summary>
    [Fact]
    public void OfSpeedTheSameShareBelowRecoversAlike()
    {
        var balance = new WPrimeBalance(4, 200, 250 / 4.0);
        balance.Advance(0, 6, 50);
        balance.Advance(50_000, 2, 100);
        balance.Advance(150_000, 2, 0);

        Assert.Equal(200 - (100 * Math.Exp(-100 / WPrimeForm.FittedTau(125))), balance.Left, 1e-3);
    }

    private static List<double> Balances(UsableSample[] samples, double critical, double wPrime)
    {
        var balance = new WPrimeBalance(critical, wPrime);
        var left = new List<double>();
        foreach (var sample in samples)
        {
            balance.Advance(sample.UnixMilliseconds, sample.Value, sample.Milliseconds / 1000.0);
            left.Add(balance.Left);
        }

        return left;
    }
}
