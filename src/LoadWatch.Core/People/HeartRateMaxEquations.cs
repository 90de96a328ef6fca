namespace LoadWatch.People;

/// <summary>
/// Maximal heart rate from age: intercept - slope x age; age in years, result in bpm. Sources: <see cref="HeartRateMaxEquation"/>. Single people differ by about
/// 10 bpm from any of them (standard deviation, from memory; 10.8 in Nes et al. 2013), and at 80 years two of the lines by 24 bpm from each other.
/// </summary>
public static class HeartRateMaxEquations
{
    private const int Oldest = 120;

    /// <summary>Beats per minute, or null outside 0 to 120 years.</summary>
    public static double? BpmAt(this HeartRateMaxEquation equation, int ageYears, Sex? sex)
    {
        var (intercept, slope) = Line(equation, sex);
        return ageYears is >= 0 and <= Oldest ? intercept - (slope * ageYears) : null;
    }

    private static (double Intercept, double Slope) Line(HeartRateMaxEquation equation, Sex? sex) => (equation, sex) switch
    {
        (HeartRateMaxEquation.Nes, _) => (211, 0.64),
        (HeartRateMaxEquation.Gellish, _) => (207, 0.7),
        (HeartRateMaxEquation.Gulati, Sex.Female) => (206, 0.88),
        (HeartRateMaxEquation.Sydo, Sex.Male) => (220, 0.95),
        (HeartRateMaxEquation.Sydo, Sex.Female) => (210, 0.79),
        (HeartRateMaxEquation.Sydo, _) => (215, 0.87),
        _ => (208, 0.7),
    };
}
