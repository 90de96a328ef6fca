using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class SpeedStimulusTests
{
    /// <summary>By hand: 7 m/s of critical 4 and maximal 8 drives 0.65 + 0.35 x 3 / 4 when fresh.</summary>
    [Fact]
    public void SprintsOnFootAreBoutsOfTheLegs()
    {
        var legs = Of("running", Given.Runner, (Channel.Speed, Given.Steps((3, 60), (7, 6), (2, 60), (7, 6), (2, 60))));

        Assert.Equal((BodyRegion.Legs, Grade.D, "speed"), (legs.Region, legs.Grade, legs.Channel));
        Assert.Equal(2, legs.HardBouts!.Value.Mid);
        Assert.Equal(12, legs.LargeSeconds!.Value.Mid, 0.5);
    }

    [Fact]
    public void AtTenReadingsASecondWithTestedSpeedsItIsInferredAtOneALowerBound()
    {
        Assert.Equal(Grade.C, Read(100, Given.Runner).Grade);
        Assert.Equal(Grade.D, Read(200, Given.Runner).Grade);
        Assert.Equal(Grade.D, Read(1000, Given.Runner).Grade);
        Assert.Equal(Grade.D, Read(100, [.. Given.Runner.Select(one => one with { Source = AnchorSource.Observed })]).Grade);
        Assert.Contains(Read(1000, Given.Runner).NotSeen, reason => reason.StartsWith("sprints", StringComparison.Ordinal));
        Assert.DoesNotContain(Read(100, Given.Runner).NotSeen, reason => reason.StartsWith("sprints", StringComparison.Ordinal));
    }

    /// <summary>By hand: 3.0 s at 7 m/s count, 2.9 s do not; at 1 Hz neither would be sure to.</summary>
    [Fact]
    public void AtTenReadingsASecondShortEffortsCount()
    {
        double[] speeds = [.. Enumerable.Repeat(2.0, 300), .. Enumerable.Repeat(7.0, 30), .. Enumerable.Repeat(2.0, 300), .. Enumerable.Repeat(7.0, 29), .. Enumerable.Repeat(2.0, 300)];
        UsableSample[] samples = [.. speeds.Select((speed, at) => new UsableSample(Given.StartMilliseconds + (at * 100L), speed, 100))];
        var capacity = SpeedCapacity.On(Given.Date, "p1", Given.Anchors(Given.Runner))!;

        var read = SpeedStimulus.Of(new UsableChannel(Channel.Speed, samples, 1), null, new Sport("running"), capacity, Variants.Usual);

        Assert.Equal((Grade.C, 1.0), (read.Grade, read.HardBouts!.Value.Mid));
    }

    [Fact]
    public void WithoutATrueMaximumBoutsAndTheLargestClassAreUnknown()
    {
        var legs = Of("running", [.. Given.Runner.Where(one => one.Kind != AnchorKind.SpeedMax)], (Channel.Speed, Given.Steps((6, 60))));

        Assert.Null(legs.HardBouts);
        Assert.Null(legs.LargeSeconds);
        Assert.Equal(60, legs.MediumSeconds!.Value.Mid);
        Assert.Contains("bouts and the largest class: no speed_max dated within 183 days before", legs.NotSeen);
    }

    /// <summary>By hand: 3 m/s up 10 % costs as much as 3 x 5.968 / 3.6 = 4.97 m/s on the level, more than the critical 4.</summary>
    [Fact]
    public void UphillReadsAsTheSpeedOnTheLevelThatCostsAsMuch()
    {
        var speed = (Channel.Speed, Given.Steps((3, 600)));
        double[] uphill = [.. Enumerable.Range(0, 601).Select(second => second * 0.3)];

        var up = Of("running", Given.Runner, speed, (Channel.Altitude, uphill));
        var level = Of("running", Given.Runner, (Channel.Speed, Given.Steps((3 * 5.9676 / 3.6, 600))), (Channel.Altitude, new double[601]));
        var down = Of("running", Given.Runner, speed, (Channel.Altitude, [.. uphill.Select(metres => -metres)]));

        Assert.Equal(level.LargeSeconds!.Value.Mid, up.LargeSeconds!.Value.Mid, 1.0);
        Assert.True(up.LargeSeconds.Value.Mid > 100);
        Assert.Equal(0, down.HardBouts!.Value.Mid);
        Assert.Contains(down.NotSeen, reason => reason.StartsWith("downhill", StringComparison.Ordinal));
    }

    [Fact]
    public void WithoutHeightItIsReadAsLevelAndSaysSo()
    {
        var legs = Of("running", Given.Runner, (Channel.Speed, Given.Steps((3, 60))));

        Assert.Contains("slope: no usable height, so read as level", legs.NotSeen);
    }

    [Fact]
    public void HeightThatOnlyTremblesLeavesTheSpeedAsItIs()
    {
        double[] trembling = [.. Enumerable.Range(0, 601).Select(second => second % 3 * 4.0)];

        var speed = (Channel.Speed, Given.Steps((3, 600)));
        Assert.Equal(
            Of("running", Given.Runner, speed).MediumSeconds,
            Of("running", Given.Runner, speed, (Channel.Altitude, trembling)).MediumSeconds);
    }

    [Fact]
    public void ATreadmillsInclineIsNotSeen()
    {
        var samples = Given.EverySecond((Channel.Speed, Given.Steps((3, 600))), (Channel.Altitude, [.. Enumerable.Range(0, 601).Select(second => second * 0.3)]));
        var legs = Of(Given.Recording("running", samples) with { Sport = new Sport("running", "treadmill") }, Given.Runner);

        Assert.Equal(0, legs.LargeSeconds!.Value.Mid);
        Assert.Contains("incline of the treadmill: read as level", legs.NotSeen);
    }

    [Fact]
    public void SpeedOnWheelsIsNotRead()
    {
        var legs = Of("cycling", Given.Runner, (Channel.Speed, Given.Steps((9, 60))));

        Assert.Equal("none", legs.Channel);
        Assert.Contains(legs.NotSeen, reason => reason.StartsWith("speed is not read on wheels", StringComparison.Ordinal));
    }

    [Fact]
    public void AMatchOnFootTellsOfTheLegsAndAsksForTheRest()
    {
        var stimulus = Session(Given.Recording("soccer", Given.EverySecond((Channel.Speed, Given.Steps((2, 60), (7, 4), (2, 60))))), Given.Runner);

        Assert.Equal(BodyRegions.All, stimulus.Regions.Select(region => region.Region));
        Assert.Equal((1.0, "speed"), (stimulus.Regions[0].HardBouts!.Value.Mid, stimulus.Regions[0].Channel));
        Assert.Null(stimulus.Regions[1].HardBouts);
        Assert.Contains("soccer", Assert.Single(stimulus.Remarks), StringComparison.Ordinal);
    }

    private static RegionStimulus Read(int milliseconds, Anchor[] anchors)
    {
        double[] values = [.. Enumerable.Repeat(3.0, 600)];
        var times = values.Select((_, at) => Given.StartMilliseconds + (at * (long)milliseconds)).ToArray();
        return Of(Given.Recording("running", new SampleSeries(times, new Dictionary<Channel, double[]> { [Channel.Speed] = values })), anchors);
    }

    private static RegionStimulus Of(string sport, Anchor[] anchors, params (Channel Channel, double[] Values)[] columns) =>
        Of(Given.Recording(sport, Given.EverySecond(columns)), anchors);

    private static RegionStimulus Of(Recording recording, Anchor[] anchors) => Assert.Single(Session(recording, anchors).Regions);

    private static SessionStimulus Session(Recording recording, Anchor[] anchors) => SessionStimulus.Of(
        new UsableRecording(recording, 0.5), Given.Date, Given.Person(), Given.Anchors(anchors), new ComputationSettings());
}
