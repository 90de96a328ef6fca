using LoadWatch.Rows;

namespace LoadWatch.Loads;

/// <summary>
/// Mean power of standing up from a chair. Sources: Alcazar et al. 2018, The sit-to-stand muscle power test, Exp Gerontol 112:38-43 (five rises); Alcazar et al.
/// 2020, Sci Rep 10:16337 (rises in 30 s). P = 0.9 m g (0.5 h - c) / (0.5 T / n): m body mass in kg, h body height and c height of the seat in m, n rises in T
/// seconds, g = 9.81 m/s2. It takes 90 % of the body to be lifted by half the height less the seat, and half of the time to be rising.
/// </summary>
public static class SitToStandPower
{
    public const string FiveRises = "chair_stands_5";
    public const string RisesInThirtySeconds = "chair_stands_30_s";

    private const double Gravity = 9.81;
    private const double LiftedShare = 0.9;
    private const double RisingShare = 0.5;
    private const double LegShare = 0.5;

    /// <summary>Whether a test is one whose power this tells.</summary>
    public static bool IsOf(TestRow test) => test.Test is FiveRises or RisesInThirtySeconds;

    /// <summary>Watts, above 0; null for another test, one not done as described, without the height of the seat, or a seat too high for the body.</summary>
    /// <param name="bodyMassKilograms">Above 0.</param>
    /// <param name="bodyHeightMetres">Above 0.</param>
    public static double? Watts(TestRow test, double bodyMassKilograms, double bodyHeightMetres) =>
        Significant.Round(WattsPerKilogram(test, bodyHeightMetres) * bodyMassKilograms);

    /// <summary>The same over body mass, on which it does not depend.</summary>
    public static double? WattsPerKilogram(TestRow test, double bodyHeightMetres)
    {
        var rise = (LegShare * bodyHeightMetres) - test.ChairHeightMetres;
        return rise > 0 && SecondsOfARise(test) is { } seconds ? Significant.Round(LiftedShare * Gravity * rise.Value / (RisingShare * seconds)) : null;
    }

    private static double? SecondsOfARise(TestRow test) => test switch
    {
        { Outcome: not null } => null,
        { Test: FiveRises, Value: > 0 and var seconds } => seconds / 5,
        { Test: RisesInThirtySeconds, Value: >= 1 and var rises } => 30 / rises,
        _ => null,
    };
}
