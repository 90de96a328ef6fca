namespace LoadWatch.Stimulus;

/// <summary>
/// One reading of the estimator. The band of an estimate is the same session read three times: with what makes large units join late,
/// as usual, and with what makes them join early. The spans are assumptions: RR 70, 50, 30; shares 10 points either way; anchor 0.65 by
/// 0.05 either way.
/// </summary>
/// <param name="Recruitment">The pool and its classes.</param>
/// <param name="CriticalDrive">Relative drive at the critical intensity: critical power or the second threshold.</param>
/// <param name="Side">-1 reads every capacity higher by its error (so the drive is lower), 1 lower, 0 as anchored.</param>
public sealed record Variant(Recruitment Recruitment, double CriticalDrive, int Side)
{
    public static Variant Low { get; } = new(new Recruitment(MotorUnitPool.Broad, new ClassShares(0.53, 0.34)), 0.60, -1);

    public static Variant Mid { get; } = new(new Recruitment(MotorUnitPool.Usual, ClassShares.Usual), 0.65, 0);

    public static Variant High { get; } = new(new Recruitment(MotorUnitPool.Narrow, new ClassShares(0.33, 0.34)), 0.70, 1);

    /// <summary>A capacity as this variant takes it.</summary>
    /// <param name="relativeError">0 or more, below 1.</param>
    public double Capacity(double value, double relativeError) => value * (1 - (Side * relativeError));
}
