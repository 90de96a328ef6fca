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
public struct WPrimeBalance
{
    private readonly double criticalPowerWatts;
    private readonly double wPrimeJoules;
    private readonly double tau;
    private readonly double decayOfSecond;
    private double spent;
    private double spending;
    private long before;

    /// <param name="power">All readings of the session; they are asked for one after the other.</param>
    public WPrimeBalance(UsableChannel power, double criticalPowerWatts, double wPrimeJoules)
    {
        this.criticalPowerWatts = criticalPowerWatts;
        this.wPrimeJoules = wPrimeJoules;
        tau = MeanBelow(power, criticalPowerWatts) is { } mean ? Tau(criticalPowerWatts - mean) : double.PositiveInfinity;
        decayOfSecond = Math.Exp(-1 / tau);
        before = power.Count > 0 ? power.UnixMilliseconds[0] : 0;
    }

    /// <summary>Seconds, for D in watts (0 or more).</summary>
    public static double Tau(double belowCriticalWatts) => (546 * Math.Exp(-0.01 * belowCriticalWatts)) + 316;

    /// <summary>The balance at the time of the next reading, before its own work, joules; below 0 when more was spent than the anchors
    /// allow.</summary>
    public double Next(long unixMilliseconds, double watts, double seconds)
    {
        var apart = unixMilliseconds - before;
        var decay = apart == 1000 ? decayOfSecond : Math.Exp(-apart / 1000.0 / tau);
        spent = (spent * decay) + spending;
        spending = Math.Max(0, watts - criticalPowerWatts) * seconds;
        before = unixMilliseconds;
        return wPrimeJoules - spent;
    }

    private static double? MeanBelow(UsableChannel power, double criticalPowerWatts)
    {
        var values = power.Values;
        var milliseconds = power.Milliseconds;
        var (sum, seconds) = (0.0, 0.0);
        for (var at = 0; at < values.Length && at < milliseconds.Length; at++)
        {
            if (values[at] < criticalPowerWatts)
            {
                var apart = UsableSamples.Seconds(milliseconds[at]);
                sum += values[at] * apart;
                seconds += apart;
            }
        }

        return seconds > 0 ? sum / seconds : null;
    }
}
