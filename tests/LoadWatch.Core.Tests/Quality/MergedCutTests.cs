using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

/// <summary>A bike computer that died after half an hour, and a watch that went on: each is judged by itself, and of the watch only what it gives.</summary>
public class MergedCutTests
{
    private static readonly Worn Computer = Worn.Of("a", 0, 30, [Channel.HeartRate, Channel.Power, Channel.Speed]);

    [Fact]
    public void OnlyCutsWithinWhatARecordingGivesAreTold()
    {
        var merged = Merged(Watch(10, 50));

        var cut = Assert.Single(merged.Cuts);
        Assert.Equal((Channel.HeartRate, CutReason.OutOfRange, 50.0 * 60, 1), (cut.Channel, cut.Reason, cut.From(), cut.Readings));
        Assert.Equal(10 / 3600.0, cut.Share, 1e-4);
    }

    [Fact]
    public void TheTimerOfTheGiverIsTheOneThatCounts()
    {
        var watch = Watch();

        var merged = Merged(Worn.Of("b", watch.Recording with { Pauses = [Judging.Pause(600, 900), Judging.Pause(2400, 2700)] }));

        var cut = Assert.Single(merged.Cuts);
        Assert.Equal((Channel.HeartRate, CutReason.TimerStopped, 2400.0, 2700.0), (cut.Channel, cut.Reason, cut.From(), cut.To()));
        Assert.Equal(55 * 60, merged.Channels[Channel.HeartRate].Seconds(), 15.0);
    }

    private static UsableRecording Merged(Worn watch)
    {
        Worn[] worn = [Computer, watch];
        return Worn.Merged(Assert.Single(Worn.Plans(worn)), worn);
    }

    /// <param name="lost">Minutes at which it lost the contact for a reading.</param>
    private static Worn Watch(params int[] lost)
    {
        var samples = Worn.Every(0, 60, [Channel.HeartRate]);
        var bpm = samples[Channel.HeartRate].ToArray();
        lost.ToList().ForEach(minute => bpm[minute * 60 / Worn.Step] = 0);
        return Worn.Of("b", Given.Recording("cycling", new SampleSeries(samples.UnixMilliseconds.ToArray(), new Dictionary<Channel, double[]> { [Channel.HeartRate] = bpm })) with
        {
            ElapsedSeconds = 3600,
        });
    }
}
