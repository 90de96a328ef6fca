namespace LoadWatch.Stimulus;

/// <summary>Recruited fraction of each class of motor unit, by count, 0 to 1. Never less of a smaller class than of a larger one.</summary>
public readonly record struct ClassFractions(double Slow, double Medium, double Large)
{
    public static ClassFractions operator +(ClassFractions left, ClassFractions right) =>
        new(left.Slow + right.Slow, left.Medium + right.Medium, left.Large + right.Large);

    public static ClassFractions operator *(ClassFractions fractions, double factor) =>
        new(fractions.Slow * factor, fractions.Medium * factor, fractions.Large * factor);
}

/// <summary>
/// From relative drive to recruited fractions (assumption: the share of the momentary maximum reads like the share of maximal force in the
/// pool).
/// Units below the drive are in; between the thresholds of two units the count is interpolated; a class is at 0 below its own first
/// threshold.
/// </summary>
public sealed class Recruitment
{
    /// <summary>Equal steps of drive in which the search for a threshold begins.</summary>
    private const int Steps = 1024;

    private readonly double[] thresholds;
    private readonly byte[] joinedBefore = new byte[Steps + 1];
    private readonly int slow;
    private readonly int medium;
    private readonly int large;

    public Recruitment(MotorUnitPool pool, ClassShares shares)
    {
        thresholds = [.. pool.ForceFractions];
        (slow, medium, large) = shares.Split(pool);
        for (var step = 0; step <= Steps; step++)
        {
            joinedBefore[step] = (byte)thresholds.Count(threshold => threshold <= step / (double)Steps);
        }
    }

    /// <param name="drive">Relative drive, 0 to 1.</param>
    public ClassFractions At(double drive)
    {
        var units = UnitsAt(drive);
        return new ClassFractions(
            Fraction(units, 0, slow),
            Fraction(units, slow, medium),
            Fraction(units, slow + medium, large));
    }

    private double UnitsAt(double drive)
    {
        var joined = Joined(drive);
        if (joined == 0 || joined == thresholds.Length)
        {
            return joined;
        }

        return joined + ((drive - thresholds[joined - 1]) / (thresholds[joined] - thresholds[joined - 1]));
    }

    /// <summary>How many thresholds the drive has reached.</summary>
    private int Joined(double drive)
    {
        int joined = joinedBefore[unchecked((int)(Math.Clamp(drive, 0, 1) * Steps))];
        while (joined < thresholds.Length && thresholds[joined] <= drive)
        {
            joined++;
        }

        return joined;
    }

    private static double Fraction(double units, int smaller, int size)
    {
        if (units < smaller + 1)
        {
            return 0;
        }

        return units - smaller >= size ? 1 : (units - smaller) / size;
    }
}
