using System.Buffers;
using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads heart rate, the weakest channel: seconds of the slow and medium classes, bouts and the largest class unknown, grade
/// E.</summary>
public static class HeartRateStimulus
{
    /// <param name="heartRate">Usable readings, bpm.</param>
    /// <param name="milliseconds">For how long each of them counts; 0 where a better channel tells.</param>
    public static EnduranceEstimate Of(UsableChannel heartRate, ReadOnlySpan<int> milliseconds, HeartRateDrive drive, Variants variants)
    {
        var fractions = ArrayPool<double>.Shared.Rent(heartRate.Count);
        try
        {
            drive.SmoothFractions(heartRate, fractions);
            return Of(fractions, milliseconds, drive, variants);
        }
        finally
        {
            ArrayPool<double>.Shared.Return(fractions);
        }
    }

    private static EnduranceEstimate Of(double[] fractions, ReadOnlySpan<int> milliseconds, HeartRateDrive drive, Variants variants)
    {
        var low = Read(fractions, milliseconds, drive, variants.Low);
        var mid = Read(fractions, milliseconds, drive, variants.Mid);
        var high = Read(fractions, milliseconds, drive, variants.High);
        return new EnduranceEstimate(
            Grade.E,
            StimulusChannels.HeartRate,
            HardBouts: null,
            Bands.Of(low, mid, high, reading => reading.Slow),
            Bands.Of(low, mid, high, reading => reading.Medium),
            LargeSeconds: null,
            [EnduranceRemarks.OfHeartRate])
        {
            HeartRate = drive,
        };
    }

    private static ClassFractions Read(ReadOnlySpan<double> fractions, ReadOnlySpan<int> milliseconds, HeartRateDrive drive, Variant variant)
    {
        var seconds = default(ClassFractions);
        var (before, recruited) = (double.NaN, default(ClassFractions));
        for (var sample = 0; sample < milliseconds.Length; sample++)
        {
            if (milliseconds[sample] == 0)
            {
                continue;
            }

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
