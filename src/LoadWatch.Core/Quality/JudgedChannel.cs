using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>One channel of a recording with a verdict on each reading, rows in time order.</summary>
internal sealed class JudgedChannel(Channel channel, SampleTimeline timeline, double[] values, ReadingMarks marks)
{
    private readonly Lazy<UsableChannel> usable = new(() => UsableReadings.Of(channel, timeline, values, marks));

    public UsableChannel Usable => usable.Value;

    public SampleTimeline Timeline => timeline;

    /// <summary>
    /// The rows within a stretch. A reading that was cut is the mark of its reason; one taken while the timer stood is as it was, since the timer goes along on
    /// its own.
    /// </summary>
    public IEnumerable<(long UnixMilliseconds, double Value)> Rows(Stretch within)
    {
        for (var row = 0; row < values.Length; row++)
        {
            if (within.Holds(timeline.Times[row]))
            {
                yield return (timeline.Times[row], Told(row));
            }
        }
    }

    /// <summary>The same with heart rates above a limit cut too.</summary>
    public JudgedChannel UpTo(double bpm)
    {
        var more = marks.Copy();
        AboveMaximum.Cut(values, bpm, more);
        return new JudgedChannel(channel, timeline, values, more);
    }

    private double Told(int row) => marks[row] switch
    {
        null or CutReason.TimerStopped => values[row],
        CutReason.NoReading => double.NaN,
        { } reason => CutMark.Of(reason),
    };
}
