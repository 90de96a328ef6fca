using System.Text.Json.Serialization;

namespace LoadWatch.Decoding.References;

/// <summary>What a decoder gives of one part of a FIT file, in the form both sides are brought to. Times are milliseconds since 1970, null where there is none.</summary>
internal sealed record ReferencePart
{
    /// <summary>The file the part was read from.</summary>
    public string Name { get; init; } = "";

    /// <summary>Why the part is refused, or null.</summary>
    public string? Error { get; init; }

    public string? FileType { get; init; }

    public long? Serial { get; init; }

    /// <summary>Time, heart rate, power, speed, cadence, distance, altitude.</summary>
    public IReadOnlyList<double?[]> Records { get; init; } = [];

    public IReadOnlyList<ReferenceSession> Sessions { get; init; } = [];

    public IReadOnlyList<ReferenceSet> Sets { get; init; } = [];

    /// <summary>When each lap of the reference began. LoadWatch keeps their number by session: <see cref="LapsBySession"/>.</summary>
    public IReadOnlyList<double?> Laps { get; init; } = [];

    /// <summary>When each length of the reference began.</summary>
    public IReadOnlyList<double?> Lengths { get; init; } = [];

    public IReadOnlyList<int> LapsBySession { get; init; } = [];

    public IReadOnlyList<int> LengthsBySession { get; init; } = [];

    /// <summary>The timer's stops and starts as the reference gives them.</summary>
    public IReadOnlyList<TimerEntry> Timer { get; init; } = [];

    /// <summary>Pauses of each session as LoadWatch gives them: start, and end or null.</summary>
    public IReadOnlyList<IReadOnlyList<double?[]>> PausesBySession { get; init; } = [];

    /// <summary>Heart rates of hr messages, beats per minute.</summary>
    public IReadOnlyList<double?> Beats { get; init; } = [];

    /// <summary>Seconds from beat to beat.</summary>
    public IReadOnlyList<double?> Intervals { get; init; } = [];

    /// <summary>Time of the activity message and what it states as local time.</summary>
    public double?[]? Activity { get; init; }

    /// <summary>Time, heart rate, counted cycles and kind of movement of monitoring messages, as the reference gives them.</summary>
    public IReadOnlyList<MonitoredEntry> Monitored { get; init; } = [];
}

internal sealed record ReferenceSession(
    double? Start,
    string? Sport,
    [property: JsonPropertyName("subSport")] string? SubSport,
    double? Elapsed,
    double? Timer,
    double? Distance);

internal sealed record ReferenceSet(double? Start, double? Duration, bool Active, string? Category, double? Repetitions, double? Weight);

internal sealed record TimerEntry(double? Time, string? Type);

internal sealed record MonitoredEntry(double? Time, double? HeartRate, double? Cycles, string? Kind);
