namespace LoadWatch.Loads;

/// <summary>
/// Step cadences, steps of both feet a minute, from which walking is moderate (3 METs) and vigorous (6 METs). Source: Tudor-Locke et al., Walking cadence
/// (steps/min) and intensity in 21-40 year olds (2019), in 41 to 60-year-old adults (2020), in 61-85-year-old adults (2021): CADENCE-adults, Int J Behav Nutr
/// Phys Act 16:8, 17, 18:129; abstracts read. By segmented regression 102 and 129; 101.7 and 132.1; 103.1 and 142.9; settled on in all three: 100 and 130.
/// Measured on a level treadmill, up to three quarters of the maximal heart rate by age: a hill, a load or a stiff joint asks for more at the same cadence, and
/// in the oldest the vigorous one was hardly reached.
/// </summary>
public static class StepCadence
{
    /// <param name="ageYears">Years; null where not known.</param>
    public static (double Moderate, double Vigorous) Lines(StepCadenceLine line, int? ageYears) => (line, ageYears) switch
    {
        (StepCadenceLine.ByAge, >= 21 and <= 40) => (102, 129),
        (StepCadenceLine.ByAge, >= 41 and <= 60) => (101.7, 132.1),
        (StepCadenceLine.ByAge, >= 61 and <= 85) => (103.1, 142.9),
        _ => (100, 130),
    };
}
