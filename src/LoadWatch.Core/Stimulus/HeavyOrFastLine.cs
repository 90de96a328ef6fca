namespace LoadWatch.Stimulus;

/// <summary>What makes work of a region heavy or fast: 3 hard bouts, or 6 hard repetitions in at least 2 sets. A choice.</summary>
public static class HeavyOrFastLine
{
    /// <summary>Hard bouts that make a session heavy or fast by themselves, count.</summary>
    public const double Bouts = 3;

    private const double Repetitions = 6;
    private const int Sets = 2;

    /// <summary>Counts are mid values, compared after rounding to 9 digits.</summary>
    public static bool Reached(double bouts, double repetitions, int sets) =>
        Significant.Round(bouts) >= Bouts || (Significant.Round(repetitions) >= Repetitions && sets >= Sets);
}
