using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// How often speed changed fast: high accelerations and high decelerations. Source of the bound and of the sampling that it wants: Harper, Carling
/// and Kiely 2019, Sports Med 49:1923 (above 2.5 m/s2, five readings a second or more); there is no consensus. Few studies state their filter or
/// how long an effort lasts (Delves et al. 2021), so here are ours, all choices:
/// a(t) = slope of the least-squares line through the readings of at most 0.25 s before and after t, three at least, m/s2;
/// an effort is a(t) of 2.5 m/s2 or more held for 0.5 s at ten readings a second or more, for 1 s at fewer, where shorter ones cannot be trusted;
/// it counts once until a(t) has come back to 0 or readings were more than 0.25 s apart. Decelerations are the same of -a(t).
/// Of readings of one moment the last counts.
/// </summary>
public static class Accelerations
{
    public const double HighMetresPerSecondSquared = 2.5;

    private const int SlowestStepMilliseconds = 200;
    private const int FastStepMilliseconds = 100;
    private const int ReachMilliseconds = 250;

    /// <summary>Counts, 0 or more; null where half of the readings or more are further apart than 0.2 s.</summary>
    public static (int Accelerations, int Decelerations)? Of(UsableChannel speed)
    {
        if (!MostAreWithin(SlowestStepMilliseconds, speed))
        {
            return null;
        }

        var heldWanted = MostAreWithin(FastStepMilliseconds, speed) ? 500 : 1000;
        var (rises, falls, held) = (new Tally(heldWanted), new Tally(heldWanted), speed.Held());
        var seconds = Seconds(held.UnixMilliseconds);
        for (var at = 0; at < held.Count; at++)
        {
            var slope = Slope(held.UnixMilliseconds, seconds, held.Values, at);
            rises.Add(slope, held.Milliseconds[at]);
            falls.Add(-slope, held.Milliseconds[at]);
        }

        return (rises.Count, falls.Count);
    }

    /// <summary>Whether the median step, the upper one of two, is no longer than this; false without any step.</summary>
    private static bool MostAreWithin(int longest, UsableChannel speed)
    {
        var (within, steps) = (0, 0);
        foreach (var step in speed.Milliseconds)
        {
            steps += step > 0 ? 1 : 0;
            within += step > 0 && step <= longest ? 1 : 0;
        }

        return within > steps / 2;
    }

    /// <summary>Since the first reading.</summary>
    private static double[] Seconds(ReadOnlySpan<long> times)
    {
        var seconds = new double[times.Length];
        for (var at = 0; at < times.Length; at++)
        {
            seconds[at] = unchecked((ulong)(times[at] - times[0])) / 1000.0;
        }

        return seconds;
    }

    /// <summary>Metres per second squared, rounded so that 2.5 held as 2.4999999 counts; null where too few readings are near.</summary>
    private static double? Slope(ReadOnlySpan<long> times, ReadOnlySpan<double> seconds, ReadOnlySpan<double> speeds, int at)
    {
        var (first, end) = (FirstNear(times, at), at + 1);
        while (end < times.Length && AreNear(times[at], times[end]))
        {
            end++;
        }

        return end - first >= 3 && LeastSquares.SlopeOf(seconds[first..end], speeds[first..end]) is { } slope ? Math.Round(slope, 6) : null;
    }

    private static int FirstNear(ReadOnlySpan<long> times, int at)
    {
        var first = at;
        while (first > 0 && AreNear(times[first - 1], times[at]))
        {
            first--;
        }

        return first;
    }

    /// <summary>Unsigned, so that times from both ends of the range do not overflow.</summary>
    private static bool AreNear(long earlier, long later) => unchecked((ulong)(later - earlier)) <= ReachMilliseconds;

    private sealed class Tally(int heldWanted)
    {
        private int held;
        private bool counted;

        public int Count { get; private set; }

        public void Add(double? slope, int milliseconds)
        {
            if (slope is not > 0)
            {
                counted = false;
            }

            var apart = milliseconds > ReachMilliseconds;
            held = slope >= HighMetresPerSecondSquared ? held + (apart ? 0 : milliseconds) : 0;
            if (held >= heldWanted && !counted)
            {
                (Count, counted) = (Count + 1, true);
            }

            if (apart)
            {
                (held, counted) = (0, false);
            }
        }
    }
}
