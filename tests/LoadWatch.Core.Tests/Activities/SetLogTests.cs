using LoadWatch.Loads;
using LoadWatch.Stimulus;
using NodaTime;
using static LoadWatch.Activities.Told;

namespace LoadWatch.Activities;

public class SetLogTests
{
    private static readonly OwnedRow[] HeavySquats = [Set(1), Set(2)];

    private static readonly Quantity[] OwnTotals =
        [new(QuantityNames.Kilograms, 400, "kg", false), new(QuantityNames.Repetitions, 12, "count", false), new(QuantityNames.Sets, 3, "count", false)];

    /// <summary>2 sets of 5 at 85 % of the maximum: all above the line; 2 x 5 x 85 kg.</summary>
    [Fact]
    public void ASetLogJoinsTheStrengthRecordingAndNotTheRun()
    {
        var result = Join([Recorded("running", 8), Recorded("training/strength_training", 18)], HeavySquats);

        Assert.Equal(2, result.Activities.Count);
        Assert.Null(result.Activities[0]["sets"]);
        Assert.Equal((2, 10, 850), (result.Activities[1]["sets"], result.Activities[1]["repetitions"], result.Activities[1]["kilograms"]));
        var legs = Assert.Single(result.Activities[1].Stimulus);
        Assert.Equal((BodyRegion.Legs, "sets", Grade.A, 10), (legs.Region, legs.Channel, legs.Grade, legs.HardRepetitions?.Mid));
    }

    [Fact]
    public void ASetLogThatNobodyRecordedIsASession()
    {
        var activity = Assert.Single(Join([], HeavySquats).Activities);

        Assert.Equal(("rows/2026-03-10/gym/1", "training/strength_training", true), (activity.Key, activity.Sport.ToString(), activity.AddsLoad));
        Assert.Equal(10, Assert.Single(activity.Stimulus).HardRepetitions?.Mid);
        Assert.Equal(["layout gym"], activity.Sources);
    }

    [Fact]
    public void ASetLogBesideARunStandsAlone() => Assert.Equal(2, Join([Recorded("running", 8)], HeavySquats).Activities.Count);

    [Fact]
    public void ARatingAndASetLogOfOneClassAreOneSession()
    {
        var activity = Assert.Single(Join([], [.. HeavySquats, Session(rating: 6, minutes: 50)]).Activities);

        Assert.Equal((2, 300), (activity["sets"], activity["foster_load"]));
        Assert.Equal(2, Join([], [.. HeavySquats, Session(rating: 6, minutes: 50, sport: "running")]).Activities.Count);
    }

    [Fact]
    public void SetsOfABetterGradeReplaceTheRecordingsOwn()
    {
        var own = Recorded("training/strength_training", 18, sets: 3, quantities: OwnTotals).With(Region("sets", Grade.D, null, 8));
        var activity = Assert.Single(Join([own], HeavySquats).Activities);

        Assert.Equal((2, 10, 850), (activity["sets"], activity["repetitions"], activity["kilograms"]));
        Assert.Equal((Grade.A, 10), (Assert.Single(activity.Stimulus).Grade, activity.Stimulus[0].HardRepetitions?.Mid));
    }

    [Fact]
    public void SetsOfTheSameGradeAreNeitherTakenNorAdded()
    {
        var own = Recorded("training/strength_training", 18, sets: 3, quantities: OwnTotals).With(Region("sets", Grade.A, null, 8));
        var activity = Assert.Single(Join([own], HeavySquats).Activities);

        Assert.Equal((3, 12, 400), (activity["sets"], activity["repetitions"], activity["kilograms"]));
        Assert.Equal(8, Assert.Single(activity.Stimulus).HardRepetitions?.Mid);
        Assert.Equal(["sets of gym are not added to those of the recording"], activity.Remarks);
    }

    [Fact]
    public void ARegionThatPowerSawStays()
    {
        var own = Recorded("generic", 18).With(
            Region("power", Grade.B, 4, null),
            Region("heart_rate", Grade.E, null, null, BodyRegion.Trunk),
            Region("power", Grade.B, 1, null, BodyRegion.Arms));
        var activity = Assert.Single(Join([own], HeavySquats).Activities);

        Assert.Equal([(BodyRegion.Legs, "sets"), (BodyRegion.Arms, "power")], activity.Stimulus.Select(region => (region.Region, region.Channel)));
    }

