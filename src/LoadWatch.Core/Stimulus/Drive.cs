namespace LoadWatch.Stimulus;

/// <summary>
/// Relative drive of an endurance channel. Assumption: the critical intensity sits at a fixed drive (0.65 usually), the momentary maximum at 1, which is
/// what <see cref="AvailablePower"/> leaves.
/// X up to X_c: e = 0.65 X / X_c. Above: e = min(1, 0.65 + 0.35 (X - X_c) / (X_available - X_c)), X_available - X_c = (X_max - X_c) b, b = W'bal / W'.
/// </summary>
public static class Drive
{
    /// <param name="intensity">X, 0 or more, in the unit of the capacities.</param>
    /// <param name="critical">X_c, above 0.</param>
    /// <param name="maximum">X_max, above <paramref name="critical"/>; null where unknown: then all above X_c reads as X_c, a lower
    /// bound.</param>
    /// <param name="balance">b, 1 when fresh; 0 or less when exhausted.</param>
    /// <param name="criticalDrive">The drive at X_c.</param>
    /// <returns>0 to 1.</returns>
    public static double Of(double intensity, double critical, double? maximum, double balance, double criticalDrive)
    {
        if (intensity <= critical)
        {
            return criticalDrive * intensity / critical;
        }

        if (maximum is not { } max)
        {
            return criticalDrive;
        }

        return balance <= 0
            ? 1
            : Math.Min(1, criticalDrive + ((1 - criticalDrive) * (intensity - critical) / (AvailablePower.Watts(critical, max, balance) - critical)));
    }
}
