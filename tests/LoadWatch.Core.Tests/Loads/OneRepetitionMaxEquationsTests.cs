using CsCheck;

namespace LoadWatch.Loads;

public class OneRepetitionMaxEquationsTests
{
    /// <summary>Computed by hand from the equations as printed, for a load of 100 kg; those of one repetition are not used, since that is the maximum.</summary>
    [Theory]
    [InlineData(OneRepetitionMaxEquation.Epley, 103.33, 110.00, 116.67, 126.67, 133.33, 140.00, 150.00)]
    [InlineData(OneRepetitionMaxEquation.Brzycki, 100.00, 105.88, 112.50, 124.14, 133.33, 144.00, 163.64)]
    [InlineData(OneRepetitionMaxEquation.Lander, 101.39, 107.20, 113.71, 125.11, 134.07, 144.41, 163.31)]
    [InlineData(OneRepetitionMaxEquation.Mayhew, 108.86, 113.99, 119.01, 126.29, 130.93, 135.40, 141.72)]
    [InlineData(OneRepetitionMaxEquation.Wathan, 101.30, 108.98, 116.58, 127.67, 134.75, 141.50, 150.91)]
    public void FollowsThePrintedEquation(OneRepetitionMaxEquation equation, params double[] kilograms)
    {
        double[] repetitions = [1, 3, 5, 8, 10, 12, 15];

        Assert.All(repetitions.Zip(kilograms), row => Assert.Equal(row.Second, 100 * OneRepetitionMaxEquations.Multiple(equation, row.First), 5e-3));
    }

    /// <summary>By hand: 1 + 10 / 30 = 36 / 27.</summary>
    [Fact]
    public void EpleyAndBrzyckiAgreeAtTenRepetitions() =>
        Assert.Equal(OneRepetitionMaxEquation.Epley.Share(10)!.Value, OneRepetitionMaxEquation.Brzycki.Share(10)!.Value, 1e-15);

    [Fact]
    public void OneRepetitionToFailureIsTheMaximumItself() => Assert.All(Enum.GetValues<OneRepetitionMaxEquation>(), equation => Assert.Equal(1, equation.Share(1)));

    [Theory]
    [InlineData(0.5)]
    [InlineData(12.5)]
    [InlineData(double.NaN)]
    public void OutsideOneToTwelveRepetitionsNoneIsAsked(double repetitions) =>
        Assert.All(Enum.GetValues<OneRepetitionMaxEquation>(), equation => Assert.Null(equation.Share(repetitions)));

    [Fact]
    public void MoreRepetitionsNeverMeanAHeavierShare() =>
        Gen.Select(Gen.Enum<OneRepetitionMaxEquation>(), Gen.Double[1, 12], Gen.Double[1, 12]).Sample((equation, one, other) =>
            equation.Share(Math.Max(one, other)) <= equation.Share(Math.Min(one, other)) && equation.Share(one) is > 0 and <= 1);

    /// <summary>By hand: 5 done and 5 in reserve; by the chart 75 %, by Epley 1 / (1 + 10 / 30), so 75 kg are 100 kg by both; 3 and 2 are 87 % and 6 / 7.</summary>
    [Fact]
    public void TheChosenEquationMakesTheMaximumOfASet()
    {
        Assert.Equal(100, OneRepetitionMaxEstimate.KilogramsOf(Given.Set("squat", 5, 75, 5), OneRepetitionMaxEquation.Epley));
        Assert.Equal(100, OneRepetitionMaxEstimate.KilogramsOf(Given.Set("squat", 3, 87, 2), OneRepetitionMaxEquation.LoadChart));
        Assert.Equal(101.5, OneRepetitionMaxEstimate.KilogramsOf(Given.Set("squat", 3, 87, 2), OneRepetitionMaxEquation.Epley));
    }
}
