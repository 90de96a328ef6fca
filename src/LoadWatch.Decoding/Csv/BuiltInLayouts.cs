using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>The CSV formats of our own.</summary>
public static class BuiltInLayouts
{
    internal const string TimeColumn = "time";
    internal const string SportColumn = "sport";

    internal static IReadOnlyList<CsvChannelColumn> SampleColumns { get; } =
    [
        new() { Column = "heart_rate_bpm", Channel = Channel.HeartRate, Unit = "bpm" },
        new() { Column = "power_w", Channel = Channel.Power, Unit = "W" },
        new() { Column = "speed_m_s", Channel = Channel.Speed, Unit = "m/s" },
        new() { Column = "cadence_rpm", Channel = Channel.Cadence, Unit = "rpm" },
        new() { Column = "distance_m", Channel = Channel.Distance, Unit = "m" },
        new() { Column = "altitude_m", Channel = Channel.Altitude, Unit = "m" },
    ];

    /// <summary>
    /// A session as a time series: <c>time</c> (ISO 8601, UTC where no offset is written) and any of <c>heart_rate_bpm</c>, <c>power_w</c>,
    /// <c>speed_m_s</c>, <c>cadence_rpm</c>, <c>distance_m</c>, <c>altitude_m</c>, and <c>sport</c>. An empty cell is no reading.
    /// </summary>
    public static CsvLayout Samples { get; } = new()
    {
        Name = "samples",
        Header = [TimeColumn],
        Time = new CsvTimeColumn { Column = TimeColumn },
        Columns = SampleColumns,
        SportColumn = SportColumn,
    };

    /// <summary>All of them: the one above and <see cref="BuiltInTables"/>. No file fits two, unless it mixes their needed columns.</summary>
    public static IReadOnlyList<CsvLayout> All { get; } = [Samples, .. BuiltInTables.All];
}
