namespace LoadWatch.Capacity;

/// <summary>W = W' + CP t: work on time, or d = D' + CS t, distance on time. W, work done until the limit, J; t, time to it, s.</summary>
public static class WorkTimeFit
{
    /// <summary>Null with fewer than two trials, where none differs in time, and where a trial has no time or mean above 0.</summary>
    public static CapacityFit? Of(IReadOnlyCollection<Trial> trials) =>
        Trial.AreUsable(trials, 2) && LeastSquares.Of([.. trials.Select(trial => trial.Seconds)], [.. trials.Select(trial => trial.Done)]) is { } line
            ? new CapacityFit(line.Slope, line.Intercept, line.SlopeError, line.InterceptError, line.RSquared)
            : null;
}
