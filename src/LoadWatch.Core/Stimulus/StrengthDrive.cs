namespace LoadWatch.Stimulus;

/// <summary>
/// Relative drive of one repetition. Assumption: capacity falls evenly from the rested maximum to the load itself at the repetition that
/// fails.
/// Repetition k of a set that would fail after m: capacity c(k) = 1 - (1 - L)(k - 1)/(m - 1), m = 1: c = 1; e(k) = L / c(k); L = load /
/// one-repetition maximum.
/// </summary>
public static class StrengthDrive
{
    /// <param name="relativeLoad">L; above 1 it reads as 1.</param>
    /// <param name="repetition">k, from 1.</param>
    /// <param name="repetitionsToFailure">m, done and in reserve together, at least k; null where the reserve is unknown: then L alone, a
    /// lower bound.</param>
    /// <returns>0 to 1.</returns>
    public static double Of(double relativeLoad, int repetition, double? repetitionsToFailure)
    {
        var load = Math.Min(1, relativeLoad);
        return repetitionsToFailure is { } failing && failing > 1
            ? Math.Min(1, load * (failing - 1) / (failing - repetition + (load * (repetition - 1))))
            : load;
    }
}
