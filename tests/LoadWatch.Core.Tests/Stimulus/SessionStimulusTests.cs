using CsCheck;
using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class SessionStimulusTests
{
    private static readonly Anchor[] HeartAnchors = [Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 190)];

    [Fact]
    public void SprintsOnTheBikeAreBoutsOfTheLegs()
    {
        var legs = Assert.Single(Of("cycling", Given.Cyclist, (Channel.Power, Given.Steps((100, 60), (800, 6), (100, 60), (800, 6), (100, 60)))).Regions);

        Assert.Equal((BodyRegion.Legs, Grade.A, "power"), (legs.Region, legs.Grade, legs.Channel));
        Assert.Equal(new Band(2, 2, 2), legs.HardBouts);
        Assert.Equal(12, legs.LargeSeconds!.Value.Mid, 0.1);
        Assert.Null(legs.HardRepetitions);
        Assert.Null(legs.HardSets);
        Assert.Equal(["heavy pedalling at a low cadence: no usable cadence"], legs.NotSeen);
    }

    [Fact]
    public void PowerOnFootIsAModelOfTheWatchAndIsNotRead()
    {
        var legs = Assert.Single(Of("running", Given.Cyclist, (Channel.Power, Given.Steps((800, 60)))).Regions);

        Assert.Null(legs.HardBouts);
        Assert.Equal("none", legs.Channel);
        Assert.Contains(legs.NotSeen, reason => reason.Contains("model of the watch", StringComparison.Ordinal));
    }

    [Fact]
    public void TheDetailOfASportNamesItsRegionsWhereTheSportDoesNot()
    {
        var samples = Given.EverySecond((Channel.Power, Given.Steps((200, 60))));
        var rowing = Given.Recording("fitness_equipment", samples) with { Sport = new Sport("fitness_equipment", "indoor_rowing") };

        var values = ActivityComputation.Compute(rowing, Given.Person(), Given.Anchors(Given.Cyclist), new ComputationSettings());

        Assert.Equal([BodyRegion.Legs, BodyRegion.Trunk, BodyRegion.Arms], values.Stimulus.Select(stimulus => stimulus.Region));
    }

    [Fact]
    public void AnHourBelowCriticalPowerHoldsNoBout()
    {
        var legs = Assert.Single(Of("cycling", Given.Cyclist, (Channel.Power, Given.Steps((240, 3600)))).Regions);

        Assert.Equal(0, legs.HardBouts!.Value.Mid);
        Assert.Equal(3600, legs.SlowSeconds!.Value.Mid);
    }

    [Fact]
    public void WithoutATrueMaximumBoutsAndTheLargestClassAreUnknown()
    {
        var anchors = Given.Cyclist.Where(anchor => anchor.Kind != AnchorKind.PowerMax).ToArray();

        var legs = Assert.Single(Of("cycling", anchors, (Channel.Power, Given.Steps((400, 60)))).Regions);

        Assert.Null(legs.HardBouts);
        Assert.Null(legs.LargeSeconds);
        Assert.Equal(60, legs.MediumSeconds!.Value.Mid);
        Assert.Contains("bouts and the largest class: no power_max dated within 183 days before", legs.NotSeen);
    }

    [Fact]
    public void PowerBeatsHeartRateAndIsNotAddedToIt()
    {
        var power = (Channel.Power, Given.Steps((200, 600)));
        var heartRate = (Channel.HeartRate, Given.Steps((150, 600)));

        var alone = Of("cycling", [.. Given.Cyclist, .. HeartAnchors], power).Regions[0];
        var both = Of("cycling", [.. Given.Cyclist, .. HeartAnchors], power, heartRate).Regions[0];

        Assert.Equal("power", both.Channel);
        Assert.Equal(alone.MediumSeconds, both.MediumSeconds);
    }

    [Fact]
    public void HeartRateAloneIsGradeEAndNeverSaysNone()
    {
        var legs = Assert.Single(Of("running", HeartAnchors, (Channel.HeartRate, Given.Steps((150, 600))), (Channel.Speed, Given.Steps((3, 600)))).Regions);

        Assert.Equal((Grade.E, "heart_rate"), (legs.Grade, legs.Channel));
        Assert.Null(legs.HardBouts);
        Assert.Null(legs.LargeSeconds);
        Assert.Equal(600, legs.SlowSeconds!.Value.Mid, 1);
        Assert.Contains(legs.NotSeen, reason => reason.StartsWith("speed: no critical_speed", StringComparison.Ordinal));
    }

    [Fact]
    public void ASessionThatNothingCanReadIsUnknownInItsRegions()
    {
        var regions = Of("rowing", [], (Channel.Power, Given.Steps((200, 600)))).Regions;

        Assert.Equal([BodyRegion.Legs, BodyRegion.Trunk, BodyRegion.Arms], regions.Select(region => region.Region));
        Assert.All(regions, region => Assert.True(region is { Channel: "none", HardBouts: null, SlowSeconds: null, MediumSeconds: null }));
        Assert.Contains("power: no critical_power to read it against", regions[0].NotSeen);
    }

    [Fact]
    public void ASportWithoutRegionsIsAskedAbout()
    {
        var stimulus = Of("fencing", HeartAnchors, (Channel.HeartRate, Given.Steps((150, 60))));

        Assert.Equal(BodyRegions.All, stimulus.Regions.Select(region => region.Region));
        Assert.All(stimulus.Regions, region => Assert.Null(region.HardBouts));
        Assert.Contains("fencing", Assert.Single(stimulus.Remarks), StringComparison.Ordinal);
    }

    [Fact]
    public void ASetOfAnUnknownExerciseLeavesNoRegionKnownToHaveRested()
    {
        var stimulus = OfSets([], Given.Set("bulgarian_split_squat", 8, 100), Given.Set(null, 8, 100));

        Assert.Equal(BodyRegions.All, stimulus.Regions.Select(region => region.Region));
        Assert.All(stimulus.Regions, region => Assert.Null(region.HardRepetitions));
        Assert.Equal(2, stimulus.Remarks.Count);
    }

    [Fact]
    public void SetsGoToTheRegionsOfTheirExercises()
    {
        var maximum = Given.Anchor(AnchorKind.OneRepetitionMax, 100, Given.Date.PlusDays(-7), exercise: "squat");

        var stimulus = OfSets([maximum], Given.Set("squat", 8, 80, 0), Given.Set(null, null, null, active: false), Given.Set("squat", 8, 80, 0),
            Given.Set("bench_press", 8, 60));

        Assert.Equal([BodyRegion.Legs, BodyRegion.Arms], stimulus.Regions.Select(region => region.Region));
        Assert.Equal((Grade.A, 16.0, 2), (stimulus.Regions[0].Grade, stimulus.Regions[0].HardRepetitions!.Value.Mid, stimulus.Regions[0].HardSets));
        Assert.Equal(16, stimulus.Regions[0].LargeSeconds!.Value.Mid, 1e-9);
        Assert.Null(stimulus.Regions[1].HardRepetitions);
        Assert.Equal("1 set of bench_press: no one_repetition_max, or repetitions in reserve up to 12 in all", Assert.Single(stimulus.Regions[1].NotSeen));
    }

    [Fact]
    public void APlankInARidesFileHidesNoSprint()
    {
        var plank = Given.Set("plank", null, null) with { IsHold = true, DurationSeconds = 60, Hardness = 8 };
        var ride = Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((100, 60), (800, 6), (100, 60), (800, 6), (100, 60)))), plank);

        var stimulus = Of(ride, Given.Cyclist);

        Assert.Equal([(BodyRegion.Legs, "power", 2.0), (BodyRegion.Trunk, "sets", 1.0)], stimulus.Regions.Select(region => (region.Region, region.Channel, region.HardBouts!.Value.Mid)));
    }

    [Fact]
    public void OfARegionWithSetsAndPowerTheBetterGradedCountsAndTheOtherIsTold()
    {
        var wallSit = Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = 40, Hardness = 8 };
        var ride = Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((100, 60), (800, 6), (100, 60)))), wallSit);

        var legs = Assert.Single(Of(ride, Given.Cyclist).Regions);

        Assert.Equal((Grade.A, "power", 1.0), (legs.Grade, legs.Channel, legs.HardBouts!.Value.Mid));
        Assert.Contains("sets of the same session: not added, as its moments may be the same", legs.NotSeen);
    }

    [Fact]
    public void AnUnknownExerciseIsAskedForNotGuessed()
    {
        var stimulus = OfSets([], Given.Set("squat", 8, 80, 2), Given.Set("turkish_walk", 8, 80, 2), Given.Set(null, 8, 80, 2));

        Assert.Equal(BodyRegions.All, stimulus.Regions.Select(region => region.Region));
        Assert.Equal(
            ["1 set of turkish_walk: which body region?", "1 set without an exercise: which body region?"],
            stimulus.Regions[0].NotSeen);
        Assert.Equal(stimulus.Regions[0].NotSeen, stimulus.Remarks);
    }

    [Fact]
    public void AnExerciseIsFoundHoweverItIsWritten()
    {
        var stimulus = OfSets([], Given.Set("Leg  Press", 8, 80, 2), Given.Set("leg-press", 8, 80, 2), Given.Set("CHEST_PRESS", 8, 80));

        Assert.Equal([BodyRegion.Legs, BodyRegion.Arms], stimulus.Regions.Select(region => region.Region));
        Assert.Equal(16, stimulus.Regions[0].HardRepetitions!.Value.Mid);
        Assert.Equal("1 set of chest_press: no one_repetition_max, or repetitions in reserve up to 12 in all", Assert.Single(stimulus.Regions[1].NotSeen));
        Assert.Empty(stimulus.Questions);
    }

    [Fact]
    public void ExercisesWithoutARegionAreAskedForOnce()
    {
        var stimulus = OfSets([], Given.Set("Turkish walk", 8, 80), Given.Set("squat", 8, 80), Given.Set(null, 8, 80), Given.Set("turkish-walk", 8, 80),
            Given.Set("arm bike", 8, 80), Given.Set("resting", null, null, active: false));

        Assert.Equal(["arm_bike", "turkish_walk"], stimulus.Questions);
        Assert.Contains("2 sets of turkish_walk: which body region?", stimulus.Remarks);
        Assert.Equal(3, stimulus.Remarks.Count);
    }

    [Fact]
    public void ChairStandsThatNothingIsKnownOfMayHaveBeenHard()
    {
        var legs = Assert.Single(OfSets([], Given.Set("chair_stand", 10, 0)).Regions);

        Assert.Null(legs.HardRepetitions);
        Assert.Contains(legs.NotSeen, reason => reason.StartsWith("chair stands, steps and stairs may be near the maximum", StringComparison.Ordinal));
    }

    [Fact]
    public void AMixedSessionAddsRepetitionsAndHoldsOfARegion()
    {
        var wallSit = Given.Set("wall_sit", null, null) with { IsHold = true, DurationSeconds = 40, Hardness = 8 };
        var jumps = Given.Set("squat_jump", 5, null) with { IsFast = true };

        var legs = Assert.Single(OfSets([], wallSit, jumps, Given.Set("leg_press", 6, 80, 2)).Regions);

        Assert.Equal((1.0, 11.0, 3), (legs.HardBouts!.Value.Mid, legs.HardRepetitions!.Value.Mid, legs.HardSets));
        Assert.Equal(Grade.D, legs.Grade);
    }

    [Fact]
    public void BandsAndClassesAreAlwaysOrdered() =>
        Gen.Double[0, 1500].Array[2, 200].Sample(watts =>
        {
            var legs = Of("cycling", Given.Cyclist, (Channel.Power, watts)).Regions[0];
            Band[] bands = [.. new[] { legs.HardBouts, legs.SlowSeconds!.Value, legs.MediumSeconds!.Value, legs.LargeSeconds }.OfType<Band>()];
            return Array.TrueForAll(bands, band => band.Low >= 0 && band.Low <= band.Mid && band.Mid <= band.High && double.IsFinite(band.High))
                && legs.SlowSeconds.Value.Mid >= legs.MediumSeconds.Value.Mid
                && !(legs.MediumSeconds.Value.Mid < legs.LargeSeconds?.Mid)
                && legs.HardBouts.HasValue == legs.LargeSeconds.HasValue;
        });

    private static SessionStimulus Of(string sport, Anchor[] anchors, params (Channel Channel, double[] Values)[] columns) =>
        Of(Given.Recording(sport, Given.EverySecond(columns)), anchors);

    private static SessionStimulus OfSets(Anchor[] anchors, params StrengthSet[] sets) =>
        Of(Given.Recording("training", SampleSeries.Empty, sets), anchors);

    private static SessionStimulus Of(Recording recording, Anchor[] anchors) => SessionStimulus.Of(
        new UsableRecording(recording, 0.5), Given.Date, Given.Person(), Given.Anchors(anchors), new ComputationSettings());
}
