using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>
/// Hard days in a row. Takes every day in order. Once the row was long enough, a day between the two factors neither counts nor ends it; what is told is the
/// last row that was long enough.
/// </summary>
/// <param name="before">The run on the day before the first date.</param>
/// <param name="rowBefore">The row that had not ended then, long enough or not.</param>
internal sealed class HardRows(HardDaysLimits limits, RunState<HardRow>? before, HardRow? rowBefore)
{
    private readonly FindingRun<HardRow> run = new(limits.OnDays, limits.OffDays, before);
    private readonly Queue<double?> window = [];
    private readonly RunningMedian training = new();
    private HardRow? row = rowBefore;

    /// <summary>The row that is long enough and has not ended; null where there is none.</summary>
    public HardRow? Standing => run.Since is null ? null : run.Reading;

    /// <summary>The row that has not ended, long enough or not.</summary>
    public HardRow? Row => row;

    public RunState<HardRow>? State => run.State;

    /// <param name="muted">The load of the day rests on a sensor that failed: it counts as unknown.</param>
    public void Pass(Day day, bool muted)
    {
        var median = training.Count >= limits.TrainingDaysWanted ? training.Value : null;
        if (day.Load is { } load && median is { } usual && !muted)
        {
            Count(day.Date, load, usual);
        }
        else
        {
            row = Standing is not null && row is not null ? row with { UnknownDays = row.UnknownDays + 1 } : null;
        }

        Learn(day);
    }

    private void Count(LocalDate date, double load, double median)
    {
        var hard = load > Significant.Round(limits.MedianFactor * median);
        var between = Standing is not null && load > Significant.Round(Math.Min(limits.ReturnFactor, limits.MedianFactor) * median);
        row = hard ? new HardRow(date, (row?.Days ?? 0) + 1, row?.UnknownDays ?? 0, load, median, training.Count) : between ? row : null;
        var isLong = row?.Days >= limits.Days;
        run.Read(date, isLong ? row! : Standing ?? new HardRow(date, 0, 0, load, median, training.Count), isLong, hard || between);
    }

    /// <summary>A day before the first date.</summary>
    public void Learn(Day day)
    {
        var load = day is { State: DayState.Recorded, Load: > 0 } ? day.Load : null;
        training.Add(load);
        window.Enqueue(load);
        if (window.Count > limits.LookBackDays)
        {
            training.Remove(window.Dequeue());
        }
    }
}

/// <summary>Hard days in a row as they stood on the last one.</summary>
/// <param name="Days">Known hard days, count.</param>
/// <param name="UnknownDays">Days between them of which the load is not known; 0 before the row was long enough, since there they end the count.</param>
/// <param name="Load">Of the last of them, in the group's unit.</param>
/// <param name="Median">Load of the median training day, in the group's unit.</param>
internal sealed record HardRow(LocalDate UpTo, int Days, int UnknownDays, double Load, double Median, int TrainingDays);
