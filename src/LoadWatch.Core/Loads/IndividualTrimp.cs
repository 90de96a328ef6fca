using LoadWatch.Activities;

namespace LoadWatch.Loads;

/// <summary>
/// Training impulse with a person's own weighting. Source: Manzi, Iellamo, Impellizzeri, D'Ottavio and Castagna 2009, Relation between
/// individualized training impulses and performance in distance runners, Med Sci Sports Exerc 41:2090-2096 (pages from memory).
/// Load = sum of D x a exp(b x): D minutes at fraction x of heart-rate reserve (0 to 1, clamped); a and b from the person's own exponential
/// fit of blood lactate on x in an incremental test. With the pair of men it is Banister's (<see cref="BanisterTrimp"/>).
/// Departure: summed over the histogram, not taken at means.
/// </summary>
public static class IndividualTrimp
{
    /// <summary>Arbitrary units, 0 or more; null for a histogram without time.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm.</param>
    public static double? Of(Histogram heartRate, HeartRateReserve reserve, TrimpPair own) => BanisterTrimp.Of(heartRate, reserve, own.A, own.B);
}
