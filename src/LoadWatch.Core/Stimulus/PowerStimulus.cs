using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads power second by second: relative drive from critical power, maximal power and the balance of W', then the pool.</summary>
public static class PowerStimulus
{
    public static EnduranceEstimate Of(UsableChannel power, PowerCapacity capacity)
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

    private static (ClassFractions Seconds, int Bouts) Read(UsableChannel power, PowerCapacity capacity, Variant variant)
    {
        var times = power.UnixMilliseconds;
        var values = power.Values;
        var milliseconds = power.Milliseconds;
        var drive = new PowerDrive(power, capacity, variant);
        var known = new WholeWatts();
        var bouts = new HardBouts();
        var sum = default(ClassFractions);
        for (var at = 0; at < values.Length; at++)
        {
            var seconds = milliseconds[at] / 1000.0;
            var now = drive.Next(times[at], values[at], seconds);
            sum += (drive.IsFresh(values[at]) ? known.At(values[at], now, variant.Recruitment) : variant.Recruitment.At(now)) * seconds;
            bouts.Add(times[at], milliseconds[at], now);
        }

        return (sum, bouts.Count);
    }
}
