namespace LoadWatch.Stimulus;

/// <summary>
/// The protocol of Chidnok et al. 2012, Med Sci Sports Exerc 44:966-976: 60 s at 329 W, 30 s at a lower power, until exhausted; critical power 241 W, W' 21.1 kJ.
/// Steps of 1 s.
/// </summary>
internal static class IntermittentWork
{
    private const double CriticalWatts = 241;
    private const double WPrimeJoules = 21_100;
    private const double WorkWatts = 329;
    private const int LongestSeconds = 10_000;

    /// <summary>The rests, and the seconds that people lasted with them.</summary>
    public static IReadOnlyList<(double RestWatts, double Seconds)> Observed { get; } = [(173, 557), (95, 759), (20, 1224)];

    /// <summary>Seconds to exhaustion by a form, or null where it knows no end.</summary>
    public static int? Lasts(WPrimeForm form, double restWatts) => form == WPrimeForm.Integral ? LastsByIntegral(restWatts) : LastsByRests(form, restWatts);

    /// <summary>The integral form's balance after each second, that of the start in front, J.</summary>
    public static IReadOnlyList<double> Integral(IReadOnlyList<double> watts, double criticalWatts, double wPrimeJoules)
    {
        var below = watts.Where(power => power < criticalWatts).Average();
        var decay = Math.Exp(-1 / WPrimeForm.IntegralTau(criticalWatts - below));
        var (spent, balances) = (0.0, new List<double> { wPrimeJoules });
        foreach (var power in watts)
        {
            spent = (spent * decay) + Math.Max(0, power - criticalWatts);
            balances.Add(wPrimeJoules - spent);
        }

        return balances;
    }

    private static int? LastsByIntegral(double restWatts)
    {
        double[] watts = [.. Enumerable.Range(0, LongestSeconds).Select(second => second % 90 < 60 ? WorkWatts : restWatts)];
        var end = Integral(watts, CriticalWatts, WPrimeJoules).ToList().FindIndex(balance => balance <= 0);
        return end < 0 ? null : end;
    }

    private static int? LastsByRests(WPrimeForm form, double restWatts)
    {
        var left = WPrimeJoules;
        for (var second = 1; second <= LongestSeconds; second++)
        {
            left -= (second - 1) % 90 < 60 ? WorkWatts - CriticalWatts : 0;
            if (left <= 0)
            {
                return second;
            }

            left += second % 90 == 0 ? (WPrimeJoules - left) * form.Recovered(WPrimeJoules, CriticalWatts - restWatts, 30) : 0;
        }

        return null;
    }
}
