namespace LoadWatch.Stimulus;

public class WPrimeFormTests
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
        Assert.Equal(seconds, WPrimeForm.IntegralTau(watts), 5.1e-3);

    /// <summary>Computed independently in steps of 1 s: 350 W for 60 s, 150 W for 60 s, 350 W for 60 s, 150 W for 120 s; critical power
    /// 250 W, W' 20 kJ.</summary>
    [Theory]
    [InlineData(60, 14329.68)]
    [InlineData(120, 14951.15)]
    [InlineData(180, 9834.19)]
    [InlineData(300, 11940.43)]
    public void TheIntegralFormSpendsAndRecoversAtOnce(int second, double joules) =>
        Assert.Equal(joules, IntermittentWork.Integral([.. Given.Steps((350, 60), (150, 60), (350, 60), (150, 120))], 250, 20_000)[second], 5e-3);

    /// <summary>The same session, computed independently from W' / D = 200 s.</summary>
    [Fact]
    public void TheDifferentialFormRecoversBelowOnly()
    {
        var first = 14_000 + (6000 * WPrimeForm.Differential.Recovered(20_000, 100, 60));
        var second = first - 6000;

        Assert.Equal(15_555.09, first, 5e-3);
        Assert.Equal(14_267.71, second + ((20_000 - second) * WPrimeForm.Differential.Recovered(20_000, 100, 120)), 5e-3);
    }

    /// <summary>Chorley et al. 2022: computed from the amplitudes and time constants in print.</summary>
    [Theory]
    [InlineData(15, 27.3)]
    [InlineData(30, 41.8)]
    [InlineData(60, 54.6)]
    [InlineData(120, 63.6)]
    [InlineData(240, 73.4)]
    [InlineData(360, 80.5)]
    public void TheTwoPhasesRecoverFastThenSlowly(double seconds, double percent) =>
        Assert.Equal(percent, 100 * WPrimeForm.TwoPhase.Recovered(20_000, 100, seconds), 5.1e-2);

    /// <summary>At critical power nothing was seen to come back (Bartram 2018); two of the forms say so.</summary>
    [Fact]
    public void AtCriticalPowerItselfNothingComesBack()
    {
        Assert.Equal(0, WPrimeForm.Differential.Recovered(20_000, 0, 600));
        Assert.Equal(0, WPrimeForm.Elite.Recovered(20_000, 0, 600));
    }

    [Fact]
    public void LongRestRecoversEverythingInEveryForm() =>
        Assert.All(WPrimeForm.All, form => Assert.InRange(form.Recovered(20_000, 200, 10_000), 0.999, 1));
}
