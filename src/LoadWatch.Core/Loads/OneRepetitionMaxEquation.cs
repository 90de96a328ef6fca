namespace LoadWatch.Loads;

/// <summary>By which published relation repetitions to failure tell the share of the maximum. w load, r repetitions.</summary>
public enum OneRepetitionMaxEquation
{
    /// <summary>The training load chart of the National Strength and Conditioning Association.</summary>
    LoadChart,

    /// <summary>w (1 + r / 30). Epley 1985, Poundage chart.</summary>
    Epley,

    /// <summary>36 w / (37 - r). Brzycki 1993, Strength testing: predicting a one-rep max from reps-to-fatigue, J Phys Educ Recreat Dance 64:88-90.</summary>
    Brzycki,

    /// <summary>100 w / (101.3 - 2.67123 r). Lander 1985, Maximum based on reps (from memory).</summary>
    Lander,

    /// <summary>100 w / (52.2 + 41.9 exp(-0.055 r)). Mayhew et al. 1992, Relative muscular endurance performance as a predictor of bench press strength.</summary>
    Mayhew,

    /// <summary>100 w / (48.8 + 53.8 exp(-0.075 r)). Wathan 1994, Load assignment.</summary>
    Wathan,
}
