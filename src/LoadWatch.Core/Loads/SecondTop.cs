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
        var held = channel.Samples.Where(sample => sample.Milliseconds > 0).ToArray();
        double? top = null;
        for (var first = 0; first < held.Length; first++)
        {
            if (SlowestOfOneSecond(held, first, top) is { } slowest)
            {
                top = slowest;
            }
        }

        return Significant.Round(top);
    }

    /// <summary>The slowest reading of the second that begins with one, or null where that is no faster than the top so far or the readings end.</summary>
    private static double? SlowestOfOneSecond(UsableSample[] held, int first, double? top)
    {
        var slowest = double.PositiveInfinity;
        var milliseconds = 0;
        for (var at = first; at < held.Length; at++)
        {
            slowest = Math.Min(slowest, held[at].Value);
            if (slowest <= top)
            {
                return null;
            }

            milliseconds += held[at].Milliseconds;
            if (milliseconds >= HeldMilliseconds)
            {
                return slowest;
            }
        }

        return null;
    }
}
