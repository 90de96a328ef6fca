using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads power second by second: relative drive from critical power, maximal power and the balance of W', then the pool.</summary>
public static class PowerStimulus
{
    /// <param name="power">Usable readings in time order, W.</param>
    public static EnduranceEstimate Of(IReadOnlyList<UsableSample> power, PowerCapacity capacity)
    {
        var low = Read(power, capacity, Variant.Low);
        var mid = Read(power, capacity, Variant.Mid);
        var high = Read(power, capacity, Variant.High);
        var trueMaximum = capacity.Maximum is not null;
        return new EnduranceEstimate(
            capacity.Grade,
            StimulusChannels.Power,
            trueMaximum ? Bands.Of(low, mid, high, reading => reading.Bouts) : null,
            Bands.Of(low, mid, high, reading => reading.Seconds.Slow),
            Bands.Of(low, mid, high, reading => reading.Seconds.Medium),
            trueMaximum ? Bands.Of(low, mid, high, reading => reading.Seconds.Large) : null,
            capacity.NotSeen);
    }

    /// <summary>The relative drive at each sample, 0 to 1.</summary>
    public static double[] Drives(IReadOnlyList<UsableSample> power, PowerCapacity capacity, Variant variant)
    {
        var critical = variant.Capacity(capacity.Critical.Value, CapacityError.Of(capacity.Critical.Source));
        double? maximum = capacity.Maximum is { } max ? variant.Capacity(max.Value, CapacityError.Of(max.Source)) : null;
        double? wPrime = capacity.WPrime is { } anchor ? variant.Capacity(anchor.Value, CapacityError.WPrime) : null;
        var balances = wPrime is { } full && maximum is not null ? WPrimeBalance.Of(power, critical, full) : null;
        var drives = new double[power.Count];
        for (var sample = 0; sample < drives.Length; sample++)
        {
            var balance = balances is null ? 1 : balances[sample] / wPrime!.Value;
            drives[sample] = Drive.Of(power[sample].Value, critical, maximum, balance, variant.CriticalDrive);
        }

        return drives;
    }

    private static (ClassFractions Seconds, int Bouts) Read(IReadOnlyList<UsableSample> power, PowerCapacity capacity, Variant variant)
    {
        var drives = Drives(power, capacity, variant);
        var bouts = new HardBouts();
        var seconds = default(ClassFractions);
        for (var sample = 0; sample < drives.Length; sample++)
        {
            seconds += variant.Recruitment.At(drives[sample]) * power[sample].Seconds;
            bouts.Add(power[sample].UnixMilliseconds, power[sample].Milliseconds, drives[sample]);
        }

        return (seconds, bouts.Count);
    }
}
