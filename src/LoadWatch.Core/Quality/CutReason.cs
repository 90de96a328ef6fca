namespace LoadWatch.Quality;

/// <summary>Why something of a recording does not count. A reading has one reason at most.</summary>
public enum CutReason
{
    /// <summary>No reading where rows go on: the sensor was lost. A reading may stand for 10 s; what is left open beyond is this.</summary>
    NoReading,

    /// <summary>Outside what can be true at all (<see cref="Activities.ChannelLimits"/>): a sensor's code for a lost contact, nonsense.</summary>
    OutOfRange,

    /// <summary>The table's own cell of quality says that it was received too badly.</summary>
    MarkedBad,

    /// <summary>Away and back again faster than the thing that is measured can change.</summary>
    Spike,

    /// <summary>The same value for long while the load varied: the sensor hung.</summary>
    FlatLine,

    /// <summary>Heart rate that follows steps or pedal strokes instead of the heart.</summary>
    LockedToCadence,

    /// <summary>Heart rate further above the person's maximum than a maximum can be wrong.</summary>
    AboveMaximum,

    /// <summary>Time without rows.</summary>
    Gap,

    /// <summary>Time during which the timer stood, with rows or without.</summary>
    TimerStopped,

    /// <summary>Before or after the session that the plan has.</summary>
    OutsidePlan,

    /// <summary>Rows without a time.</summary>
    Undated,

    /// <summary>Rows with a time before that of the row above; they count in their place.</summary>
    OutOfOrder,

    /// <summary>Rows with the time of another; the last of one time stands for what follows.</summary>
    SameTime,
}
