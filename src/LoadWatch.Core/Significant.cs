using System.Globalization;

namespace LoadWatch;

/// <summary>Rounding of stored values and rule inputs to 9 significant digits (I-5), so that the order of a sum never decides.</summary>
public static class Significant
{
    /// <summary>Anything nearer to 0 is 0: no quantity here is that small, and its scale would overflow.</summary>
    private const double Smallest = 1e-200;

    private const int SmallestPower = -201;

    /// <summary>10 to the power of -201 and so on, up to infinity.</summary>
    private static readonly double[] Powers =
        [.. Enumerable.Range(SmallestPower, 309 - SmallestPower + 1).Select(power => double.Parse($"1e{power}", NumberStyles.Float, CultureInfo.InvariantCulture))];

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

        var digits = 8 - Magnitude(Math.Abs(value));
        if (digits is >= 0 and <= 15)
        {
            return Math.Round(value, digits);
        }

        var scale = Math.Pow(10, Math.Abs(digits));
        return digits < 0 ? Math.Round(value / scale) * scale : Math.Round(value * scale) / scale;
    }

    /// <summary>The largest power of ten that a value of at least 1e-200 reaches: the one below its power of two, or the next. A logarithm takes three times as long.</summary>
    private static int Magnitude(double value)
    {
        var below = (int)Math.Floor(Math.ILogB(value) * 0.30102999566398120);
        return value >= Powers[below + 1 - SmallestPower] ? below + 1 : below;
    }

    /// <summary>Null stays null.</summary>
    public static double? Round(double? value) => value is { } known ? Round(known) : null;
}
