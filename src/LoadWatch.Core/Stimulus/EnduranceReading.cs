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
                notSeen);
        }
        finally
        {
            ArrayPool<Moment>.Shared.Return(kept);
        }
    }

    private static (ClassFractions Seconds, int Bouts) Read(in Readings readings, EnduranceLimits limits, Variant variant, Span<Moment> kept)
    {
        var times = readings.UnixMilliseconds;
        var values = readings.Values;
        var milliseconds = readings.Milliseconds;
        var drive = new EnduranceDrive(limits, variant);
        var bouts = new HardBouts();
        var sum = default(ClassFractions);
        kept.Clear();
        for (var at = 0; at < values.Length; at++)
        {
            var seconds = UsableSamples.Seconds(milliseconds[at]);
            drive.Advance(times[at], values[at], seconds);
            var moment = At(values[at], drive, variant.Recruitment, kept);
            sum += moment.Recruited * seconds;
            bouts.Add(times[at], milliseconds[at], moment.Drive);
        }

        return (sum, bouts.Count);
    }

    private static Moment At(double intensity, in EnduranceDrive drive, Recruitment recruitment, Span<Moment> kept)
    {
        var whole = unchecked((int)intensity);
        if (whole < 0 || whole >= kept.Length || whole != intensity || !drive.IsFresh(intensity))
        {
            return Moment.Of(drive.At(intensity), recruitment);
        }

        if (!kept[whole].IsKnown)
        {
            kept[whole] = Moment.Of(drive.At(intensity), recruitment);
        }

        return kept[whole];
    }

    private readonly record struct Moment(double Drive, ClassFractions Recruited, bool IsKnown)
    {
        public static Moment Of(double drive, Recruitment recruitment) => new(drive, recruitment.At(drive), IsKnown: true);
    }
}
