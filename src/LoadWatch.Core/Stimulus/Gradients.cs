using System.Buffers;
using System.Diagnostics.CodeAnalysis;
using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>
/// Gradient of the way at each reading of speed: mean height of the 50 m ahead less that of the 50 m behind, over the way between their middles. The way is
/// the sum of speed times time. A choice: it smooths the noise of a barometer and loses hills shorter than that. 0 where heights are missing or the way is
/// too short; no window reaches across readings more than 10 s apart.
/// </summary>
public static class Gradients
{
    /// <summary>Metres to either side.</summary>
    public const double ReachMetres = 50;

    internal const string Treadmill = "treadmill";

    private const double LeastMetres = 10;

    /// <summary>Heights within this are level ground: a pitch, a track, noise. A choice.</summary>
    private const double LevelMetres = 10;

    /// <summary>Whether there are heights that tell of slopes: not on a treadmill, whose slope nobody records, and not where they differ by less than 10 m.</summary>
    public static bool AreKnown([NotNullWhen(true)] UsableChannel? altitude, Sport sport) =>
        altitude is not null && sport.Detail != Treadmill && altitude.Extremes() is var (lowest, highest) && highest - lowest >= LevelMetres;

    /// <param name="gradients">Room for one per reading of speed.</param>
    public static void Along(UsableChannel speed, UsableChannel altitude, Span<double> gradients)
    {
        var way = ArrayPool<double>.Shared.Rent(speed.Count);
        var heights = ArrayPool<double>.Shared.Rent(speed.Count);
        try
        {
            Measure(speed, way);
            Align(speed.UnixMilliseconds, altitude, heights);
            Along(way.AsSpan(0, speed.Count), heights, gradients);
        }
        finally
        {
            ArrayPool<double>.Shared.Return(way);
            ArrayPool<double>.Shared.Return(heights);
        }
    }

    /// <summary>Metres since the first reading; a break is longer than any window.</summary>
    private static void Measure(UsableChannel speed, Span<double> way)
    {
        var times = speed.UnixMilliseconds;
        var values = speed.Values;
        var milliseconds = speed.Milliseconds;
        var metres = 0.0;
        for (var at = 0; at < values.Length; at++)
        {
            var isBreak = at > 0 && times[at] - times[at - 1] > UsableSamples.LongestMilliseconds;
            metres += isBreak ? 4 * ReachMetres : 0;
            way[at] = metres;
            metres += values[at] * UsableSamples.Seconds(milliseconds[at]);
        }
    }

    /// <summary>The last height up to each moment, NaN where it is more than 10 s old.</summary>
    private static void Align(ReadOnlySpan<long> times, UsableChannel altitude, Span<double> heights)
    {
        var known = altitude.UnixMilliseconds;
        var values = altitude.Values;
        var next = 0;
        for (var at = 0; at < times.Length; at++)
        {
            while (next < known.Length && known[next] <= times[at])
            {
                next++;
            }

            heights[at] = next > 0 && times[at] - known[next - 1] <= UsableSamples.LongestMilliseconds ? values[next - 1] : double.NaN;
        }
    }

    private static void Along(ReadOnlySpan<double> way, ReadOnlySpan<double> heights, Span<double> gradients)
    {
        var (behind, ahead) = (default(Side), default(Side));
        var (first, last) = (0, 0);
        for (var at = 0; at < way.Length; at++)
        {
            behind.Add(way[at], heights[at], 1);
            for (; way[first] < way[at] - ReachMetres; first++)
            {
                behind.Add(way[first], heights[first], -1);
            }

            for (; last < way.Length && way[last] <= way[at] + ReachMetres; last++)
            {
                ahead.Add(way[last], heights[last], 1);
            }

            gradients[at] = Between(behind, ahead);
            ahead.Add(way[at], heights[at], -1);
        }
    }

    private static double Between(in Side behind, in Side ahead)
    {
        var metres = ahead.Way - behind.Way;
        return metres >= LeastMetres ? (ahead.Height - behind.Height) / metres : 0;
    }

    /// <summary>The readings to one side.</summary>
    private struct Side
    {
        private int count;
        private double way;
        private double height;

        /// <summary>Mean, metres; NaN of none.</summary>
        public readonly double Way => way / count;

        public readonly double Height => height / count;

        /// <param name="sign">1 to take the reading in, -1 to take it out.</param>
        public void Add(double metres, double heightMetres, int sign)
        {
            if (!double.IsNaN(heightMetres))
            {
                count += sign;

                // Of none there is nothing left, not the rounding of what came and went.
                way = count == 0 ? 0 : way + (sign * metres);
                height = count == 0 ? 0 : height + (sign * heightMetres);
            }
        }
    }
}
