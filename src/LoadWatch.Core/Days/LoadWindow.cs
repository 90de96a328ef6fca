namespace LoadWatch.Days;

/// <summary>A stretch of days, summed afresh from its oldest day so that no running sum drifts.</summary>
/// <param name="Sum">Of the known loads.</param>
/// <param name="Known">Days with known load, count.</param>
/// <param name="Days">Length, days before the series included: they are not known.</param>
internal readonly record struct LoadWindow(double Sum, int Known, int Days)
{
    /// <summary>Share of the days with known load, 0 to 1.</summary>
    public double Coverage => Significant.Round((double)Known / Days);

    /// <param name="loads">Oldest first.</param>
    /// <param name="before">Newest days left out, count.</param>
    /// <param name="days">Length of the window.</param>
    public static LoadWindow Of(ReadOnlySpan<double?> loads, int before, int days)
    {
        var (sum, known) = (0.0, 0);
        for (var index = Math.Max(0, loads.Length - before - days); index < loads.Length - before; index++)
        {
            sum += loads[index].GetValueOrDefault();
            known += loads[index].HasValue ? 1 : 0;
        }

        return new LoadWindow(sum, known, days);
    }

    /// <summary>Seven times the mean of the known days; null under <paramref name="wanted"/> known days.</summary>
    public double? MeanWeek(int wanted) => Known >= wanted ? Significant.Round(7 * Sum / Known) : null;
}
