using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Recordings of one row a minute: minute 0, 1, 2, ... with a distance of 100 m a minute.</summary>
public class RecordingCutTests
{
    [Fact]
    public void WhatLiesOutsideIsLeftOutAndSaid()
    {
        var cut = Cut(Minutes(128), 30, 90);

        Assert.Equal(["30 min before the planned session left out", "37 min after the planned session left out"], cut.LeftOut);
        Assert.Equal(61, cut.Recording.Samples.Count);
        Assert.Equal([30.0, 90], new[] { cut.Recording.Samples[Channel.Power][0], cut.Recording.Samples[Channel.Power][^1] });
        Assert.Equal(At(30), cut.Recording.Start);
    }

    [Fact]
    public void TotalsOfTheWholeSessionAreCountedAgain()
    {
        var whole = Minutes(128) with { ElapsedSeconds = 9999, TimerSeconds = 8888, DistanceMetres = 77_777 };

        var rest = Cut(whole, 30, 90).Recording;

        Assert.Equal((3600.0, null, 6000.0), (rest.ElapsedSeconds, rest.TimerSeconds, rest.DistanceMetres));
    }

    [Fact]
    public void WithoutReadingsOfDistanceItIsUnknown()
    {
        var whole = Minutes(100) with { DistanceMetres = 10_000 };

        Assert.Null(Cut(whole with { Samples = whole.Samples.Without(Channel.Distance) }, 0, 50).Recording.DistanceMetres);
    }

    [Fact]
    public void BeatsSetsAndPausesAreCutAlong()
    {
        var whole = Minutes(100) with
        {
            LateHeartRates = [Beat(5), Beat(50), Beat(95)],
            Sets = [Set(5), Set(50), Set(95), Set(null)],
            Pauses = [new(At(1), At(2)), new(At(8), At(12)), new(At(85), null), new(At(95), At(96))],
        };

        var rest = Cut(whole, 10, 90).Recording;

        Assert.Equal([Beat(50)], rest.LateHeartRates);
        Assert.Equal([At(50), null], rest.Sets.Select(set => set.Start));
        Assert.Equal([new Pause(At(10), At(12)), new Pause(At(85), null)], rest.Pauses);
    }

    [Fact]
    public void BeatsAndSetsAloneCanLieOutside()
    {
        var whole = Given.Recording("training", SampleSeries.Empty, Set(0), Set(20)) with { LateHeartRates = [Beat(21), Beat(70)] };

        var cut = Cut(whole, 10, 30);

        Assert.Equal(["10 min before the planned session left out", "40 min after the planned session left out"], cut.LeftOut);
        Assert.Equal((At(20), 60.0), (cut.Recording.Start, cut.Recording.ElapsedSeconds));
    }

    [Fact]
    public void ARowWithoutATimeGoes()
    {
        var series = new SampleSeries(
            [SampleSeries.Undated, Given.StartMilliseconds, Given.StartMilliseconds + 120_000],
            new Dictionary<Channel, double[]> { [Channel.Power] = [1, 2, 3] });

        Assert.Equal([2.0], Cut(Given.Recording("soccer", series), 0, 1).Recording.Samples[Channel.Power].ToArray());
    }

    [Theory]
    [InlineData(0, 99)]
    [InlineData(-60, 200)]
    public void NothingOutsideIsNoCut(int from, int to)
    {
        var whole = Minutes(100);

        Assert.Same(whole, Cut(whole, from, to).Recording);
        Assert.Empty(Cut(whole, from, to).LeftOut);
    }

    [Fact]
    public void WhereNothingUsableWouldBeLeftThereIsNoCut()
    {
        var whole = Minutes(100);
        var lost = Enumerable.Range(0, 100).Select(minute => minute < 50 ? 254.0 : 120).ToArray();
        var heart = Given.Recording("soccer", new SampleSeries(whole.Samples.UnixMilliseconds.ToArray(), new Dictionary<Channel, double[]> { [Channel.HeartRate] = lost }));

        Assert.Same(whole, Cut(whole, 200, 300).Recording);
        Assert.Same(heart, Cut(heart, 0, 30).Recording);
        Assert.Equal(["49 min after the planned session left out"], Cut(heart, 0, 50).LeftOut);
    }

    [Fact]
    public void PartOfAMinuteCountsAsOne() =>
        Assert.Equal(["1 min after the planned session left out"], RecordingCut.To(Minutes(11), At(0), At(10) - Duration.FromMilliseconds(1)).LeftOut);

    private static CutRecording Cut(Recording recording, int from, int to) => RecordingCut.To(recording, At(from), At(to));

    private static Instant At(int minute) => Given.Start + Duration.FromMinutes(minute);

    private static TimedHeartRate Beat(int minute) => new(At(minute).ToUnixTimeMilliseconds(), 120);

    private static StrengthSet Set(int? minute) => new(minute is { } known ? At(known) : null, 30, true, "squat", 5, 80);

    private static Recording Minutes(int rows)
    {
        var minutes = Enumerable.Range(0, rows).ToArray();
        return Given.Recording("soccer", new SampleSeries(
            [.. minutes.Select(minute => Given.StartMilliseconds + (minute * 60_000L))],
            new Dictionary<Channel, double[]>
            {
                [Channel.Power] = [.. minutes.Select(minute => (double)minute)],
                [Channel.Distance] = [.. minutes.Select(minute => 500.0 + (minute * 100))],
            }));
    }
}