    [Fact]
    public void TheQuestionForTheRegionsOfTheSportIsSettledByTheSets()
    {
        var question = SportRegions.Question(new("generic"));
        var own = Recorded("generic", 18);
        var asking = own with { Values = own.Values with { Remarks = [question, "something else"] } };

        Assert.Equal([question, "something else"], Join([asking]).Activities[0].Remarks);
        Assert.Equal(["something else"], Join([asking], HeavySquats).Activities[0].Remarks);
    }

    [Fact]
    public void ASetLogThatFitsTwoRecordingsCountsForStimulusAlone()
    {
        var result = Join([Recorded("generic", 8), Recorded("training/cardio_training", 18)], HeavySquats);

        var uncertain = Assert.Single(result.Activities, activity => !activity.AddsLoad);
        Assert.Equal(3, result.Activities.Count);
        Assert.Equal(("rows/2026-03-10/gym/1", 10), (uncertain.Key, Assert.Single(uncertain.Stimulus).HardRepetitions?.Mid));
        Assert.Equal(
            "2 logged sets of 10 March (gym) fit the recordings at 08:00 and 18:00; a session number or a start time would tell",
            Assert.Single(result.Questions).Sentence);
    }

    [Fact]
    public void WhereOneOfTheTwoMayHoldTheSameSetsTheyAreOnlyAskedFor()
    {
        var result = Join([Recorded("generic", 8, sets: 4), Recorded("training/strength_training", 18)], HeavySquats);

        Assert.Equal(2, result.Activities.Count);
        Assert.Single(result.Questions);
    }

    [Fact]
    public void OfTwoLogsOfOneSessionTheBetterGradedCountsAndNothingIsAdded()
    {
        var activity = Assert.Single(Join([], [.. HeavySquats, Set(1, layout: "diary", kilograms: null, reserve: 2)]).Activities);

        Assert.Equal((2, 10), (activity["sets"], Assert.Single(activity.Stimulus).HardRepetitions?.Mid));
        Assert.Equal(["sets of diary are not added to those of gym"], activity.Remarks);
    }

    [Theory]
    [InlineData(12, 0, 1)]
    [InlineData(12, 1, 2)]
    public void ABreakOfMoreThanTwoHoursPartsALog(int hour, int minute, int sessions) =>
        Assert.Equal(sessions, Join([], Set(1, time: new LocalTime(10, 0)), Set(2, time: new LocalTime(hour, minute)), Set(3)).Activities.Count);

    [Fact]
    public void TheTimesOfAPartedLogNameItsRecordings()
    {
        var recorded = new[] { Recorded("training/strength_training", 7), Recorded("training/strength_training", 17) };
        var activities = Join(recorded, Set(1, time: new LocalTime(7, 5)), Set(2, time: new LocalTime(17, 5)), Set(3, time: new LocalTime(17, 15))).Activities;

        Assert.Equal([1.0, 2.0], activities.Select(activity => activity["sets"]!.Value));
    }

    [Fact]
    public void NumberedSessionsOfALogStayApart() =>
        Assert.Equal([1.0, 2.0], Join([], Set(1, order: 1), Set(1, order: 2), Set(2, order: 2)).Activities.Select(activity => activity["sets"]!.Value));

    /// <summary>8 done at hardness 8 leave 2: the chart's 75 % for 10 in all, above the line.</summary>
    [Fact]
    public void HardnessStandsInForTheReserve()
    {
        var hard = Assert.Single(Join([], Set(1, "lunge", 8, 40, reserve: null, hardness: 8)).Activities);
        var stated = Assert.Single(Join([], Set(1, "lunge", 8, 40, reserve: 2, hardness: 0)).Activities);

        Assert.Equal((Grade.B, 8), (hard.Stimulus[0].Grade, hard.Stimulus[0].HardRepetitions?.Mid));
        Assert.Equal(hard.Stimulus[0].LargeSeconds, stated.Stimulus[0].LargeSeconds);
    }

    [Fact]
    public void ExercisesWithoutARegionAreNamedOnce()
    {
        var result = Join([], Set(1, "zebra press"), Set(2, "zebra press"), Set(1, "ant walk"), Set(1), Set(1, " "));

        Assert.Equal(["ant_walk", "zebra_press"], result.UnknownExercises.Select(exercise => exercise.Word));
    }
}
