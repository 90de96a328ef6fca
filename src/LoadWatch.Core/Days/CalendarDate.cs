using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>A date of the series before its trends.</summary>
/// <param name="Index">Days since the first date of the series.</param>
/// <param name="DaysSinceRecorded">0 on a recorded date.</param>
/// <param name="Plan">What plan and answers say of the date.</param>
/// <param name="Activities">Of the date, in key order.</param>
internal sealed record CalendarDate(
    LocalDate Date,
    int Index,
    DayState State,
    string? StateSource,
    int DaysSinceRecorded,
    IReadOnlyList<ActivityOnDay> Activities,
    DayPlan Plan)
{
    /// <summary>0 for rest; null when unknown or when one of the activities that add load has none: a part of a day is not the day.</summary>
    public double? Load => State switch
    {
        DayState.Rest => 0,
        DayState.Recorded when Adding.Any() && Adding.All(activity => activity.Load.HasValue) => Sum,
        _ => null,
    };

    private IEnumerable<ActivityOnDay> Adding => Activities.Where(activity => activity.AddsLoad);

    private double Sum => Significant.Round(Adding.Sum(activity => activity.Load!.Value));
}
