using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>The relative drive of power, reading after reading: from critical power, maximal power and the balance of W', as one variant takes them.</summary>
public struct PowerDrive
{
    private readonly double critical;
    private readonly double? maximum;
    private readonly double wPrime;
    private readonly double criticalDrive;
    private readonly bool seesFatigue;
    private WPrimeBalance balance;
    private double left;

    /// <param name="power">All readings of the session; they are taken one after the other.</param>
    public PowerDrive(UsableChannel power, PowerCapacity capacity, Variant variant)
    {
        critical = variant.Capacity(capacity.Critical.Value, CapacityError.Of(capacity.Critical.Source));
        maximum = capacity.Maximum is { } max ? variant.Capacity(max.Value, CapacityError.Of(max.Source)) : null;
        criticalDrive = variant.CriticalDrive;
        seesFatigue = capacity is { WPrime: not null, Maximum: not null };
        wPrime = seesFatigue ? variant.Capacity(capacity.WPrime!.Value, CapacityError.WPrime) : 1;
        balance = seesFatigue ? new WPrimeBalance(power, critical, wPrime) : default;
        left = wPrime;
    }

    /// <summary>Goes on to the next reading.</summary>
    public void Advance(long unixMilliseconds, double watts, double seconds)
    {
        if (seesFatigue)
        {
            left = balance.Next(unixMilliseconds, watts, seconds);
        }
    }

    /// <summary>True where the drive follows from the intensity alone, whatever was done before.</summary>
    public readonly bool IsFresh(double watts) => watts <= critical || !seesFatigue;

    /// <summary>The drive at an intensity at the time of the reading gone on to, 0 to 1.</summary>
    public readonly double At(double watts) => Drive.Of(watts, critical, maximum, left / wPrime, criticalDrive);
}
