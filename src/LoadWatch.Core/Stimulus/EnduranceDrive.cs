namespace LoadWatch.Stimulus;

/// <summary>The relative drive of power or speed, reading after reading: from the critical value, the maximum and what is left above the critical value, as one
/// variant takes them.</summary>
public struct EnduranceDrive
{
    private readonly double critical;
    private readonly double? maximum;
    private readonly double whole;
    private readonly double criticalDrive;
    private readonly bool seesFatigue;
    private WPrimeBalance balance;

    public EnduranceDrive(EnduranceLimits limits, Variant variant)
    {
        critical = variant.Capacity(limits.Critical.Value, CapacityError.Of(limits.Critical.Source));
        maximum = limits.Maximum is { } max ? variant.Capacity(max.Value, CapacityError.Of(max.Source)) : null;
        criticalDrive = variant.CriticalDrive;
        seesFatigue = limits is { Whole: not null, Maximum: not null };
        whole = seesFatigue ? variant.Capacity(limits.Whole!.Value, CapacityError.WPrime) : 1;
        balance = new WPrimeBalance(critical, whole, limits.WattsPerUnit);
    }

    /// <summary>Goes on to the next reading.</summary>
    public void Advance(long unixMilliseconds, double intensity, double seconds)
    {
        if (seesFatigue)
        {
            balance.Advance(unixMilliseconds, intensity, seconds);
        }
    }

    /// <summary>The least that was left above the critical value so far, J or m; below 0 where more was spent than the variant takes it to be; null where no fatigue
    /// is seen.</summary>
    public readonly double? LowestLeft => seesFatigue ? balance.Lowest : null;

    /// <summary>True where the drive follows from the intensity alone, whatever was done before.</summary>
    public readonly bool IsFresh(double intensity) => intensity <= critical || !seesFatigue;

    /// <summary>The drive at an intensity at the time of the reading gone on to, 0 to 1.</summary>
    public readonly double At(double intensity) =>
        Drive.Of(intensity, critical, maximum, IsFresh(intensity) ? 1 : balance.Left / whole, criticalDrive);
}
