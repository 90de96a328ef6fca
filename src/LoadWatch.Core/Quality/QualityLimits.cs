namespace LoadWatch.Quality;

/// <summary>
/// From when on a reading is no reading of the person, each at its default. There is no standard: published studies clean by limits of their own. The defaults
/// are assumptions; beats that change by more than 30 bpm from one to the next were replaced in print, and cleaning of that kind took bad data from 9.0 to
/// 4.4 % of 126 hours of football (Joosen 2013).
/// </summary>
public sealed record QualityLimits
{
    /// <summary>Largest change of heart rate, bpm per second.</summary>
    public double JumpBpmPerSecond { get; init; } = 10;

    /// <summary>Largest change of heart rate within 5 s, bpm.</summary>
    public double JumpBpmInFiveSeconds { get; init; } = 25;

    /// <summary>Longest time that heart rate may show one value while the load varies, seconds.</summary>
    public int FlatSeconds { get; init; } = 60;

    /// <summary>How long heart rate must follow the cadence to be taken for it, seconds.</summary>
    public int CadenceLockSeconds { get; init; } = 30;

    /// <summary>How far above the person's maximum a heart rate may lie, bpm.</summary>
    public int AboveMaximumBpm { get; init; } = 15;
}
