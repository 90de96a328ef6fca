namespace LoadWatch.Stimulus;

/// <summary>
/// What is left of W' (or of D', metres above critical speed), moment by moment. Source: the differential form of Skiba et al. 2015, Eur J Appl Physiol
/// 115:703-713, with the time constant of Weigend et al. 2022 (<see cref="WPrimeForm.Fitted"/>), which of the published forms is nearest to the published
/// recoveries. X at or above X_c: W'bal falls by (X - X_c) dt. Below: what is spent shrinks by exp(-dt / tau(D)), D = X_c - X. Good to about 30 %.
/// A moment's balance uses nothing that comes after it. Departures: 1 / tau is interpolated between whole watts; time that no reading stands for (stops,
/// dropouts) recovers as rest does and does not spend.
/// No form is published in speed: metres per second below critical speed are taken as the same share of 250 W (an assumption; the people whom the time
/// constant comes from had a critical power of 248 W).
/// </summary>
public struct WPrimeBalance
{
    /// <summary>Critical power of the people whom the time constant was fitted to, W, rounded.</summary>
    public const double FittedCriticalWatts = 250;

    private const int TableWatts = 640;

    private static readonly double[] Rates =
        [.. Enumerable.Range(0, TableWatts + 2).Select(watts => 1 / WPrimeForm.FittedTau(Math.Min(watts, TableWatts)))];

    private readonly double critical;
    private readonly double whole;
    private readonly double wattsPerUnit;
    private double spent;
    private double mostSpent;
    private double recovering;
    private double intensity;
    private double standing;
    private long before;

    /// <param name="critical">X_c, above 0, W (or m/s).</param>
    /// <param name="whole">W' (or D'), above 0, J (or m).</param>
    /// <param name="wattsPerUnit">1 for power; what a unit of intensity below the critical one recovers like.</param>
    public WPrimeBalance(double critical, double whole, double wattsPerUnit = 1)
    {
        (this.critical, this.whole, this.wattsPerUnit) = (critical, whole, wattsPerUnit);
        intensity = critical;
    }

    /// <summary>The balance at the time of the reading gone on to, before its own work; below 0 when more was spent than the anchors allow.</summary>
    public readonly double Left => whole - (recovering == 0 ? spent : spent * Math.Exp(-recovering));

    /// <summary>The least that was left up to the end of the reading gone on to, its own work included.</summary>
    public readonly double Lowest => whole - Math.Max(mostSpent, intensity > critical ? Worked() : 0);

    /// <summary>Goes on to the next reading; times must not run backwards.</summary>
    /// <param name="seconds">How long it stands for.</param>
    public void Advance(long unixMilliseconds, double intensity, double seconds)
    {
        Settle((unixMilliseconds - before) / 1000.0);
        (before, this.intensity, standing) = (unixMilliseconds, intensity, seconds);
    }

    /// <summary>Lets the time since the reading before go by. Recovery is kept as a sum of dt / tau, so that its exponential is taken only where more is
    /// spent behind it.</summary>
    private void Settle(double apart)
    {
        if (intensity > critical)
        {
            spent = Worked();
            mostSpent = Math.Max(mostSpent, spent);
            recovering = 0;
        }
        else if (intensity < critical && spent > 0)
        {
            recovering += standing * Rate((critical - intensity) * wattsPerUnit);
        }

        if (spent > 0 && apart > standing)
        {
            recovering += (apart - standing) * Rate(critical * wattsPerUnit);
        }
    }

    /// <summary>What is spent when the reading gone on to has been worked, above critical power.</summary>
    private readonly double Worked() => (spent * Math.Exp(-recovering)) + ((intensity - critical) * standing);

    /// <summary>1 / tau, per second.</summary>
    private static double Rate(double belowWatts)
    {
        var watts = unchecked((int)Math.Min(belowWatts, TableWatts));
        return Rates[watts] + ((Math.Min(belowWatts, TableWatts) - watts) * (Rates[watts + 1] - Rates[watts]));
    }
}
