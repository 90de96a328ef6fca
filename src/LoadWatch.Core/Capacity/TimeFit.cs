namespace LoadWatch.Capacity;

/// <summary>
/// t = W' / (P - CP) by least squares in t: the limit of time is what is observed, so its errors are made small. For a given CP the best W' is sum(t x) / sum(x^2)
/// with x = 1 / (P - CP); CP is where the squares that are left are least, between 0 and the smallest P.
/// Errors: s^2 (J'J)^-1 with the derivatives J of t, s^2 = squares left / (n - 2).
/// </summary>
public static class TimeFit
{
    /// <summary>Null with fewer than two trials, with one that has no time or mean above 0, and where the squares have no least value inside.</summary>
    public static CapacityFit? Of(IReadOnlyCollection<Trial> trials)
    {
        if (!Trial.AreUsable(trials, 2) || CriticalSearch.Least(trials, critical => Residuals(trials, critical)) is not { } critical)
        {
            return null;
        }

        var reserve = Reserve(trials, critical);
        var errors = ParameterCovariance.Of(
            [.. trials.Select(trial => new[] { reserve * Math.Pow(trial.Mean - critical, -2), 1 / (trial.Mean - critical) })], Residuals(trials, critical));
        return double.IsFinite(reserve) ? new CapacityFit(critical, reserve, errors?.Error(0), errors?.Error(1)) : null;
    }

    private static double[] Residuals(IReadOnlyCollection<Trial> trials, double critical)
    {
        var reserve = Reserve(trials, critical);
        return [.. trials.Select(trial => trial.Seconds - (reserve / (trial.Mean - critical)))];
    }

    private static double Reserve(IReadOnlyCollection<Trial> trials, double critical)
    {
        var (tx, xx) = (0.0, 0.0);
        foreach (var trial in trials)
        {
            var x = 1 / (trial.Mean - critical);
            tx += trial.Seconds * x;
            xx += x * x;
        }

        return tx / xx;
    }
}
