using LoadWatch.Activities;

namespace LoadWatch.Stimulus;

/// <summary>For how long each reading of a channel counts where a better channel was not: overlapping channels are never added.</summary>
public static class UncoveredTime
{
    /// <summary>The time that the better one leaves, reading by reading.</summary>
    /// <param name="left">Room for one per reading, ms.</param>
    /// <returns>The sum, ms.</returns>
    public static long Of(UsableChannel channel, UsableChannel better, Span<int> left)
    {
        if (channel.UnixMilliseconds.SequenceEqual(better.UnixMilliseconds) && channel.Milliseconds.SequenceEqual(better.Milliseconds))
        {
            left.Clear();
            return 0;
        }

        var times = channel.UnixMilliseconds;
        var milliseconds = channel.Milliseconds;
        var (total, first) = (0L, 0);
        for (var at = 0; at < times.Length; at++)
        {
            left[at] = milliseconds[at] - Covered(times[at], times[at] + milliseconds[at], better, ref first);
            total += left[at];
        }

        return total;
    }

    /// <param name="first">The first reading that may reach behind the start; moved on.</param>
    private static int Covered(long start, long end, UsableChannel better, ref int first)
    {
        var times = better.UnixMilliseconds;
        var milliseconds = better.Milliseconds;
        while (first < times.Length && times[first] + milliseconds[first] <= start)
        {
            first++;
        }

        var covered = 0;
        for (var at = first; at < times.Length && times[at] < end; at++)
        {
            covered += (int)Math.Max(0, Math.Min(end, times[at] + milliseconds[at]) - Math.Max(start, times[at]));
        }

        return Math.Min(covered, (int)(end - start));
    }
}
