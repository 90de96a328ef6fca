namespace LoadWatch.Stimulus;

/// <summary>By which rule a set is read, best evidence first. The table is in <see cref="SetDemand.Of"/>.</summary>
public enum SetRule
{
    /// <summary>Load over the anchored maximum; with a reserve repetition by repetition, without it a lower bound.</summary>
    LoadAndMaximum,

    /// <summary>Load by the chart, or the equation chosen instead, from repetitions done and in reserve.</summary>
    Chart,

    /// <summary>Measured or declared fast, with load and maximum.</summary>
    Fast,

    /// <summary>Declared fast, and nothing else known of it.</summary>
    DeclaredFast,

    /// <summary>Held, by its rating.</summary>
    Hold,
}
