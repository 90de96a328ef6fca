using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>
/// A recording with a verdict on each reading of each channel, by nothing but itself: no anchor and no age, so that how recordings merge does not depend on
/// them. Channels are judged when they are asked for; heart rate is held against power, speed and cadence. Readings that several recordings gave were judged in
/// those, so nothing is asked of them again but whether they can be true.
/// </summary>
internal sealed class JudgedRecording(Recording recording, QualityLimits limits)
{
    private static readonly int Channels = Enum.GetValues<Channel>().Length;

    private readonly JudgedChannel?[] judged = new JudgedChannel?[Channels];
    private SampleTimeline? timeline;

    /// <summary>That of the recording's own samples.</summary>
    public SampleTimeline Timeline => timeline ??= SampleTimeline.Of(recording.Samples.Times, recording.Pauses);

    public JudgedChannel this[Channel channel] => judged[(int)channel] ??= Judge(channel);

    /// <summary>Everything that concerns whole rows or time without any.</summary>
    public IEnumerable<Cut> RowCuts =>
    [
        .. Quality.RowCuts.Of(recording.Samples, Timeline),
        .. recording.Gathered.Keys.Order().SelectMany(channel => Quality.RowCuts.OfTime(channel, this[channel].Timeline)),
    ];

    private JudgedChannel Judge(Channel channel)
    {
        if (recording.Gathered.TryGetValue(channel, out var gathered))
        {
            var own = SampleTimeline.Of(gathered.Times, recording.GatheredPauses.GetValueOrDefault(channel) ?? []);
            return Judge(channel, own, own.Ordered(gathered.Column(channel) ?? []), isGathered: true);
        }

        if (channel == Channel.HeartRate && recording.LateHeartRates.Count > 0)
        {
            var (times, rates) = LateBeatRows.With(recording.Samples, recording.LateHeartRates);
            var withBeats = SampleTimeline.Of(times, recording.Pauses);
            return Judge(channel, withBeats, withBeats.Ordered(rates), isGathered: false);
        }

        return recording.Samples.Column(channel) is { } column
            ? Judge(channel, Timeline, Timeline.Ordered(column), isGathered: false)
            : Judge(channel, SampleTimeline.Of([], []), [], isGathered: true);
    }

    private JudgedChannel Judge(Channel channel, SampleTimeline line, double[] values, bool isGathered)
    {
        var marks = new ReadingMarks(values.Length);
        line.StoppedRows.ForEach(rows => marks.Cut(rows.From, rows.To - 1, CutReason.TimerStopped));
        OutOfRange.Cut(values, ChannelLimits.Of(channel, recording.Sport), marks);
        if (!isGathered)
        {
            CutChanges(channel, line.Times, values, marks);
        }

        return new JudgedChannel(channel, line, values, marks);
    }

    private void CutChanges(Channel channel, long[] times, double[] values, ReadingMarks marks)
    {
        if (JumpLimits.Of(channel, limits) is { } jumps)
        {
            Jumps.Cut(times, values, jumps, marks);
        }

        if (channel == Channel.Power)
        {
            PowerSpikes.Cut(times, values, marks);
        }
        else if (channel == Channel.HeartRate)
        {
            CutAgainstLoad(times, values, marks);
        }
    }

    private void CutAgainstLoad(long[] times, double[] bpm, ReadingMarks marks)
    {
        var load = new LoadChange(Usable(Channel.Power), Usable(Channel.Speed));
        FlatLine.Cut(times, bpm, limits.HeartRateFlatSeconds, load, marks);
        if (load.IsKnown && Usable(Channel.Cadence) is { } cadence)
        {
            CadenceLock.Cut(times, bpm, cadence, 1, limits.HeartRateOnCadenceSeconds, load, marks);
            if (recording.Sport.IsOnFoot)
            {
                CadenceLock.Cut(times, bpm, cadence, 2, limits.HeartRateOnCadenceSeconds, load, marks);
            }
        }
    }

    private UsableChannel? Usable(Channel channel) => recording.Samples.Column(channel) is null ? null : this[channel].Usable;
}
