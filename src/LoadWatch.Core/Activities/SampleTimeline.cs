using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

/// <summary>
/// The dated rows of a recording in time order, rows of one time in the order of the file: the same for each of its channels. Mostly the file
/// is in time order and dated throughout; then nothing is copied. A row stands until the next, at most 10 s, and not while the timer stood.
/// </summary>
internal sealed class SampleTimeline
{
    private readonly int[]? rows;

    private SampleTimeline(long[] times, int[]? rows, StoppedTimes stopped)
    {
        this.rows = rows;
        Times = times;
        Milliseconds = new int[times.Length];
        Stand();
        TakeOut(stopped);
    }

    /// <summary>When each row was taken.</summary>
    public long[] Times { get; }

    /// <summary>How long each row stands.</summary>
    public int[] Milliseconds { get; }

    public long TotalMilliseconds { get; private set; }

    /// <summary>Whether the rows stand in the file as they do here.</summary>
    public bool IsAsInFile => rows is null;

    /// <summary>Whether several rows have one time.</summary>
    public bool HasSameTimes { get; private set; }

    /// <summary>When the timer stood. None where that leaves no row at all: such a timer was never used.</summary>
    public StoppedTimes Stopped { get; private set; } = StoppedTimes.None;

    /// <summary>Rows taken while the timer stood: the first, and the one behind the last.</summary>
    public List<(int From, int To)> StoppedRows { get; } = [];

    /// <param name="times">Of every row, some perhaps <see cref="SampleSeries.Undated"/>.</param>
    public static SampleTimeline Of(long[] times, IReadOnlyList<Pause> pauses)
    {
        var stopped = StoppedTimes.Of(pauses);
        if (IsInOrder(times))
        {
            return new SampleTimeline(times, rows: null, stopped);
        }

        int[] inOrder = [.. Enumerable.Range(0, times.Length).Where(row => times[row] != SampleSeries.Undated).OrderBy(row => times[row])];
        return new SampleTimeline(Array.ConvertAll(inOrder, row => times[row]), inOrder, stopped);
    }

    /// <summary>The values of every row in the order of this line.</summary>
    public double[] Ordered(double[] values) => rows is null ? values : Array.ConvertAll(rows, row => values[row]);

    /// <summary>Unsigned, so that times from both ends of the range do not overflow: the later row comes second.</summary>
    public static int Apart(long time, long next) => (int)Math.Min(UsableSamples.LongestMilliseconds, unchecked((ulong)(next - time)));

    private void Stand()
    {
        for (var row = 0; row < Times.Length - 1 && row < Milliseconds.Length; row++)
        {
            var apart = Apart(Times[row], Times[row + 1]);
            Milliseconds[row] = apart;
            TotalMilliseconds += apart;
            HasSameTimes |= apart == 0;
        }
    }

    private void TakeOut(StoppedTimes stopped)
    {
        var left = Times.Length;
        for (var at = 0; at < stopped.Count; at++)
        {
            var (from, to) = (FirstFrom(stopped[at].Start), FirstFrom(stopped[at].End));
            left -= to - from;
            if (to > from)
            {
                StoppedRows.Add((from, to));
            }
        }

        if (stopped.Count == 0 || left == 0)
        {
            StoppedRows.Clear();
            return;
        }

        Stopped = stopped;
        for (var at = 0; at < stopped.Count; at++)
        {
            EndBefore(FirstFrom(stopped[at].Start), stopped[at].Start);
        }

        StoppedRows.ForEach(stretch => Milliseconds.AsSpan(stretch.From, stretch.To - stretch.From).Clear());
        TotalMilliseconds = 0;
        foreach (var milliseconds in Milliseconds)
        {
            TotalMilliseconds += milliseconds;
        }
    }

    /// <summary>The row before one stands until a moment at most.</summary>
    private void EndBefore(int row, long moment)
    {
        if (row > 0)
        {
            Milliseconds[row - 1] = Math.Min(Milliseconds[row - 1], Apart(Times[row - 1], moment));
        }
    }

    private int FirstFrom(long time) => Sorted.FirstFrom<long, long>(Times, time, one => one);

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
