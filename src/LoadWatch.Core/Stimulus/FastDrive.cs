namespace LoadWatch.Stimulus;

/// <summary>
/// Relative drive of a repetition that was fast, by a measured speed of the bar or as declared. Source: Desmedt and Godaux 1977, Ballistic contractions in man, J Physiol 264:673-693: units
/// join a ballistic contraction at about a third of the force at which they join a slow one (the third from memory, configurable as the factor 3).
/// Mid and high e = min(1, factor x L), L = load / one-repetition maximum; low e = L, since the third is not certain and
/// mostly nobody saw the speed. Read so from 30 % of the maximum, where power
/// training begins, up to the line of hard work, from which on a repetition is hard at any speed; the range in print is 30 to 60 %, the rest a choice
/// so that a heavier load never counts for less.
/// </summary>
public static class FastDrive
{
    private const double LeastLoad = 0.30;

    public static bool Applies(double relativeLoad) => Significant.Round(relativeLoad) >= LeastLoad && !HardLine.Reached(relativeLoad);

    /// <param name="factor">1 or more.</param>
    /// <returns>0 to 1.</returns>
    public static double Of(double relativeLoad, double factor, Variant variant) => Math.Min(1, variant.Side < 0 ? relativeLoad : relativeLoad * factor);

    /// <summary>Nothing but the declaration is known (jumps, throws): low none, mid just hard, high the maximum. A choice.</summary>
    public static double Declared(Variant variant) => variant.Side switch
    {
        < 0 => 0,
        0 => HardLine.Drive,
        _ => 1,
    };
}
