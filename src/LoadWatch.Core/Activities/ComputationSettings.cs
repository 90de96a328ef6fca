using LoadWatch.Quality;
using LoadWatch.Stimulus;

namespace LoadWatch.Activities;

/// <summary>What a user may set of the computation, each at its default.</summary>
public sealed record ComputationSettings
{
    /// <summary>Share of the sampled time that must hold a usable reading before a channel gives a load or a stimulus, 0 to 1. A
    /// choice.</summary>
    public double UsableShareWanted { get; init; } = 0.5;

    /// <summary>From when on a reading is none.</summary>
    public QualityLimits Quality { get; init; } = new();

    /// <summary>Equations and those of their constants that are from memory.</summary>
    public EquationChoices Equations { get; init; } = new();

    /// <summary>Inner bounds of the heart-rate zones as fractions of heart-rate reserve where thresholds are not anchored (ACSM classes,
    /// Garber 2011).</summary>
    public IReadOnlyList<double> HeartRateReserveBounds { get; init; } = [0.30, 0.40, 0.60, 0.90];

    /// <summary>Inner bounds of the power zones as fractions of critical power. A choice.</summary>
    public IReadOnlyList<double> PowerBounds { get; init; } = [0.65, 0.85, 1.00, 1.15];

    /// <summary>Inner bounds of the speed zones, m/s. Common practice, no consensus (Gualtieri 2023).</summary>
    public IReadOnlyList<double> SpeedBounds { get; init; } = [2, 4, 5.5, 7];

    /// <summary>Shares of the person's best speed from which distance counts apart, 0.5 to 1, rising. A choice.</summary>
    public IReadOnlyList<double> SpeedMaxShares { get; init; } = [0.8, 0.9];

    /// <summary>Body regions by exercise word in canonical form (<see cref="Recordings.ExerciseWord"/>). An exercise that is not here is asked for, not guessed.</summary>
    public IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> Exercises { get; init; } = DefaultRegions.Exercises;

    /// <summary>Body regions that endurance channels speak for, by sport name.</summary>
    public IReadOnlyDictionary<string, IReadOnlyList<BodyRegion>> Sports { get; init; } = DefaultRegions.Sports;
}
