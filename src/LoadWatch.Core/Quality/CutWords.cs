namespace LoadWatch.Quality;

/// <summary>How a reason is told, and what its share is of.</summary>
public static class CutWords
{
    public static string Of(CutReason reason) => reason switch
    {
        CutReason.NoReading => "no reading",
        CutReason.OutOfRange => "outside what can be true",
        CutReason.MarkedBad => "marked as bad by the file itself",
        CutReason.Spike => "away and back faster than it can change",
        CutReason.FlatLine => "one value while the load varied",
        CutReason.LockedToCadence => "follows the cadence",
        CutReason.AboveMaximum => "too far above the person's maximum",
        CutReason.Gap => "no rows",
        CutReason.TimerStopped => "the timer stood",
        CutReason.OutsidePlan => "outside the planned session",
        CutReason.Undated => "rows without a time",
        CutReason.OutOfOrder => "rows before the row above",
        CutReason.SameTime => "rows with the time of another",
        _ => throw new ArgumentOutOfRangeException(nameof(reason)),
    };

    /// <summary><c>sampled time</c>, <c>time from first row to last</c> or <c>rows</c>.</summary>
    public static string WholeOf(CutReason reason) => reason switch
    {
        CutReason.Gap or CutReason.TimerStopped or CutReason.OutsidePlan => "time from first row to last",
        CutReason.Undated or CutReason.OutOfOrder or CutReason.SameTime => "rows",
        _ => "sampled time",
    };
}
