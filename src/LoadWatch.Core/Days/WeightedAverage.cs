// Exponentially weighted average E = lambda L + (1 - lambda) E', lambda = 2 / (N + 1).
// Williams et al. 2017, "Better way to determine the acute:chronic workload ratio?" (N = 7 and 28 days).
// E: average, load per day; E': of the day before; L: load of the day; N: days. Departures, all a choice: it starts at the first known load;
// an unknown day leaves it as it was; the value rounded to 9 digits is the one that goes on, so a series can be taken up from any stored day.
namespace LoadWatch.Days;

/// <summary>One running average over days. Takes every date in order.</summary>
/// <param name="days">N, days.</param>
internal sealed class WeightedAverage(int days)
{
    private readonly double weight = 2.0 / (days + 1);
    private double? value;

    /// <summary>The average with this day, load per day; null before the first known load.</summary>
    public double? Add(double? load)
    {
        if (load is { } known)
        {
            value = Significant.Round(value is { } before ? (weight * known) + ((1 - weight) * before) : known);
        }

        return value;
    }
}
