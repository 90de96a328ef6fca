using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>Reads heart rate, the weakest channel: seconds of the slow and medium classes, bouts and the largest class unknown, grade
/// E.</summary>
public static class HeartRateStimulus
{
    /// <param name="heartRate">Usable readings in time order, bpm.</param>
    public static EnduranceEstimate Of(IReadOnlyList<UsableSample> heartRate, HeartRateDrive drive)
    {
        var fractions = drive.SmoothedFractions(heartRate);
        var low = Read(heartRate, fractions, drive, Variant.Low);
        var mid = Read(heartRate, fractions, drive, Variant.Mid);
        var high = Read(heartRate, fractions, drive, Variant.High);
        return new EnduranceEstimate(
            Grade.E,
            StimulusChannels.HeartRate,
            HardBouts: null,
            Bands.Of(low, mid, high, reading => reading.Slow),
            Bands.Of(low, mid, high, reading => reading.Medium),
            LargeSeconds: null,
            ["bouts and the largest class: heart rate cannot show them; power with critical_power and power_max, or logged sets, would"]);
    }

    private static ClassFractions Read(
        IReadOnlyList<UsableSample> heartRate, double[] fractions, HeartRateDrive drive, Variant variant)
    {
        var seconds = default(ClassFractions);
        for (var sample = 0; sample < fractions.Length; sample++)
        {
            seconds += variant.Recruitment.At(drive.Of(fractions[sample], variant)) * heartRate[sample].Seconds;
        }

        return seconds;
    }
}
