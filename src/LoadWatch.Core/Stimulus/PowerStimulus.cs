using System.Buffers;
using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads power second by second: relative drive from critical power, maximal power and the balance of W', then the pool.</summary>
public static class PowerStimulus
{
    /// <summary>Devices write whole watts and few different ones: up to here what they ask for is kept where it follows from them alone.</summary>
    private const int KeptWatts = 512;

    public static EnduranceEstimate Of(UsableChannel power, PowerCapacity capacity)
    {
        var kept = ArrayPool<Reading>.Shared.Rent(KeptWatts);
        try
        {
            return Of(power, capacity, kept);
        }
        finally
        {
            ArrayPool<Reading>.Shared.Return(kept);
        }
    }

    private static EnduranceEstimate Of(UsableChannel power, PowerCapacity capacity, Span<Reading> kept)
    {
        var low = Read(power, capacity, Variant.Low, kept);
        var mid = Read(power, capacity, Variant.Mid, kept);
        var high = Read(power, capacity, Variant.High, kept);
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

    private static (ClassFractions Seconds, int Bouts) Read(UsableChannel power, PowerCapacity capacity, Variant variant, Span<Reading> kept)
    {
        var times = power.UnixMilliseconds;
        var values = power.Values;
        var milliseconds = power.Milliseconds;
        var drive = new PowerDrive(power, capacity, variant);
        var bouts = new HardBouts();
        var sum = default(ClassFractions);
        kept.Clear();
        for (var at = 0; at < values.Length; at++)
        {
            var seconds = UsableSamples.Seconds(milliseconds[at]);
            drive.Advance(times[at], values[at], seconds);
            var reading = At(values[at], drive, variant.Recruitment, kept);
            sum += reading.Recruited * seconds;
            bouts.Add(times[at], milliseconds[at], reading.Drive);
        }

        return (sum, bouts.Count);
    }

    private static Reading At(double watts, in PowerDrive drive, Recruitment recruitment, Span<Reading> kept)
    {
        var whole = unchecked((int)watts);
        if (whole < 0 || whole >= kept.Length || whole != watts || !drive.IsFresh(watts))
        {
            return Reading.Of(drive.At(watts), recruitment);
        }

        if (!kept[whole].IsKnown)
        {
            kept[whole] = Reading.Of(drive.At(watts), recruitment);
        }

        return kept[whole];
    }

    private readonly record struct Reading(double Drive, ClassFractions Recruited, bool IsKnown)
    {
        public static Reading Of(double drive, Recruitment recruitment) => new(drive, recruitment.At(drive), IsKnown: true);
    }
}
