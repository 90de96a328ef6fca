namespace LoadWatch;

/// <summary>Rounding of stored values and rule inputs to 9 significant digits (I-5), so that the order of a sum never decides.</summary>
public static class Significant
{
    /// <summary>Anything nearer to 0 is 0: no quantity here is that small, and its scale would overflow.</summary>
    private const double Smallest = 1e-200;

    /// <summary>The value rounded to 9 significant digits, half to even.</summary>
    /// <exception cref="ArgumentException">The value is not finite.</exception>
    public static double Round(double value)
    {
        if (!double.IsFinite(value))
        {
            throw new ArgumentException("only finite values are stored", nameof(value));
        }

        if (Math.Abs(value) < Smallest)
        {
            return 0;
        }

        var digits = 8 - (int)Math.Floor(Math.Log10(Math.Abs(value)));
        if (digits is >= 0 and <= 15)
        {
            return Math.Round(value, digits);
        }

        var scale = Math.Pow(10, Math.Abs(digits));
        return digits < 0 ? Math.Round(value / scale) * scale : Math.Round(value * scale) / scale;
    }

    /// <summary>Null stays null.</summary>
    public static double? Round(double? value) => value is { } known ? Round(known) : null;
}
