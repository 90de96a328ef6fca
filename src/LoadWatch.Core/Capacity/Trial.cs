namespace LoadWatch.Capacity;

/// <summary>An effort that could have gone on no longer, or is taken for one.</summary>
/// <param name="Seconds">How long it lasted, above 0.</param>
/// <param name="Done">What was done in that time: work, J, of power; distance, m, of speed.</param>
public readonly record struct Trial(double Seconds, double Done)
{
    /// <summary>Mean power, W, or speed, m/s.</summary>
    public double Mean => Done / Seconds;

    public static Trial OfMean(double seconds, double mean) => new(seconds, seconds * mean);

    /// <summary>Whether trials can be fitted at all: so many at least, each with a time and a mean above 0.</summary>
    internal static bool AreUsable(IReadOnlyCollection<Trial> trials, int fewest) =>
        trials.Count >= fewest && trials.All(trial => double.IsFinite(trial.Seconds) && double.IsFinite(trial.Done) && trial is { Seconds: > 0, Done: > 0 });
}
