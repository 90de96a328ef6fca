namespace LoadWatch.Capacity;

/// <summary>P = W' / t + CP: mean power, or speed, on the inverse of time. P, W; t, time to the limit, s; W', J; CP, W. Of speed: m/s, D', m, and CS, m/s.</summary>
public static class InverseTimeFit
{
    /// <inheritdoc cref="WorkTimeFit.Of"/>
    public static CapacityFit? Of(IReadOnlyCollection<Trial> trials) =>
        Trial.AreUsable(trials, 2) && LeastSquares.Of([.. trials.Select(trial => 1 / trial.Seconds)], [.. trials.Select(trial => trial.Mean)]) is { } line
            ? new CapacityFit(line.Intercept, line.Slope, line.InterceptError, line.SlopeError, line.RSquared)
            : null;
}
