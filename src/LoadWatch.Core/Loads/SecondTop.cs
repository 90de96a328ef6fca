using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// The highest value that was held for 1 s: the largest v such that readings in a row at v or more stand for 1 s or more. Common practice,
/// no published source. At one reading a second, or fewer, this is the highest reading; at ten a second a single jump of a position does not
/// count. The last reading stands for no time and never counts.
/// </summary>
public static class SecondTop
{
    private const int HeldMilliseconds = 1000;

    /// <summary>In the unit of the channel; null where the readings do not stand for 1 s together.</summary>
    public static double? Of(UsableChannel channel)
    {
        var held = channel.Held();
        var values = held.Values;
        var top = double.NegativeInfinity;
        for (var first = 0; first < values.Length; first++)
        {
            top = Math.Max(top, SlowestOfOneSecond(values[first..], held.Milliseconds[first..], top));
        }

        return double.IsFinite(top) ? Significant.Round(top) : null;
    }

    /// <summary>The slowest reading of the second that begins in front; minus infinity where that is no faster than the top so far or the readings end.</summary>
    private static double SlowestOfOneSecond(ReadOnlySpan<double> values, ReadOnlySpan<int> milliseconds, double top)
    {
        var (slowest, held) = (double.PositiveInfinity, 0);
        for (var at = 0; at < values.Length; at++)
        {
            slowest = Math.Min(slowest, values[at]);
            if (slowest <= top)
            {
                return double.NegativeInfinity;
            }

            held += milliseconds[at];
            if (held >= HeldMilliseconds)
            {
                return slowest;
            }
        }

        return double.NegativeInfinity;
    }
}
