// Exponentially weighted average E = lambda L + (1 - lambda) E', lambda = 2 / (N + 1).
// Williams, West, Cross and Stokes 2017, Br J Sports Med 51:209-210 (N = 7 and 28 days; lambda from secondary pages that agree).
// E: average, load per day; E': of the day before; L: load of the day; N: days. Departures, all a choice: it starts at the first known load;
// an unknown day leaves it as it was; the value rounded to 9 digits is the one that goes on, so a series can be taken up from any stored day.
namespace LoadWatch.Days;

/// <summary>One running average over days. Takes every date in order.</summary>
/// <param name="days">N, days.</param>
internal sealed class WeightedAverage(int days)
{
    private readonly double weight = 2.0 / (days + 1);
    private double? value;

    /// <summary>Takes up a series behind a day of this average.</summary>
    public void GoOnFrom(double? average) => value = average;

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
