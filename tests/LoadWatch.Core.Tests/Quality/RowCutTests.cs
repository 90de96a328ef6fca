using LoadWatch.Activities;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class RowCutTests
{
    /// <summary>By hand: the last row before stands for 10 s; 80 of 110 s are without rows.</summary>
    [Fact]
    public void TimeWithoutRowsIsAGap()
    {
        var cut = Assert.Single(Judging.Cuts(Of([.. Range(0, 10), .. Range(100, 110)])));

        Assert.Equal((null, CutReason.Gap, 20.0, 100.0, 0, 80_000L), (cut.Channel, cut.Reason, cut.From(), cut.To(), cut.Readings, cut.Milliseconds));
        Assert.Equal(80 / 110.0, cut.Share, 1e-9);
    }

    [Fact]
    public void RowsTakenWhileTheTimerStoodDoNotCount()
    {
        var usable = new UsableRecording(Of(Range(0, 100)) with { Pauses = [Judging.Pause(40, 60)] }, 0.5);

        var cut = Assert.Single(usable.Cuts);
        Assert.Equal((null, CutReason.TimerStopped, 40.0, 60.0, 20, 0.2), (cut.Channel, cut.Reason, cut.From(), cut.To(), cut.Readings, cut.Share));
        Assert.Equal((1.0, 80.0, 81), (usable.Channels[Channel.Power].Share, usable.Channels[Channel.Power].Seconds(), usable.Channels[Channel.Power].Count));
    }

    [Fact]
    public void AReadingStandsUntilTheTimerStops()
    {
        var usable = new UsableRecording(Of([.. Range(0, 40), .. Range(60, 100)]) with { Pauses = [Judging.Pause(40.5, 60)] }, 0.5);

        Assert.Equal((CutReason.TimerStopped, 40.5, 60.0, 0), Assert.Single(usable.Cuts) is var cut ? (cut.Reason, cut.From(), cut.To(), cut.Readings) : default);
        Assert.Equal(80.5, usable.Channels[Channel.Power].Seconds());
    }

    [Fact]
    public void ATimerThatWasNeverStartedAgainEndsTheSession() =>
        Assert.Equal(30.0, new UsableRecording(Of(Range(0, 100)) with { Pauses = [Judging.Pause(30, null)] }, 0.5).Channels[Channel.Power].Seconds());

    [Fact]
    public void ATimerThatNeverRanWasNeverUsed()
    {
        var usable = new UsableRecording(Of(Range(0, 100)) with { Pauses = [Judging.Pause(-5, null)] }, 0.5);

        Assert.Equal(100.0, usable.Channels[Channel.Power].Seconds());
        Assert.Empty(usable.Cuts);
    }

    [Fact]
    public void RowsWithoutATimeOutOfOrderAndOfOneTimeAreCounted()
    {
        var cuts = Judging.Cuts(Of([0, 1, null, 2, 5, 3, 4, 4, 6, null]));

        Assert.Equal(
            [(CutReason.Undated, null, 2, 0.2), (CutReason.OutOfOrder, 3.0, 1, 0.1), (CutReason.SameTime, (double?)4.0, 1, 0.1)],
            cuts.Select(cut => (cut.Reason, cut.From(), cut.Readings, cut.Share)));
    }

    private static int?[] Range(int from, int to) => [.. Enumerable.Range(from, to - from + 1).Select(second => (int?)second)];

    private static Recording Of(params int?[] seconds) => Given.Recording("cycling", new SampleSeries(
        [.. seconds.Select(second => second is { } known ? Given.StartMilliseconds + (known * 1000L) : SampleSeries.Undated)],
        new Dictionary<Channel, double[]> { [Channel.Power] = [.. seconds.Select(_ => 200.0)] }));
}
