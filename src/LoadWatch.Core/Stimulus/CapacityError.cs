using LoadWatch.People;

namespace LoadWatch.Stimulus;

/// <summary>How far off a capacity may be, as a share of it: 2 % measured, 10 % from own data, 20 % from a population.
/// Assumptions.</summary>
public static class CapacityError
{
    public const double Measured = 0.02;

    /// <summary>Also of repetition equations and charts: 10 to 14 % of the mean (standard errors of prediction in print).</summary>
    public const double Estimated = 0.10;

    public const double Population = 0.20;

    /// <summary>Of W', whoever measured it: balances are good to about 30 %.</summary>
    public const double WPrime = 0.30;

    public static double Of(AnchorSource source) => source switch
    {
        AnchorSource.Measured => Measured,
        AnchorSource.Observed => Estimated,
        _ => Population,
    };

    /// <summary>Of a one-repetition maximum: measured on the very machine 2 %, everything else 10 %.</summary>
    /// <param name="isOfMachine">False where the maximum of the exercise alone stands in for that of a machine.</param>
    public static double OfOneRepetitionMax(AnchorSource source, bool isOfMachine = true) =>
        isOfMachine && source == AnchorSource.Measured ? Measured : Estimated;
}
