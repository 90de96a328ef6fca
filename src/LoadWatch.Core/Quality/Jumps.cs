// Spikes of a channel that cannot change at once: heart rate, speed and the position behind it, height.
// A change faster than the limits is a jump; jumps part the readings into levels. A level between two jumps that is shorter than a spike can be is cut, and so is
// one at either end beside a level that is longer than that. What is longer stays: which of two long levels is the true one nobody can tell.
namespace LoadWatch.Quality;

/// <summary>Cuts what was jumped to and from again.</summary>
internal static class Jumps
{
    public static void Cut(ReadOnlySpan<long> times, ReadOnlySpan<double> values, JumpLimits limits, ReadingMarks marks)
    {
        if (Levels(times, values, limits, marks.ByRow) is not { } levels)
        {
            return;
        }

        for (var at = 0; at < levels.Count; at++)
        {
            if (IsSpike(times, levels, at, limits.LongestMilliseconds))
            {
                marks.Cut(levels[at].First, levels[at].Last, CutReason.Spike);
            }
        }
    }

    private static bool IsSpike(ReadOnlySpan<long> times, List<(int First, int Last)> levels, int at, int longest)
    {
        if (!IsShort(times, levels[at], longest))
        {
            return false;
        }

        var isInside = at > 0 && at < levels.Count - 1;
        return isInside || !IsShort(times, levels[at == 0 ? 1 : at - 1], longest);
    }

    private static bool IsShort(ReadOnlySpan<long> times, (int First, int Last) level, int longest) => Moments.Between(times[level.First], times[level.Last]) < longest;

    /// <summary>First and last usable row of each level; null where there is no jump.</summary>
    private static List<(int First, int Last)>? Levels(ReadOnlySpan<long> times, ReadOnlySpan<double> values, JumpLimits limits, ReadOnlySpan<byte> marks)
    {
        List<(int First, int Last)>? levels = null;
        var (first, before, window) = (-1, -1, -1);
        for (var row = 0; row < times.Length && row < values.Length; row++)
        {
            if (!marks.IsEmpty && marks[row] != 0)
            {
                continue;
            }

            if (before < 0)
            {
                (first, window) = (row, row);
            }
            else if (IsJump(times, values, limits, before, row) || IsFar(times, values, limits, marks, ref window, row))
            {
                (levels ??= []).Add((first, before));
                (first, window) = (row, row);
            }

            before = row;
        }

        levels?.Add((first, before));
        return levels;
    }

    private static bool IsJump(ReadOnlySpan<long> times, ReadOnlySpan<double> values, JumpLimits limits, int before, int row)
    {
        var change = Math.Abs(values[row] - values[before]);
        return change > limits.Least
            && Moments.Between(times[before], times[row]) is var apart
            && apart <= limits.MostMilliseconds
            && change > limits.PerSecond * Math.Max(apart, limits.LeastMilliseconds) / 1000;
    }

    /// <summary>Whether a reading lies too far from one of the same level within the window before it, whose first usable row moves along.</summary>
    private static bool IsFar(ReadOnlySpan<long> times, ReadOnlySpan<double> values, JumpLimits limits, ReadOnlySpan<byte> marks, ref int window, int row)
    {
        if (double.IsInfinity(limits.Within))
        {
            return false;
        }

        while (Moments.Between(times[window], times[row]) > JumpLimits.WindowMilliseconds || (!marks.IsEmpty && marks[window] != 0))
        {
            window++;
        }

        return Math.Abs(values[row] - values[window]) > limits.Within;
    }
}
