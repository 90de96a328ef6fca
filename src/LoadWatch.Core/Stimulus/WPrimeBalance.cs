using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>
/// What is left of W', the work above critical power. Source: Skiba, Chidnok, Vanhatalo and Jones 2012, Modeling the expenditure and
/// reconstitution of work
/// capacity above critical power, Med Sci Sports Exerc 44:1526-1532, integral form: W'bal(t) = W' - sum of W'exp(u) exp(-(t - u)/tau),
/// tau = 546 exp(-0.01 D) + 316 s, D = critical power - mean power below it, W. Good to about 30 %.
/// Departures: the sum is carried along, so that each sample costs the same; where no sample lies below critical power nothing recovers;
/// time that no reading stands for (stops) recovers but does not spend.
/// </summary>
public static class WPrimeBalance
{
    /// <summary>Seconds, for D in watts (0 or more).</summary>
    public static double Tau(double belowCriticalWatts) => (546 * Math.Exp(-0.01 * belowCriticalWatts)) + 316;

    /// <summary>The balance at the time of each sample, before its own work, joules; below 0 when more was spent than the anchors
    /// allow.</summary>
    public static double[] Of(IReadOnlyList<UsableSample> power, double criticalPowerWatts, double wPrimeJoules)
    {
        var tau = MeanBelow(power, criticalPowerWatts) is { } mean ? Tau(criticalPowerWatts - mean) : double.PositiveInfinity;
        var decayOfSecond = Math.Exp(-1 / tau);
        var balances = new double[power.Count];
        var spent = 0.0;
        for (var sample = 0; sample < balances.Length; sample++)
        {
            if (sample > 0)
            {
                var before = power[sample - 1];
                var apart = power[sample].UnixMilliseconds - before.UnixMilliseconds;
                var decay = apart == 1000 ? decayOfSecond : Math.Exp(-apart / 1000.0 / tau);
                spent = (spent * decay) + (Math.Max(0, before.Value - criticalPowerWatts) * before.Seconds);
            }

            balances[sample] = wPrimeJoules - spent;
        }

        return balances;
    }

    private static double? MeanBelow(IReadOnlyList<UsableSample> power, double criticalPowerWatts)
    {
        var (sum, seconds) = (0.0, 0.0);
        foreach (var sample in power)
        {
            if (sample.Value < criticalPowerWatts)
            {
                sum += sample.Value * sample.Seconds;
                seconds += sample.Seconds;
            }
        }

        return seconds > 0 ? sum / seconds : null;
    }
}
