using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>The lines of step cadence are in <c>Published/EffortChecks</c>.</summary>
public class EffortMinutesTests
{
    /// <summary>By hand: 90 steps a minute for 10 min, 100 for 10, 130 for 5.</summary>
    [Fact]
    public void AWalkCountsByItsSteps() =>
        Assert.Equal(
            [new Quantity("minutes_moderate", 15, "min", Estimated: true), new Quantity("minutes_vigorous", 5, "min", Estimated: true)],
            Of("walking", Given.EverySecond((Channel.Cadence, Given.Steps((45, 600), (50, 600), (65, 300))))));

    [Fact]
    public void AStrollHasNoMinutesNotUnknownOnes() =>
        Assert.Equal((0, 0), Minutes("walking", Given.EverySecond((Channel.Cadence, Given.Steps((40, 600))))));

    /// <summary>102, 103.1 and 142.9 steps a minute, a minute each.</summary>
    [Theory]
    [InlineData(70, 2, 1)]
    [InlineData(50, 3, 1)]
    [InlineData(40, 3, 1)]
    [InlineData(20, 3, 1)]
    [InlineData(null, 3, 1)]
    public void ByAgeTheOldWalkFasterForIt(int? age, double moderate, double vigorous) =>
        Assert.Equal(
            (moderate, vigorous),
            Minutes(
                "walking",
                Given.EverySecond((Channel.Cadence, Given.Steps((51, 60), (51.55, 60), (71.45, 60)))),
                new EquationChoices { StepCadence = StepCadenceLine.ByAge },
                Given.Date.Year - age));

    /// <summary>By hand: at 1.1 m/s 3.5 + 6.6 = 10.1 mL/kg/min, 2.89 METs; at 1.2 m/s 10.7, 3.06.</summary>
    [Fact]
    public void WithoutACadenceAWalkCountsByItsSpeed() =>
        Assert.Equal((10, 0), Minutes("walking", Given.EverySecond((Channel.Speed, Given.Steps((1.1, 600), (1.2, 600))))));

    /// <summary>By hand: 1.1 m/s up 10 % is 3.5 + 6.6 + 11.88 = 21.98 mL/kg/min, 6.28 METs; the same way down counts as level, 2.89.</summary>
    [Theory]
    [InlineData(0.11, 10)]
    [InlineData(-0.11, 0)]
    public void AClimbMakesAWalkHarder(double rise, double minutes) =>
        Assert.Equal(
            (minutes, minutes),
            Minutes("hiking", Given.EverySecond((Channel.Speed, Given.Steps((1.1, 600))), (Channel.Altitude, [.. Enumerable.Range(0, 601).Select(second => second * rise)]))));

    /// <summary>A watch indoors may drift by any height: a treadmill's slope is in no recording. Nor are 9 m a climb.</summary>
    [Theory]
    [InlineData("treadmill", 0.11)]
    [InlineData(null, 0.0149)]
    public void WithoutKnownSlopesAWalkCountsAsLevel(string? detail, double rise)
    {
        var samples = Given.EverySecond((Channel.Speed, Given.Steps((1.1, 600))), (Channel.Altitude, [.. Enumerable.Range(0, 601).Select(second => second * rise)]));

        var minutes = Of(Given.Recording("walking", samples) with { Sport = new Sport("walking", detail) });

        Assert.Equal([0, 0], minutes.Select(one => one.Value));
    }

    /// <summary>By hand: at 1.3 m/s a walk, 3.5 + 7.8 = 11.3 mL/kg/min; at 1.5 m/s a run, 3.5 + 18 = 21.5, 6.14 METs.</summary>
    [Fact]
    public void ARunCountsAsOneFromEightyMetresAMinuteOn() =>
        Assert.Equal((2, 1), Minutes("running", Given.EverySecond((Channel.Speed, Given.Steps((1.3, 60), (1.5, 60))))));

    /// <summary>By hand: 3 METs of 70 kg are 22.2 W, 6 METs 89.0 W.</summary>
    [Fact]
    public void OnABicyclePowerCountsWithTheBodyMass()
    {
        var ride = Given.EverySecond((Channel.Power, Given.Steps((0, 60), (22, 60), (23, 60), (88, 60), (90, 60))));

        Assert.Equal((3, 1), Minutes("cycling", ride, anchors: Given.Anchor(AnchorKind.BodyMass, 70)));
        Assert.Empty(Of("cycling", ride));
        Assert.Empty(Of("rowing", ride, anchors: Given.Anchor(AnchorKind.BodyMass, 70)));
    }

    [Fact]
    public void ACadenceWithTooFewReadingsLeavesItToSpeed() =>
        Assert.Equal(
            (1, 1),
            Minutes("running", Given.EverySecond((Channel.Cadence, Given.Steps((80, 20), (double.NaN, 40))), (Channel.Speed, Given.Steps((3, 60))))));

    [Theory]
    [InlineData("soccer")]
    [InlineData("swimming")]
    [InlineData("generic")]
    public void ElsewhereNothingIsTold(string sport) =>
        Assert.Empty(Of(sport, Given.EverySecond((Channel.Cadence, Given.Steps((65, 60))), (Channel.Speed, Given.Steps((3, 60))))));

    private static (double Moderate, double Vigorous) Minutes(
        string sport, SampleSeries samples, EquationChoices? equations = null, int? birthYear = null, params Anchor[] anchors)
    {
        var quantities = Of(sport, samples, equations, birthYear, anchors);
        return (quantities.Single(one => one.Name == QuantityNames.MinutesModerate).Value, quantities.Single(one => one.Name == QuantityNames.MinutesVigorous).Value);
    }

    private static List<Quantity> Of(string sport, SampleSeries samples, EquationChoices? equations = null, int? birthYear = null, params Anchor[] anchors) =>
        Of(Given.Recording(sport, samples), equations, birthYear, anchors);

    private static List<Quantity> Of(Recording recording, EquationChoices? equations = null, int? birthYear = null, params Anchor[] anchors) =>
        [.. ActivityComputation.Compute(
                recording,
                Given.Person(birthYear: birthYear),
                Given.Anchors(anchors),
                new ComputationSettings { Equations = equations ?? new EquationChoices() })
            .Quantities.Where(quantity => quantity.Name.StartsWith("minutes_", StringComparison.Ordinal))];
}
