using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>A date of the series before its trends.</summary>
/// <param name="DaysSinceRecorded">0 on a recorded date.</param>
/// <param name="Activities">Of the date, in key order.</param>
/// <param name="Plan">What plan and answers say of the date.</param>
/// <param name="Sources">The last recorded date of every source seen up to this date.</param>
internal sealed record CalendarDate(
    LocalDate Date,
    DayState State,
    string? StateSource,
    int DaysSinceRecorded,
    IReadOnlyList<ActivityOnDay> Activities,
    DayPlan Plan,
    IReadOnlyDictionary<string, LocalDate> Sources)
{
    public double? Load { get; } = DayLoad.Of(State, Adding(Activities, activity => activity.Load));

    public double? LoadError => Load is null ? null : DayLoad.ErrorOf(Adding(Activities, activity => activity.Session?.LoadError));

    /// <summary>Of the activities that add to the date, in key order.</summary>
    private static IReadOnlyList<double?> Adding(IReadOnlyList<ActivityOnDay> activities, Func<ActivityOnDay, double?> value)
    {
        if (activities.Count == 0)
        {
            return [];
        }

        var values = new List<double?>(activities.Count);
        foreach (var activity in activities)
        {
            if (activity.AddsLoad)
            {
                values.Add(value(activity));
            }
        }

        return values;
    }
}
