using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Quality;

public class ChannelCutTests
{
    /// <summary>A strap without contact writes 0: nine of ten seconds of ten minutes, told as one stretch.</summary>
    [Fact]
    public void ABadContactIsToldOnceAndNotBridged()
    {
        var usable = Hearts([.. Enumerable.Range(0, 601).Select(second => second % 10 == 0 ? 150.0 : 0)]);

        var cut = Assert.Single(usable.Cuts);
        Assert.Equal((CutReason.OutOfRange, 1.0, 600.0, 540), (cut.Reason, cut.From(), cut.To(), cut.Readings));
        Assert.Equal((0.9, 0.1), (cut.Share, usable.Channels[Channel.HeartRate].Share));
        Assert.Null(usable[Channel.HeartRate]);
    }

    /// <summary>By hand: the last reading stands for 10 s of the minute without one.</summary>
    [Fact]
    public void ASensorThatWasLostForAWhileIsMissingThere()
    {
        var usable = Hearts([.. Enumerable.Range(0, 201).Select(second => second is >= 100 and < 160 ? double.NaN : 150.0)]);

        var cut = Assert.Single(usable.Cuts);
        Assert.Equal((CutReason.NoReading, 109.0, 160.0, 0, 51_000L), (cut.Reason, cut.From(), cut.To(), cut.Readings, cut.Milliseconds));
        Assert.Equal(149 / 200.0, usable.Channels[Channel.HeartRate].Share, 1e-12);
    }

    [Fact]
    public void SparseReadingsAreNotMissing() => Assert.Empty(Hearts([.. Enumerable.Range(0, 101).Select(second => second % 10 == 0 ? 150.0 : double.NaN)]).Cuts);

    [Fact]
    public void WhatTheTableMarksAsBadIsToldAsSuch()
    {
        var usable = Hearts([150, 150, CutMark.Of(CutReason.MarkedBad), 150, 150]);

        Assert.Equal((CutReason.MarkedBad, 2.0, 3.0, 1, 0.25), Assert.Single(usable.Cuts) is var cut ? (cut.Reason, cut.From(), cut.To(), cut.Readings, cut.Share) : default);
    }

    [Fact]
    public void AChannelOfWhichAllIsMarkedWasRecordedAndIsNotUsable()
    {
        var usable = Hearts([.. Enumerable.Repeat(CutMark.Of(CutReason.MarkedBad), 10)]);

        Assert.Equal((0.0, 0), (usable.Channels[Channel.HeartRate].Share, usable.Channels[Channel.HeartRate].Count));
        Assert.Equal(1, Assert.Single(usable.Cuts).Share);
    }

    [Fact]
    public void AMarkSurvivesTakingRows()
    {
        var series = Given.EverySecond((Channel.Speed, [1, CutMark.Of(CutReason.MarkedBad), double.NaN])).Take([1, 2]);

        Assert.Equal([CutReason.MarkedBad, null], series[Channel.Speed].ToArray().Select(CutMark.ReasonOf));
        Assert.True(series.Has(Channel.Speed));
    }

    /// <summary>Forty dropouts two minutes apart: fewer cuts, and none of the readings forgotten.</summary>
    [Fact]
    public void ManyCutsAreToldAsFew()
    {
        var cuts = Hearts([.. Enumerable.Range(0, 40 * 120).Select(second => second % 120 == 60 ? 0 : 150.0)]).Cuts;

        Assert.InRange(cuts.Count, 1, 8);
        Assert.Equal((40, 40_000L), (cuts.Sum(cut => cut.Readings), cuts.Sum(cut => cut.Milliseconds)));
    }

    /// <summary>208 - 0.7 x 40 = 180 bpm (Tanaka 2001); 15 above it are allowed by default. The anchor says 190.</summary>
    [Fact]
    public void AHeartRateTooFarAboveTheMaximumIsCutOnlyFromWhatIsComputed()
    {
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60), (196, 30)))));

        var byAge = Compute(recording, AnchorBook.Empty);

        Assert.Equal((CutReason.AboveMaximum, 60.0, 31), Assert.Single(byAge.Cuts) is var cut ? (cut.Reason, cut.From(), cut.Readings) : default);
        Assert.Equal((150, 60 / 90.0), (byAge.HeartRateMaxBpm, byAge.UsableShare[Channel.HeartRate]), (one, other) => one.Item1 == other.Item1 && Math.Abs(one.Item2 - other.Item2) < 1e-8);
        Assert.Empty(Judging.Cuts(recording));
        Assert.Equal(196, Compute(recording, Given.Anchors(Given.Anchor(AnchorKind.HeartRateMax, 190))).HeartRateMaxBpm);
    }

    [Fact]
    public void ACutToThePlannedSessionIsACut()
    {
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((200, 100)))));

        var cut = RecordingCut.To(recording, Given.Start + NodaTime.Duration.FromSeconds(10), Given.Start + NodaTime.Duration.FromSeconds(80));

        Assert.Equal(
            [(0.0, 10.0, 10, 0.1), (80.001, 100.001, 20, 0.2)],
            cut.Cuts.Select(one => (one.From()!.Value, one.To()!.Value, one.Readings, one.Share)));
        Assert.All(cut.Cuts, one => Assert.Equal(CutReason.OutsidePlan, one.Reason));
    }

    private static ActivityValues Compute(Recording recording, AnchorBook anchors) =>
        ActivityComputation.Compute(recording, Given.Person(birthYear: 1986), anchors, new ComputationSettings());

    private static UsableRecording Hearts(double[] bpm) => new(Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, bpm))), 0.5);
}
