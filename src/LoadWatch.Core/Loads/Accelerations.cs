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
        UsableSample[] samples = [.. speed.Samples.Where(sample => sample.Milliseconds > 0)];
        if (MedianStep(samples) is not { } step || step > SlowestStepMilliseconds)
        {
            return null;
        }

        var heldWanted = step <= FastStepMilliseconds ? 500 : 1000;
        var (rises, falls) = (new Tally(heldWanted), new Tally(heldWanted));
        for (var at = 0; at < samples.Length; at++)
        {
            var slope = Slope(samples, at);
            rises.Add(slope, samples[at].Milliseconds);
            falls.Add(-slope, samples[at].Milliseconds);
        }

        return (rises.Count, falls.Count);
    }

    private static int? MedianStep(UsableSample[] samples)
    {
        int[] steps = [.. samples.Select(sample => sample.Milliseconds).Order()];
        return steps.Length == 0 ? null : steps[steps.Length / 2];
    }

    /// <summary>Metres per second squared, rounded so that 2.5 held as 2.4999999 counts; null where too few readings are near.</summary>
    private static double? Slope(UsableSample[] samples, int at)
    {
        var (count, t, v, tt, tv) = (0, 0.0, 0.0, 0.0, 0.0);
        for (var near = FirstNear(samples, at); near < samples.Length && IsNear(samples, at, near); near++)
        {
            var seconds = (samples[near].UnixMilliseconds - samples[at].UnixMilliseconds) / 1000.0;
            var speed = samples[near].Value;
            (count, t, v, tt, tv) = (count + 1, t + seconds, v + speed, tt + (seconds * seconds), tv + (seconds * speed));
        }

        var spread = (count * tt) - (t * t);
        return count >= 3 && spread > 0 ? Math.Round(((count * tv) - (t * v)) / spread, 6) : null;
    }

    private static int FirstNear(UsableSample[] samples, int at)
    {
        var first = at;
        while (first > 0 && IsNear(samples, at, first - 1))
        {
            first--;
        }

        return first;
    }

    /// <summary>Unsigned, so that times from both ends of the range do not overflow.</summary>
    private static bool IsNear(UsableSample[] samples, int at, int other)
    {
        var (earlier, later) = at < other ? (at, other) : (other, at);
        return unchecked((ulong)(samples[later].UnixMilliseconds - samples[earlier].UnixMilliseconds)) <= ReachMilliseconds;
    }

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
