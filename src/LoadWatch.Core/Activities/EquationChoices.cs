using System.ComponentModel.DataAnnotations;
using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.People;

namespace LoadWatch.Activities;

/// <summary>
/// Which published equations are used, and those of their constants that nobody here has read in the source: from memory or from pages that quote it, and
/// for that reason not fixed.
/// </summary>
public sealed record EquationChoices
{
    /// <summary>Estimates a maximal heart rate from age where none is anchored: tanaka, nes, gellish (from memory), gulati (of women only, of others tanaka) or sydo.</summary>
    public HeartRateMaxEquation HeartRateMaxByAge { get; init; } = HeartRateMaxEquation.Tanaka;

    /// <summary>How far a heart rate of own sessions may lie above that of age and still be taken for a maximum, bpm; beyond it is a strap's fault. Three standard deviations of
    /// the equations (about 10, from memory). 10 to 60.</summary>
    [Range(10.0, 60.0)]
    public double HeartRateAboveEquation { get; init; } = 30;

    /// <summary>Tells the share of the maximum from repetitions to failure: load_chart, epley, brzycki, lander (from memory), mayhew or wathan.</summary>
    public OneRepetitionMaxEquation OneRepetitionMaxByRepetitions { get; init; } = OneRepetitionMaxEquation.LoadChart;

    /// <summary>From which step cadence walking is moderate and vigorous: rounded (100 and 130 steps a minute) or by_age (the regressions behind them).</summary>
    public StepCadenceLine StepCadence { get; init; } = StepCadenceLine.Rounded;

    /// <summary>Factor and exponent of Banister's training impulse for men, each 0 to 10. From secondary pages that agree.</summary>
    [Numbers(2, 0, 10)]
    public IReadOnlyList<double> BanisterMen { get; init; } = [0.64, 1.92];

    /// <summary>The same for women.</summary>
    [Numbers(2, 0, 10)]
    public IReadOnlyList<double> BanisterWomen { get; init; } = [0.86, 1.67];

    /// <summary>Weights of the five zones of Edwards, each 0 to 100. From memory.</summary>
    [Numbers(5, 0, 100)]
    public IReadOnlyList<double> EdwardsWeights { get; init; } = [1, 2, 3, 4, 5];

    /// <summary>Weights of the three zones of Lucia, each 0 to 100. From memory.</summary>
    [Numbers(3, 0, 100)]
    public IReadOnlyList<double> LuciaWeights { get; init; } = [1, 2, 3];

    /// <summary>Lower bounds of the five zones of Stagno, fractions of maximal heart rate, each 0 to 1, rising. From memory.</summary>
    [Numbers(5, 0, 1, IsRising = true)]
    public IReadOnlyList<double> StagnoBounds { get; init; } = [0.65, 0.72, 0.79, 0.86, 0.93];

    /// <summary>Weights of the five zones of Stagno, each 0 to 100. From memory.</summary>
    [Numbers(5, 0, 100)]
    public IReadOnlyList<double> StagnoWeights { get; init; } = [1.25, 1.71, 2.54, 3.61, 5.16];

    /// <summary>The standard deviation that monotony divides by: sample (over n - 1) or population (over n). A choice: the source that could be read does not say.</summary>
    public LoadDeviation MonotonyDeviation { get; init; } = LoadDeviation.Sample;

    /// <summary>How many times its load a repetition counts that was fast: units join a ballistic contraction at a third of the force (from memory). 1 to 5.</summary>
    [Range(1.0, 5.0)]
    public double FastLoadFactor { get; init; } = 3;

    /// <summary>Mean speed of the lifting phase, m/s, from which a set with a measured speed is fast; a slower one is not, whatever was declared. A choice: about what
    /// 60 % of the maximum, the heaviest of power training, reaches at most (0.8 m/s in the bench press, from memory). 0.2 to 3.</summary>
    [Range(0.2, 3.0)]
    public double FastBarSpeed { get; init; } = 0.8;
}
