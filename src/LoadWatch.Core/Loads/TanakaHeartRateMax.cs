namespace LoadWatch.Loads;

/// <summary>
/// Maximal heart rate from age. Source: Tanaka, Monahan and Seals 2001, Age-predicted maximal heart rate revisited, J Am Coll Cardiol
/// 37:153-156.
/// HRmax = 208 - 0.7 age; age in years, result in bpm. Single people differ by about 10 bpm (standard deviation, from memory).
/// </summary>
public static class TanakaHeartRateMax
{
    private const int Oldest = 120;

    /// <summary>Beats per minute, or null outside 0 to 120 years.</summary>
    public static double? Of(int ageYears) => ageYears is >= 0 and <= Oldest ? 208 - (0.7 * ageYears) : null;
}
