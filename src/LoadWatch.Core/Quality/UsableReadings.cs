using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>
/// What is left of a channel. A reading, usable or cut, stands until the next one of either kind, at most 10 s and not while the timer stood, the last
/// as long as its row: so a usable one bridges rows that have none, but never one that was cut, and usable, cut and missing time add up to the sampled time.
/// </summary>
internal static class UsableReadings
{
    public static UsableChannel Of(Channel channel, SampleTimeline timeline, double[] values, ReadingMarks marks) => marks.Any
        ? Kept(channel, timeline, values, marks)
        : new UsableChannel(channel, timeline.Times, values, timeline.Milliseconds, values.Length, Share(timeline.TotalMilliseconds, timeline, values.Length));

    private static UsableChannel Kept(Channel channel, SampleTimeline timeline, double[] values, ReadingMarks marks)
    {
        var byRow = marks.ByRow;
        var count = byRow.Count((byte)0);
        var kept = new Columns(timeline, values, byRow, new long[count], new double[count], new int[count], new CutRuns(channel));
        for (var row = 0; row < values.Length; row++)
        {
            kept.Add(row);
        }

        return kept.ToChannel(channel);
    }

    private static double Share(long usable, SampleTimeline timeline, int count)
    {
        if (timeline.TotalMilliseconds == 0)
        {
            return count > 0 ? 1 : 0;
        }

        return Math.Min(1, (double)usable / timeline.TotalMilliseconds);
    }

    /// <summary>Takes rows one after the other. The reading taken last is settled by the next.</summary>
    private ref struct Columns(
        SampleTimeline timeline, double[] values, ReadOnlySpan<byte> marks, long[] times, double[] readings, int[] milliseconds, CutRuns cuts)
    {
        private const byte NoReading = (byte)CutReason.NoReading + 1;
        private const byte TimerStopped = (byte)CutReason.TimerStopped + 1;

        private readonly ReadOnlySpan<byte> marks = marks;
        private int last = -1;
        private int kept;
        private int stop;
        private long sampled;
        private long usable;

        public void Add(int row)
        {
            if (marks[row] is not (NoReading or TimerStopped))
            {
                Settle(timeline.Times[row], last < 0 ? 0 : Stands(timeline.Times[last], timeline.Times[row]));
                last = row;
                if (marks[row] == 0)
                {
                    (times[kept], readings[kept]) = (timeline.Times[row], values[row]);
                    kept++;
                }
            }

            sampled += timeline.Milliseconds[row];
        }

        public UsableChannel ToChannel(Channel channel)
        {
            if (timeline.Times.Length > 0)
            {
                Settle(timeline.Times[^1], last < 0 ? 0 : timeline.Milliseconds[last]);
            }

            return new UsableChannel(channel, times, readings, milliseconds, kept, Share(usable, timeline, kept)) { Cuts = cuts.Of(timeline.TotalMilliseconds) };
        }

        /// <summary>The reading before stands for some time; what was sampled since and is left is without a reading.</summary>
        private void Settle(long until, int stands)
        {
            var from = last < 0 ? timeline.Times[0] : timeline.Times[last] + stands;
            if (sampled > stands)
            {
                cuts.Add(CutReason.NoReading, from, Math.Max(from, until), 0, sampled - stands);
            }

            sampled = 0;
            if (last < 0)
            {
                return;
            }

            if (marks[last] == 0)
            {
                milliseconds[kept - 1] = stands;
                usable += stands;
            }
            else
            {
                cuts.Add((CutReason)(marks[last] - 1), timeline.Times[last], Moments.End(timeline.Times[last], stands), 1, stands);
            }
        }

        private int Stands(long time, long next)
        {
            var stopped = timeline.Stopped;
            while (stop < stopped.Count && stopped[stop].Start <= time)
            {
                stop++;
            }

            return SampleTimeline.Apart(time, stop < stopped.Count ? Math.Min(next, stopped[stop].Start) : next);
        }
    }
}
