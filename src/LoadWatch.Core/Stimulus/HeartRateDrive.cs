using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>
/// Relative drive from heart rate: e = 0.65 x / x2, x the fraction of heart-rate reserve, x2 the fraction at the second threshold, so that a steady
/// state told by heart rate and by power gives the same drive. Assumption. Heart rate lags by half a minute and more: it never shows a bout, and never
/// that there was none. Without an anchored threshold x2 = 0.85, a choice, marked by its error.
/// </summary>
/// <param name="Threshold">x2, above 0, at most 1.</param>
/// <param name="RelativeError">Of x2.</param>
public sealed record HeartRateDrive(HeartRateReserve Reserve, double Threshold, double RelativeError)
{
    private const double UsualThreshold = 0.85;
    private const int SmoothingMilliseconds = 15_000;

    /// <summary>Whether an anchored threshold tells x2.</summary>
    public bool IsAnchored { get; init; }

    /// <summary>An anchored threshold outside the reserve is not used.</summary>
    public static HeartRateDrive On(LocalDate date, string person, AnchorBook anchors, HeartRateReserve reserve)
    {
        var anchor = anchors.On(date, person, AnchorKind.HeartRateVt2);
        return anchor is not null && reserve.Unclamped(anchor.Value) is > 0 and <= 1 and var threshold
            ? new HeartRateDrive(reserve, threshold, CapacityError.Of(reserve.Estimated ? AnchorSource.Estimated : anchor.Source)) { IsAnchored = true }
            : new HeartRateDrive(reserve, UsualThreshold, CapacityError.Population);
    }

    /// <summary>The drive at a fraction of the reserve, 0 to 1.</summary>
    public double Of(double fraction, Variant variant) =>
        Math.Min(1, variant.CriticalDrive * fraction / variant.Capacity(Threshold, RelativeError));

    /// <summary>Fills in the fraction of the reserve at each reading, from the mean of the readings of the 15 s up to it.</summary>
    /// <param name="fractions">Room for one per reading.</param>
    public void SmoothFractions(UsableChannel heartRate, Span<double> fractions)
    {
        var times = heartRate.UnixMilliseconds;
        var values = heartRate.Values;
        var (oldest, sum) = (0, 0.0);
        for (var sample = 0; sample < values.Length; sample++)
        {
            sum += values[sample];
            while (times[sample] - times[oldest] >= SmoothingMilliseconds)
            {
                sum -= values[oldest++];
            }

            fractions[sample] = Reserve.Fraction(sum / (sample - oldest + 1));
        }
    }
}
