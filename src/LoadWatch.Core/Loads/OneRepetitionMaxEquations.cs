using LoadWatch.Stimulus;

namespace LoadWatch.Loads;

/// <summary>
/// The share of the one-repetition maximum that allows so many repetitions to failure, and the other way round the maximum from a set. Sources: <see
/// cref="OneRepetitionMaxEquation"/>. Error in direct tests at 85 % of the maximum: 10.6 to 13.5 % of the mean; it grows with repetitions, so beyond
/// 12 none of them is asked. Departure: one repetition to failure is the maximum itself, where some of the lines say a little more.
/// </summary>
public static class OneRepetitionMaxEquations
{
    public const double MostRepetitions = 12;

    /// <summary>Above 0, at most 1; null outside 1 to 12 repetitions.</summary>
    /// <param name="repetitionsToFailure">Done and in reserve together.</param>
    public static double? Share(this OneRepetitionMaxEquation equation, double repetitionsToFailure) => repetitionsToFailure switch
    {
        _ when equation == OneRepetitionMaxEquation.LoadChart => LoadChart.Share(repetitionsToFailure),
        1 => 1,
        > 1 and <= MostRepetitions => 1 / Multiple(equation, repetitionsToFailure),
        _ => null,
    };

    /// <summary>Maximum over load by the equation as printed; the chart has none.</summary>
    public static double Multiple(OneRepetitionMaxEquation equation, double repetitions) => equation switch
    {
        OneRepetitionMaxEquation.Epley => 1 + (repetitions / 30),
        OneRepetitionMaxEquation.Brzycki => 36 / (37 - repetitions),
        OneRepetitionMaxEquation.Lander => 100 / (101.3 - (2.67123 * repetitions)),
        OneRepetitionMaxEquation.Mayhew => 100 / (52.2 + (41.9 * Math.Exp(-0.055 * repetitions))),
        OneRepetitionMaxEquation.Wathan => 100 / (48.8 + (53.8 * Math.Exp(-0.075 * repetitions))),
        _ => throw new ArgumentOutOfRangeException(nameof(equation), equation, "is no equation"),
    };
}
