using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;

namespace LoadWatch.Loads;

/// <summary>What nobody here has read in the source is a default, not a fixed number.</summary>
public class EquationChoicesTests
{
    private static readonly Anchor[] Heart =
    [
        Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 190),
        Given.Anchor(AnchorKind.HeartRateVt1, 130), Given.Anchor(AnchorKind.HeartRateVt2, 160),
    ];

    /// <summary>By hand: 10 min at 190 bpm of 190, in the top zone of each; x = 1.</summary>
    [Fact]
    public void AnotherWeightMakesAnotherLoad()
    {
        var other = new EquationChoices
        {
            BanisterMen = [0.5, 0],
            EdwardsWeights = [1, 2, 3, 4, 7],
            LuciaWeights = [1, 2, 5],
            StagnoWeights = [1, 1, 1, 1, 6],
        };

        Assert.Equal([5.0, 70, 50, 60], Loads(other, Sex.Male, (190, 10)));
    }

    /// <summary>By hand: 10 min at x = 1; the mean of the two pairs is a = 0.75, b = 1: 7.5 e.</summary>
    [Fact]
    public void WithoutASexTheMeanOfBothPairsIsTaken() =>
        Assert.Equal(20.3871137, Loads(new EquationChoices { BanisterMen = [0.5, 0.5], BanisterWomen = [1, 1.5] }, sex: null, (190, 10))[0], 5e-8);

    /// <summary>By hand: 95 bpm are half of 190.</summary>
    [Fact]
    public void AZoneOfStagnoBeginsWhereItIsSet() =>
        Assert.Equal(12.5, Loads(new EquationChoices { StagnoBounds = [0.5, 0.72, 0.79, 0.86, 0.93] }, Sex.Male, (95, 10))[3]);

    /// <summary>By hand: load 40 % of the maximum, twofold .8, threefold the whole pool; the low value takes the load itself.</summary>
    [Fact]
    public void FastRepetitionsCountTheirLoadSoManyTimes()
    {
        Assert.Equal(0.8, Fast(2), 1e-12);
        Assert.Equal(1, Fast(3));
    }

    [Fact]
    public void EveryMethodSpeaksThroughTheComputation()
    {
        var heartRate = Given.EverySecond((Channel.HeartRate, Given.Steps((150, 1200))));
        var recording = Given.Recording("cycling", heartRate);
        var (usual, other) = (Computed(recording, new()), Computed(recording, new() { Equations = new() { EdwardsWeights = [2, 4, 6, 8, 10] } }));

        Assert.Equal(2 * usual.Single(one => one.Name == "edwards_load").Value, other.Single(one => one.Name == "edwards_load").Value, 1e-6);
        Assert.Equal(usual.Where(one => one.Name != "edwards_load"), other.Where(one => one.Name != "edwards_load"));
    }

    [Fact]
    public void AListOfAnotherLengthOrBeyondItsBoundsIsRefused()
    {
        var weights = new NumbersAttribute(3, 0, 100);
        var bounds = new NumbersAttribute(2, 0, 1) { IsRising = true };

        Assert.True(weights.IsValid(new double[] { 3, 0, 100 }));
        Assert.All(new double[][] { [], [1, 2], [1, 2, 101], [-1, 2, 3], [1, 2, double.NaN] }, list => Assert.False(weights.IsValid(list)));
        Assert.True(bounds.IsValid(new double[] { 0.5, 0.6 }));
        Assert.False(bounds.IsValid(new double[] { 0.6, 0.6 }));
    }

    private static IReadOnlyList<Quantity> Computed(Recording recording, ComputationSettings settings) =>
        ActivityComputation.Compute(recording, Given.Person(), Given.Anchors(Heart), settings).Quantities;

    /// <summary>Banister, Edwards, Lucia, Stagno.</summary>
    private static double[] Loads(EquationChoices equations, Sex? sex, params (int Bpm, double Minutes)[] bins)
    {
        var (quantities, _) = HeartRateLoads.Of(Given.Histogram(bins), Given.Date, Given.Person(sex), Given.Anchors(Heart), equations);
        return [.. new[] { "banister_trimp", "edwards_load", "lucia_load", "stagno_load" }.Select(name => quantities.Single(one => one.Name == name).Value)];
    }

    private static double Fast(double factor)
    {
        var set = Given.Set("squat", 5, 40) with { IsFast = true };
        var maximum = Given.Anchors(Given.Anchor(AnchorKind.OneRepetitionMax, 100, exercise: "squat"));
        return SetDemand.Of(set, Given.Date, "p1", maximum, new() { FastLoadFactor = factor }).Demand!.Drives(Variant.Mid).First();
    }
}
