using LoadWatch.Loads;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>
/// What a set states of itself, as far as it can be so: a slip of writing counts as not stated. Source of reserve = 10 - hardness: Zourdos et al. 2016,
/// Novel resistance training-specific rating of perceived exertion scale, J Strength Cond Res 30:267-275; half points count. Far from failure
/// both are guesses, and the chart's end at 12 repetitions keeps most of those out.
/// </summary>
internal sealed record StatedSet(StrengthSet Set)
{
    private const int MostRepetitions = 1000;
    private const double MostHardness = 10;
    private const double MostConcentricSeconds = 20;
    private const double FastestBar = 10;

    /// <summary>1 or more.</summary>
    public int? Repetitions => Set.Repetitions is >= 1 and <= MostRepetitions ? Set.Repetitions : null;

    /// <summary>
    /// The load moved, above 0. Body weight (0 kg too), what hangs on it, a band and a pin's number are none: the share of the maximum that they make is
    /// unknown.
    /// </summary>
    public double? Kilograms =>
        Set.Load is SetLoad.Weight or SetLoad.Pin && Set.Kilograms is > 0 and <= SetTotals.MostKilograms ? Set.Kilograms : null;

    /// <summary>Repetitions in reserve as counted, else by hardness.</summary>
    public double? Reserve => CountedReserve ?? (MostHardness - Hardness);

    public double? CountedReserve => Set.RepetitionsInReserve is >= 0 and < double.PositiveInfinity ? Set.RepetitionsInReserve : null;

    /// <summary>0 to 10, of a hold: as rated, else 10 less the reserve.</summary>
    public double? HoldHardness => Hardness ?? (CountedReserve is { } left ? Math.Max(0, MostHardness - left) : null);

    /// <summary>Above 0.</summary>
    public double? HeldSeconds => Set.DurationSeconds is > 0 and < double.PositiveInfinity ? Set.DurationSeconds : null;

    /// <summary>Length of a repetition's lifting phase, s: 1 (an assumption) unless stated; the length of a set holds pauses and lowering too.</summary>
    public double RepetitionSeconds => Set.ConcentricSeconds is { } stated and > 0 and <= MostConcentricSeconds ? stated : 1;

    /// <summary>Mean speed of the lifting phase, m/s, above 0.</summary>
    public double? BarSpeed => Set.BarSpeedMetresPerSecond is > 0 and <= FastestBar ? Set.BarSpeedMetresPerSecond : null;

    private double? Hardness => Set.Hardness is >= 0 and <= MostHardness ? Set.Hardness : null;
}
