using LoadWatch.Activities;
using LoadWatch.People;

namespace LoadWatch.Loads;

/// <summary>
/// Training impulse, summed over samples. Sources: Morton, Fitz-Clarke and Banister 1990, Modeling human performance in running, J Appl Physiol
/// 69:1171-1177; Banister 1991, Modeling elite athletic performance (from memory). The coefficients are those of several secondary pages that agree.
/// Load = sum of D x a exp(b x): D minutes at fraction x of heart-rate reserve (0 to 1, clamped), a = 0.64 and b = 1.92 for men, a = 0.86 and b = 1.67
/// for women, configurable as pairs (<see cref="EquationChoices"/>).
/// Departures: summed over the histogram instead of taken at the session's mean, which under-counts intervals because the weight is convex
/// in x;
/// where the sex is not stated, the mean of the two pairs (a choice, marked as estimated).
/// </summary>
public static class BanisterTrimp
{
    private const double MillisecondsPerMinute = 60_000;

    /// <summary>The pair of the formula. Always used together.</summary>
    public static (double A, double B) Pair(Sex? sex, EquationChoices equations)
    {
        var (men, women) = (equations.BanisterMen, equations.BanisterWomen);
        return sex switch
        {
            Sex.Male => (men[0], men[1]),
            Sex.Female => (women[0], women[1]),
            _ => ((men[0] + women[0]) / 2, (men[1] + women[1]) / 2),
        };
    }

    /// <summary>Arbitrary units, 0 or more; null for a histogram without time.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm.</param>
    public static double? Of(Histogram heartRate, HeartRateReserve reserve, Sex? sex, EquationChoices equations)
    {
        var (a, b) = Pair(sex, equations);
        return Of(heartRate, reserve, a, b);
    }

    /// <summary>The same with a pair of one's own.</summary>
    internal static double? Of(Histogram heartRate, HeartRateReserve reserve, double a, double b)
    {
        double? load = null;
        foreach (var (bpm, milliseconds) in heartRate.Bins)
        {
            var x = reserve.Fraction(bpm);
            load = (load ?? 0) + (milliseconds / MillisecondsPerMinute * x * a * Math.Exp(b * x));
        }

        return Significant.Round(load);
    }
}
