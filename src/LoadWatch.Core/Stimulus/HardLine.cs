namespace LoadWatch.Stimulus;

/// <summary>The line from which work counts as hard. A choice: well above the threshold of the largest class in the usual pool
/// (0.61).</summary>
public static class HardLine
{
    /// <summary>Relative drive.</summary>
    public const double Drive = 0.70;

    /// <summary>Compared after rounding to 9 digits, so that a drive that is 0.70 by hand is 0.70 here.</summary>
    public static bool Reached(double drive) => Reached(drive, Drive);

    /// <summary>The same of another line.</summary>
    public static bool Reached(double drive, double line) => drive > line - 1e-6 && Math.Round(drive, 9) >= line;
}
