namespace LoadWatch.Decoding.Csv;

/// <summary>Cuts the rows of one person at long gaps: a file of several people may hold the sessions of a whole day or camp.</summary>
internal static class SessionGaps
{
    /// <summary>A choice: longer than a half-time or a wait on the bench, shorter than the time between two sessions.</summary>
    public const long LongestMilliseconds = 60 * 60_000;

    /// <summary>The rows of each session, by time; within one they keep the order of the file. Every row is in exactly one. Null for a single session.</summary>
    /// <param name="times">Of the rows, milliseconds.</param>
    /// <param name="most">Of more sessions no more than one beyond it are told apart.</param>
    public static IReadOnlyList<int[]>? Sessions(long[] times, int most)
    {
        if (IsOne(times))
        {
            return null;
        }

        var order = ByTime(times);
        var starts = Starts(times, order, most);
        return starts.Count == 1 ? null : [.. starts.Select((start, i) => OfFile(order[start..(i + 1 < starts.Count ? starts[i + 1] : order.Length)]))];
    }

    /// <summary>The usual case: in order and without a gap.</summary>
    private static bool IsOne(ReadOnlySpan<long> times)
    {
        for (var row = 1; row < times.Length; row++)
        {
            if (times[row] - times[row - 1] is < 0 or > LongestMilliseconds)
            {
                return false;
            }
        }

        return true;
    }

    private static int[] ByTime(long[] times)
    {
        int[] order = [.. Enumerable.Range(0, times.Length)];
        Array.Sort((long[])times.Clone(), order);
        return order;
    }

    private static List<int> Starts(long[] times, int[] order, int most)
    {
        List<int> starts = [0];
        for (var place = 1; place < order.Length && starts.Count <= most; place++)
        {
            if (times[order[place]] - times[order[place - 1]] > LongestMilliseconds)
            {
                starts.Add(place);
            }
        }

        return starts;
    }

    private static int[] OfFile(int[] session)
    {
        Array.Sort(session);
        return session;
    }
}
