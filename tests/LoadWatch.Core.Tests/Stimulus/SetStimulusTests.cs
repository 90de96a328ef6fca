using CsCheck;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class SetStimulusTests
{
    private static readonly Anchor Maximum = Given.Anchor(AnchorKind.OneRepetitionMax, 100, Given.Date.PlusDays(-56), exercise: "squat");

    /// <summary>Computed independently from the stated equations: percent of the maximum, repetitions, in reserve; hard repetitions,
    /// largest class summed.</summary>
    [Theory]
    [InlineData(80, 8, 0, 8, 8.0)]
    [InlineData(70, 10, 2, 10, 8.73)]
    [InlineData(60, 12, 3, 7, 7.14)]
    [InlineData(50, 15, 3, 5, 5.24)]
    [InlineData(30, 40, 0, 8, 8.14)]
    [InlineData(30, 20, 20, 0, 0)]
    [InlineData(85, 5, 1, 5, 5.0)]
    public void SetsCallOnTheLargestClass(double kilograms, int repetitions, double reserve, int hard, double large)
    {
        var reading = SetStimulus.Read([Demand(Given.Set("squat", repetitions, kilograms, reserve), Maximum)!], Variant.Mid);

        Assert.Equal(hard, reading.HardRepetitions);
        Assert.Equal(hard > 0 ? 1 : 0, reading.HardSets);
        Assert.Equal(large, reading.Seconds.Large, 5.1e-3);
        Assert.Equal(repetitions, reading.Seconds.Slow, repetitions * 0.01);
    }

    /// <summary>By hand: 0.30 / (1 - 0.70 x 19/39) = 0.455.</summary>
    [Fact]
    public void ALightSetFarFromFailureStaysFarBelowTheLine() =>
        Assert.Equal(0.455, Demand(Given.Set("squat", 20, 30, 20), Maximum)!.Drives(Variant.Mid).Max(), 5e-4);

    /// <summary>The first repetition at 70 % sits on the line: 69 % is below, 71 % above.</summary>
    [Theory]
    [InlineData(69, 0)]
    [InlineData(70, 1)]
    [InlineData(71, 1)]
    public void TheFirstRepetitionIsTheLoadItself(double kilograms, int hard) =>
        Assert.Equal(hard, SetStimulus.Read([Demand(Given.Set("squat", 1, kilograms, 5), Maximum)!], Variant.Mid).HardRepetitions);

    [Fact]
    public void AMeasuredRecentMaximumWithReserveIsGradeA()
    {
        Assert.Equal(Grade.A, Demand(Given.Set("squat", 8, 80, 2), Maximum)!.Grade);
        Assert.Equal(Grade.B, Demand(Given.Set("squat", 8, 80), Maximum)!.Grade);
        Assert.Equal(Grade.B, Demand(Given.Set("squat", 8, 80, 2), Maximum with { Date = Given.Date.PlusDays(-57) })!.Grade);
        Assert.Equal(Grade.B, Demand(Given.Set("squat", 8, 80, 2), Maximum with { Date = null })!.Grade);
        Assert.Equal(Grade.B, Demand(Given.Set("squat", 8, 80, 2), Maximum with { Source = AnchorSource.Observed })!.Grade);
    }

    [Fact]
    public void WithoutReserveTheLoadAloneIsALowerBound()
    {
        var region = SetStimulus.Of(BodyRegion.Legs, [Demand(Given.Set("squat", 12, 60), Maximum)!], unread: 0, [], Variants.Usual);

        Assert.Equal(0, region.HardRepetitions!.Value.Mid);
        Assert.True(region.HardRepetitions.Value.High >= 7, "taken to failure 60 % reaches the line before the end");
        Assert.Equal(0, region.HardSets);
        Assert.Contains("lower bound", Assert.Single(region.NotSeen), StringComparison.Ordinal);
    }

    [Fact]
    public void HardRepetitionsBesideAnUnreadSetAreUnknownUntilTheLineIsReached()
    {
        var light = SetStimulus.Of(BodyRegion.Legs, [Demand(Given.Set("squat", 5, 20), Maximum)!], unread: 5, [], Variants.Usual);
        var hard = Enumerable.Repeat(Demand(Given.Set("squat", 5, 85, 1), Maximum)!, 2).ToList();

        Assert.Null(light.HardRepetitions);
        Assert.Null(light.HardSets);
        Assert.Equal(10, SetStimulus.Of(BodyRegion.Legs, hard, unread: 5, [], Variants.Usual).HardRepetitions!.Value.Mid);
    }

    /// <summary>Load chart: 8 done and 2 in reserve are 75 %.</summary>
    [Fact]
    public void WithoutAMaximumTheChartNamesTheLoad()
    {
        Assert.Equal(new SetDemand(8, 0.75, 0.10, 2, Grade.B, SetRule.Chart), Demand(Given.Set("squat", 8, 80, 2)));
        Assert.Equal(new SetDemand(8, 0.75, 0.20, 2, Grade.D, SetRule.Chart), Demand(Given.Set("squat", 8, null, 2)));
        Assert.Equal(new SetDemand(8, 0.75, 0.20, 2, Grade.D, SetRule.Chart), Demand(Given.Set("squat", 8, 0, 2), Maximum));
    }

    [Theory]
    [InlineData(10, 80.0, 3.0)]
    [InlineData(8, 80.0, null)]
    [InlineData(8, null, null)]
    [InlineData(null, 80.0, 2.0)]
    [InlineData(0, 80.0, 2.0)]
    [InlineData(int.MaxValue, 80.0, 2.0)]
    [InlineData(8, double.NaN, double.NaN)]
    public void OtherwiseTheSetIsUnknownAndSaysWhatIsMissing(int? repetitions, double? kilograms, double? reserve)
    {
        var (demand, missing) = SetDemand.Of(Given.Set("squat", repetitions, kilograms, reserve), Given.Date, "p1", AnchorBook.Empty, new());

        Assert.Null(demand);
        Assert.NotNull(missing);
    }

    [Fact]
    public void BandsAndClassesAreAlwaysOrderedAndMoreReserveNeverRaisesThem() =>
        Gen.Select(Gen.Int[1, 40], Gen.Double[1, 150], Gen.Double[0, 20]).Sample((repetitions, kilograms, reserve) =>
        {
            var region = SetStimulus.Of(BodyRegion.Legs, [Demand(Given.Set("squat", repetitions, kilograms, reserve), Maximum)!], unread: 0, [], Variants.Usual);
            var further = SetStimulus.Of(BodyRegion.Legs, [Demand(Given.Set("squat", repetitions, kilograms, reserve + 1), Maximum)!], unread: 0, [], Variants.Usual);
            Band[] bands = [region.HardRepetitions!.Value, region.SlowSeconds!.Value, region.MediumSeconds!.Value, region.LargeSeconds!.Value];
            return Array.TrueForAll(bands, band => band.Low >= 0 && band.Low <= band.Mid && band.Mid <= band.High && band.High <= repetitions)
                && region.SlowSeconds.Value.Mid >= region.MediumSeconds.Value.Mid
                && region.MediumSeconds.Value.Mid >= region.LargeSeconds.Value.Mid
                && region.LargeSeconds.Value.Mid >= further.LargeSeconds!.Value.Mid
                && region.HardRepetitions.Value.Mid >= further.HardRepetitions!.Value.Mid;
        });

    private static SetDemand? Demand(StrengthSet set, params Anchor[] anchors) =>
        SetDemand.Of(set, Given.Date, "p1", Given.Anchors(anchors), new()).Demand;
}
