// Monotony = mean / standard deviation of 7 daily loads; strain = load of the week x monotony.
// Foster 1998, Med Sci Sports Exerc 30:1164-1168.
// Rest days count as 0. Departures: nothing that could be read says which standard deviation, so it is a choice (LoadDeviation), n - 1 by default; equal
// loads have none, so no monotony; one unknown day leaves both unknown.
namespace LoadWatch.Days;

/// <summary>How evenly the load of a week is spread.</summary>
internal static class LoadSpread
{
    private const int Days = 7;

    /// <summary>Of the last 7 loads, dimensionless; null unless all are known and they differ, by more than a number can hold the square of.</summary>
    /// <param name="loads">Oldest first.</param>
    public static double? Monotony(ReadOnlySpan<double?> loads, LoadDeviation over)
    {
        if (LoadWindow.Of(loads, 0, Days) is not { Known: Days } week || AllEqual(loads[^Days..]))
        {
            return null;
        }

        var mean = week.Sum / Days;
        var squares = 0.0;
        foreach (var load in loads[^Days..])
        {
            squares += (load!.Value - mean) * (load.Value - mean);
        }

        var deviation = Math.Sqrt(squares / (over == LoadDeviation.Sample ? Days - 1 : Days));
        return deviation > 0 && double.IsFinite(deviation) ? Significant.Round(mean / deviation) : null;
    }

    /// <summary>In the load's unit; null without monotony.</summary>
    public static double? Strain(double? weekLoad, double? monotony) => Significant.Round(weekLoad * monotony);

    private static bool AllEqual(ReadOnlySpan<double?> loads) => !loads.ContainsAnyExcept(loads[0]);
}
