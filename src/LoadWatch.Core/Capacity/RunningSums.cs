using System.Buffers;
using System.Numerics;
using LoadWatch.Activities;

namespace LoadWatch.Capacity;

/// <summary>The sums of a channel's values over time, at even steps from the beginning of each unbroken stretch on.</summary>
internal static class RunningSums
{
    /// <summary>A stretch is cut after so long, so that memory stays bounded whatever a file claims.</summary>
    private const long LongestMilliseconds = 24 * 3600 * 1000L;

    /// <summary>Raises each best mean to the highest of any window of its duration that begins at a step of a stretch.</summary>
    /// <param name="step">Milliseconds; a whole part of a second.</param>
    /// <param name="seconds">Durations, rising.</param>
    public static void Search(UsableChannel channel, int step, ReadOnlySpan<int> seconds, Span<double> best)
    {
        if (seconds.IsEmpty)
        {
            return;
        }

        var times = channel.UnixMilliseconds;
        var milliseconds = channel.Milliseconds;
        for (var first = 0; first < times.Length;)
        {
            var (end, held) = (first, 0L);
            do
            {
                held += milliseconds[end];
                end++;
            }
            while (end < times.Length && held < LongestMilliseconds && unchecked(times[end - 1] + milliseconds[end - 1]) == times[end]);

            if (held >= seconds[0] * 1000L)
            {
                Search(channel.Values[first..end], milliseconds[first..end], step, (int)(held / step), seconds, best);
            }

            first = end;
        }
    }

    private static void Search(ReadOnlySpan<double> values, ReadOnlySpan<int> milliseconds, int step, int steps, ReadOnlySpan<int> seconds, Span<double> best)
    {
        var rented = ArrayPool<double>.Shared.Rent(steps + 1);
        try
        {
            var sums = rented.AsSpan(0, steps + 1);
            Fill(sums, values, milliseconds, step);
            for (var at = 0; at < seconds.Length && seconds[at] * (1000 / step) <= steps; at++)
            {
                best[at] = Math.Max(best[at], Largest(sums, seconds[at] * (1000 / step)) / (seconds[at] * 1000.0));
            }
        }
        finally
        {
            ArrayPool<double>.Shared.Return(rented);
        }
    }

    /// <summary>Value times milliseconds up to each step.</summary>
    private static void Fill(Span<double> sums, ReadOnlySpan<double> values, ReadOnlySpan<int> milliseconds, int step)
    {
        var (sum, start, next) = (0.0, 0L, 0);
        for (var at = 0; at < values.Length; at++)
        {
            var end = start + milliseconds[at];
            for (var time = (long)next * step; time <= end && next < sums.Length; time += step)
            {
                sums[next] = sum + (values[at] * (time - start));
                next++;
            }

            sum += values[at] * milliseconds[at];
            start = end;
        }
    }

    /// <summary>The largest sum over any window of so many steps; there is one at least.</summary>
    private static double Largest(ReadOnlySpan<double> sums, int width)
    {
        var heads = sums[width..];
        var tails = sums[..^width];
        var (largest, at) = (double.NegativeInfinity, 0);
        if (heads.Length >= Vector<double>.Count)
        {
            var most = new Vector<double>(double.NegativeInfinity);
            for (; at <= heads.Length - Vector<double>.Count; at += Vector<double>.Count)
            {
                most = Vector.MaxNative(most, new Vector<double>(heads[at..]) - new Vector<double>(tails[at..]));
            }

            for (var lane = 0; lane < Vector<double>.Count; lane++)
            {
                largest = Math.Max(largest, most[lane]);
            }
        }

        for (; at < heads.Length; at++)
        {
            largest = Math.Max(largest, heads[at] - tails[at]);
        }

        return largest;
    }
}
