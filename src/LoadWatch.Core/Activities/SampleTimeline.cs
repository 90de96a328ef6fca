using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// The dated rows of a recording in time order, rows of one time in the order of the file: the same for each of its channels. Mostly the file
/// is in time order and dated throughout; then nothing is copied.
/// </summary>
internal sealed class SampleTimeline
{
    private readonly int[]? rows;

    private SampleTimeline(long[] times, int[]? rows)
    {
        this.rows = rows;
        Times = times;
        Milliseconds = new int[times.Length];
        TotalMilliseconds = Durations(times, Milliseconds);
    }

    /// <summary>When each row was taken.</summary>
    public long[] Times { get; }

    /// <summary>How long each row stands.</summary>
    public int[] Milliseconds { get; }

    public long TotalMilliseconds { get; }

    /// <param name="times">Of every row, some perhaps <see cref="SampleSeries.Undated"/>.</param>
    public static SampleTimeline Of(long[] times)
    {
        if (IsInOrder(times))
        {
            return new SampleTimeline(times, rows: null);
        }

        int[] inOrder = [.. Enumerable.Range(0, times.Length).Where(row => times[row] != SampleSeries.Undated).OrderBy(row => times[row])];
        return new SampleTimeline(Array.ConvertAll(inOrder, row => times[row]), inOrder);
    }

    /// <summary>The values of every row in the order of this line.</summary>
    public double[] Ordered(double[] values) => rows is null ? values : Array.ConvertAll(rows, row => values[row]);

    /// <summary>
    /// Fills in how long each time stands: until the next, at most 10 s, the last for 0; the answer is their sum. Unsigned, so that times from both ends of
    /// the range do not overflow: the later row comes second.
    /// </summary>
    public static long Durations(ReadOnlySpan<long> times, Span<int> milliseconds)
    {
        var total = 0L;
        for (var row = 0; row < times.Length - 1 && row < milliseconds.Length; row++)
        {
            var apart = Math.Min(UsableSamples.LongestMilliseconds, unchecked((ulong)(times[row + 1] - times[row])));
            milliseconds[row] = (int)apart;
            total += (int)apart;
        }

        return total;
    }

    /// <summary>Undated is the smallest number there is, so it is in order nowhere but in front.</summary>
    private static bool IsInOrder(long[] times)
    {
        var before = SampleSeries.Undated + 1;
        foreach (var time in times)
        {
            if (time < before)
            {
                return false;
            }

            before = time;
        }

        return true;
    }
}
