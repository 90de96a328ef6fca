using System.Buffers;
using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>
/// Reads power or speed moment by moment in the three variants: relative drive from the critical value, the maximum and the balance above the critical value,
/// then the pool. No figure for bouts and the largest class without a true maximum.
/// </summary>
internal static class EnduranceReading
{
    /// <summary>Devices write whole watts and few different ones: up to here what they ask for is kept where it follows from them alone.</summary>
    private const int KeptUnits = 512;

    public static EnduranceEstimate Of(
        in Readings readings, EnduranceLimits limits, Variants variants, Grade grade, string channel, IReadOnlyList<string> notSeen)
    {
        var kept = ArrayPool<Moment>.Shared.Rent(KeptUnits);
        try
        {
            var low = Read(readings, limits, variants.Low, kept);
            var mid = Read(readings, limits, variants.Mid, kept);
            var high = Read(readings, limits, variants.High, kept);
            return new EnduranceEstimate(
                grade,
                channel,
                limits.Maximum is null ? null : Bands.Of(low, mid, high, reading => reading.Bouts),
                Bands.Of(low, mid, high, reading => reading.Seconds.Slow),
                Bands.Of(low, mid, high, reading => reading.Seconds.Medium),
                limits.Maximum is null ? null : Bands.Of(low, mid, high, reading => reading.Seconds.Large),
                notSeen)
            {
                Steps = new EnduranceSteps(limits, variants, mid.LowestLeft, mid.CriticalSeconds, limits.Maximum is null ? null : mid.HardSeconds),
            };
        }
        finally
        {
            ArrayPool<Moment>.Shared.Return(kept);
        }
    }

    private static ChannelReading Read(in Readings readings, EnduranceLimits limits, Variant variant, Span<Moment> kept)
    {
        var times = readings.UnixMilliseconds;
        var values = readings.Values;
        var milliseconds = readings.Milliseconds;
        var drive = new EnduranceDrive(limits, variant);
        var bouts = new HardBouts();
        var sum = default(ClassFractions);
        var (critical, hard) = (0.0, 0.0);
        kept.Clear();
        for (var at = 0; at < values.Length; at++)
        {
            var seconds = UsableSamples.Seconds(milliseconds[at]);
            drive.Advance(times[at], values[at], seconds);
            var moment = At(values[at], drive, variant, kept);
            sum += moment.Recruited * seconds;
            bouts.Add(times[at], milliseconds[at], moment.Drive);
            critical += moment.IsCritical ? seconds : 0;
            hard += moment.IsHard ? seconds : 0;
        }

        return new ChannelReading(sum, bouts.Count, drive.LowestLeft, critical, hard);
    }

    private static Moment At(double intensity, in EnduranceDrive drive, Variant variant, Span<Moment> kept)
    {
        var whole = unchecked((int)intensity);
        if (whole < 0 || whole >= kept.Length || whole != intensity || !drive.IsFresh(intensity))
        {
            return Moment.Of(drive.At(intensity), variant);
        }

        if (!kept[whole].IsKnown)
        {
            kept[whole] = Moment.Of(drive.At(intensity), variant);
        }

        return kept[whole];
    }

    private readonly record struct Moment(double Drive, ClassFractions Recruited, bool IsCritical, bool IsHard, bool IsKnown)
    {
        public static Moment Of(double drive, Variant variant) =>
            new(drive, variant.Recruitment.At(drive), HardLine.Reached(drive, variant.CriticalDrive), HardLine.Reached(drive), IsKnown: true);
    }

    private readonly record struct ChannelReading(ClassFractions Seconds, int Bouts, double? LowestLeft, double CriticalSeconds, double HardSeconds);
}
