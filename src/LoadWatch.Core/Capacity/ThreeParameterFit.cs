namespace LoadWatch.Capacity;

/// <summary>
/// t = W' / (P - CP) + k by least squares in t, after Morton 1996, "A 3-parameter critical power model", Ergonomics 39:611-619: k, s, below 0, is the asymptote of
/// time, so that power ends at P_max = CP - W' / k instead of rising without end. For a given CP the rest is a straight line of t on x = 1 / (P - CP).
/// With submaximal or few trials the third parameter often degenerates; then there is none.
/// </summary>
/// <param name="Fit">CP and W' with their errors.</param>
/// <param name="AsymptoteSeconds">k, below 0.</param>
/// <param name="Maximum">P_max, W, or the highest speed, m/s.</param>
public sealed record ThreeParameterFit(CapacityFit Fit, double AsymptoteSeconds, double Maximum)
{
    /// <summary>Null with fewer than three trials, with one that has no time or mean above 0, where the squares have no least value inside, and where k is not below 0.</summary>
    public static ThreeParameterFit? Of(IReadOnlyCollection<Trial> trials)
    {
        if (!Trial.AreUsable(trials, 3)
            || CriticalSearch.Least(trials, critical => Residuals(trials, critical)) is not { } critical
            || Line(trials, critical) is not { Intercept: < 0, Slope: > 0 } line)
        {
            return null;
        }

        var errors = CurvatureErrors.Of(
            [.. trials.Select(trial => new[] { line.Slope * Math.Pow(trial.Mean - critical, -2), 1 / (trial.Mean - critical), 1 })], Residuals(trials, critical));
        return new ThreeParameterFit(
            new CapacityFit(critical, line.Slope, errors?[0], errors?[1]), line.Intercept, critical - (line.Slope / line.Intercept));
    }

    private static double[] Residuals(IReadOnlyCollection<Trial> trials, double critical) => Line(trials, critical) is { } line
        ? [.. trials.Select(trial => trial.Seconds - line.Intercept - (line.Slope / (trial.Mean - critical)))]
        : [.. trials.Select(_ => double.NaN)];

    private static LeastSquares? Line(IReadOnlyCollection<Trial> trials, double critical) =>
        LeastSquares.Of([.. trials.Select(trial => 1 / (trial.Mean - critical))], [.. trials.Select(trial => trial.Seconds)]);
}
