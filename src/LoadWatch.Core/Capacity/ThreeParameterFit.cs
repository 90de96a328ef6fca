namespace LoadWatch.Capacity;

/// <summary>
/// t = W' / (P - CP) + k by least squares in t, after Morton 1996, "A 3-parameter critical power model", Ergonomics 39:611-619: k, s, below 0, is the asymptote of
/// time, so that power ends at P_max = CP - W' / k instead of rising without end. For a given CP the rest is a straight line of t on x = 1 / (P - CP).
/// With submaximal or few trials the third parameter often degenerates; then there is none.
/// Errors: of CP, W' and k by their covariance; of P_max by the delta method with its gradient (1, -1 / k, W' / k^2), since the three are far from independent.
/// </summary>
/// <param name="Fit">CP and W' with their errors.</param>
/// <param name="AsymptoteSeconds">k, below 0.</param>
/// <param name="Maximum">P_max, W, or the highest speed, m/s.</param>
/// <param name="AsymptoteError">Standard error of k, s; null where the trials are no more than the parameters.</param>
/// <param name="MaximumError">Standard error of P_max, W or m/s; null likewise.</param>
public sealed record ThreeParameterFit(CapacityFit Fit, double AsymptoteSeconds, double Maximum, double? AsymptoteError, double? MaximumError)
{
    /// <summary>k nearer to 0 is the last digits of two parameters that fit as they are.</summary>
    private const double HighestAsymptoteSeconds = -1e-3;

    /// <summary>Null with fewer than three trials, with one that has no time or mean above 0, where the squares have no least value inside, and where k is not below 0.</summary>
    public static ThreeParameterFit? Of(IReadOnlyCollection<Trial> trials)
    {
        if (!Trial.AreUsable(trials, 3)
            || CriticalSearch.Least(trials, critical => Residuals(trials, critical)) is not { } critical
            || Line(trials, critical) is not { Intercept: < HighestAsymptoteSeconds, Slope: > 0 } line)
        {
            return null;
        }

        var (reserve, asymptote) = (line.Slope, line.Intercept);
        var errors = ParameterCovariance.Of(
            [.. trials.Select(trial => new[] { reserve * Math.Pow(trial.Mean - critical, -2), 1 / (trial.Mean - critical), 1 })], Residuals(trials, critical));
        return new ThreeParameterFit(
            new CapacityFit(critical, reserve, errors?.Error(0), errors?.Error(1)),
            asymptote,
            critical - (reserve / asymptote),
            errors?.Error(2),
            errors?.ErrorOf([1, -1 / asymptote, reserve / (asymptote * asymptote)]));
    }

    private static double[] Residuals(IReadOnlyCollection<Trial> trials, double critical) => Line(trials, critical) is { } line
        ? [.. trials.Select(trial => trial.Seconds - line.Intercept - (line.Slope / (trial.Mean - critical)))]
        : [.. trials.Select(_ => double.NaN)];

    private static LeastSquares? Line(IReadOnlyCollection<Trial> trials, double critical) =>
        LeastSquares.Of([.. trials.Select(trial => 1 / (trial.Mean - critical))], [.. trials.Select(trial => trial.Seconds)]);
}
