using System.Buffers;
using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads heart rate, the weakest channel: seconds of the slow and medium classes, bouts and the largest class unknown, grade
/// E.</summary>
public static class HeartRateStimulus
{
    /// <param name="heartRate">Usable readings, bpm.</param>
    public static EnduranceEstimate Of(UsableChannel heartRate, HeartRateDrive drive)
    {
        var fractions = ArrayPool<double>.Shared.Rent(heartRate.Count);
        try
        {
            drive.SmoothFractions(heartRate, fractions);
            return Of(fractions, heartRate.Milliseconds, drive);
        }
        finally
        {
            ArrayPool<double>.Shared.Return(fractions);
        }
    }

    private static EnduranceEstimate Of(double[] fractions, ReadOnlySpan<int> milliseconds, HeartRateDrive drive)
    {
        var low = Read(fractions, milliseconds, drive, Variant.Low);
        var mid = Read(fractions, milliseconds, drive, Variant.Mid);
        var high = Read(fractions, milliseconds, drive, Variant.High);
        return new EnduranceEstimate(
            Grade.E,
            StimulusChannels.HeartRate,
            HardBouts: null,
            Bands.Of(low, mid, high, reading => reading.Slow),
            Bands.Of(low, mid, high, reading => reading.Medium),
            LargeSeconds: null,
            ["bouts and the largest class: heart rate cannot show them; power with critical_power and power_max, or logged sets, would"]);
    }

    private static ClassFractions Read(ReadOnlySpan<double> fractions, ReadOnlySpan<int> milliseconds, HeartRateDrive drive, Variant variant)
    {
        var seconds = default(ClassFractions);
        var (before, recruited) = (double.NaN, default(ClassFractions));
        for (var sample = 0; sample < milliseconds.Length; sample++)
        {
            if (fractions[sample] != before)
            {
                before = fractions[sample];
                recruited = variant.Recruitment.At(drive.Of(before, variant));
            }

            seconds += recruited * UsableSamples.Seconds(milliseconds[sample]);
        }

        return seconds;
    }
}
