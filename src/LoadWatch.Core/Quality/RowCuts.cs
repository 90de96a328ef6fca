using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>What concerns whole rows: time without any, rows while the timer stood, rows without a time, out of order, or of a time that another has.</summary>
internal static class RowCuts
{
    /// <summary>Those of a recording's own samples.</summary>
    public static IReadOnlyList<Cut> Of(SampleSeries samples, SampleTimeline timeline) => [.. OfTime(null, timeline), .. OfRows(samples.UnixMilliseconds, timeline)];

    /// <summary>Time without rows. Together with the sampled time it is the time from the first row to the last.</summary>
    /// <param name="channel">Where the time line is of one channel alone.</param>
    public static IReadOnlyList<Cut> OfTime(Channel? channel, SampleTimeline timeline)
    {
        var times = timeline.Times;
        if (times.Length == 0 || Moments.Between(times[0], times[^1]) is var whole && whole == timeline.TotalMilliseconds)
        {
            return [];
        }

        var runs = new CutRuns(channel);
        var stopped = 0;
        for (var row = 0; row < times.Length - 1; row++)
        {
            var from = times[row] + timeline.Milliseconds[row];
            if (from == times[row + 1])
            {
                continue;
            }

            while (stopped < timeline.Stopped.Count && timeline.Stopped[stopped].End <= from)
            {
                stopped++;
            }

            var isStopped = stopped < timeline.Stopped.Count && timeline.Stopped[stopped].Start < times[row + 1];
            runs.Add(isStopped ? CutReason.TimerStopped : CutReason.Gap, from, times[row + 1], 0, Moments.Between(from, times[row + 1]));
        }

        return WithRows(runs.Of(whole), timeline);
    }

    private static IReadOnlyList<Cut> WithRows(IReadOnlyList<Cut> cuts, SampleTimeline timeline) => timeline.StoppedRows.Count == 0
        ? cuts
        : [.. cuts.Select(cut => cut.Reason == CutReason.TimerStopped ? cut with { Readings = timeline.StoppedRows.Sum(rows => RowsWithin(cut.Stretch, rows, timeline)) } : cut)];

    private static int RowsWithin(Stretch stretch, (int From, int To) rows, SampleTimeline timeline) =>
        timeline.Times[rows.From] >= stretch.From && timeline.Times[rows.From] <= stretch.To ? rows.To - rows.From : 0;

    private static IEnumerable<Cut> OfRows(ReadOnlySpan<long> inFile, SampleTimeline timeline)
    {
        var undated = inFile.Length - timeline.Times.Length;
        var cuts = new List<Cut>();
        if (undated > 0)
        {
            cuts.Add(new Cut(null, CutReason.Undated, Stretch.Always, undated, 0, Significant.Round((double)undated / inFile.Length)));
        }

        if (!timeline.IsAsInFile)
        {
            AddSteps(cuts, CutReason.OutOfOrder, inFile, inFile.Length, (before, time) => time < before);
        }

        if (timeline.HasSameTimes)
        {
            AddSteps(cuts, CutReason.SameTime, timeline.Times, inFile.Length, (before, time) => time == before);
        }

        return cuts;
    }

    private static void AddSteps(List<Cut> cuts, CutReason reason, ReadOnlySpan<long> times, int all, Func<long, long, bool> isOne)
    {
        var (before, count, first, last) = (SampleSeries.Undated, 0, long.MaxValue, long.MinValue);
        foreach (var time in times)
        {
            if (time == SampleSeries.Undated)
            {
                continue;
            }

            if (before != SampleSeries.Undated && isOne(before, time))
            {
                (count, first, last) = (count + 1, Math.Min(first, time), Math.Max(last, time));
            }

            before = time;
        }

        if (count > 0)
        {
            cuts.Add(new Cut(null, reason, new Stretch(first, Moments.End(last, 0)), count, 0, Significant.Round((double)count / all)));
        }
    }
}
