namespace LoadWatch.Loads;

/// <summary>Which of the published step cadences stand for moderate and vigorous effort.</summary>
public enum StepCadenceLine
{
    /// <summary>The round numbers that the authors settled on for every age from 21 to 85 years: 100 and 130 steps a minute.</summary>
    Rounded,

    /// <summary>Those of the regressions, by age; the round ones below 21 and above 85 years and where the year of birth is not known.</summary>
    ByAge,
}
