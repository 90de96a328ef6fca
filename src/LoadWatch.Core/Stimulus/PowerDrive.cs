using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>The relative drive of power, reading after reading: from critical power, maximal power and the balance of W', as one variant takes them.</summary>
public struct PowerDrive
{
    private readonly double critical;
    private readonly double? maximum;
    private readonly double? wPrime;
    private readonly double criticalDrive;
    private WPrimeBalance balance;

    /// <param name="power">All readings of the session; they are asked for one after the other.</param>
    public PowerDrive(UsableChannel power, PowerCapacity capacity, Variant variant)
    {
        critical = variant.Capacity(capacity.Critical.Value, CapacityError.Of(capacity.Critical.Source));
        maximum = capacity.Maximum is { } max ? variant.Capacity(max.Value, CapacityError.Of(max.Source)) : null;
        wPrime = capacity is { WPrime: { } anchor, Maximum: not null } ? variant.Capacity(anchor.Value, CapacityError.WPrime) : null;
        criticalDrive = variant.CriticalDrive;
        balance = wPrime is { } full ? new WPrimeBalance(power, critical, full) : default;
    }

    /// <summary>True where the drive follows from the intensity alone, whatever was done before.</summary>
    public readonly bool IsFresh(double watts) => watts <= critical || wPrime is null;

    /// <summary>The drive of the next reading, 0 to 1.</summary>
    public double Next(long unixMilliseconds, double watts, double seconds)
    {
        var left = wPrime is { } full ? balance.Next(unixMilliseconds, watts, seconds) / full : 1;
        return Drive.Of(watts, critical, maximum, left, criticalDrive);
    }
}
