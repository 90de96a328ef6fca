namespace LoadWatch.Capacity;

/// <summary>
/// Finds the critical value between 0 and the smallest mean of the trials at which the squares left of t are least. The other parameters are at their best for each
/// value tried, so the slope of the squares is -2 W' sum(r x^2) with the residuals r and x = 1 / (P - CP): a look at even steps, then halving where it changes its sign.
/// </summary>
internal static class CriticalSearch
{
    private const int Steps = 1000;

    /// <summary>Null where the least value lies at an end.</summary>
    /// <param name="residuals">Of t, s, in the order of the trials, for a critical value.</param>
    public static double? Least(IReadOnlyCollection<Trial> trials, Func<double, double[]> residuals)
    {
        var step = trials.Min(trial => trial.Mean) / Steps;
        var squares = Enumerable.Range(0, Steps).Select(at => residuals(at * step).Sum(residual => residual * residual)).ToList();
        var least = Enumerable.Range(0, Steps).MinBy(at => double.IsNaN(squares[at]) ? double.PositiveInfinity : squares[at]);
        var (low, high) = ((least - 1) * step, (least + 1) * step);
        if (least == 0 || least == Steps - 1 || !(Fall(trials, residuals, low) > 0) || !(Fall(trials, residuals, high) < 0))
        {
            return null;
        }

        while ((low + high) / 2 is var middle && middle > low && middle < high)
        {
            (low, high) = Fall(trials, residuals, middle) > 0 ? (middle, high) : (low, middle);
        }

        return low;
    }

    /// <summary>Above 0 where the squares still fall as the critical value rises.</summary>
    private static double Fall(IReadOnlyCollection<Trial> trials, Func<double, double[]> residuals, double critical) =>
        trials.Zip(residuals(critical), (trial, residual) => residual * Math.Pow(trial.Mean - critical, -2)).Sum();
}
