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

    public IReadOnlyList<double?> Laps { get; init; } = [];

    public IReadOnlyList<double?> Lengths { get; init; } = [];

    /// <summary>Heart rates of hr messages, beats per minute.</summary>
    public IReadOnlyList<double?> Beats { get; init; } = [];

    /// <summary>Seconds from beat to beat.</summary>
    public IReadOnlyList<double?> Intervals { get; init; } = [];

    /// <summary>Time of the activity message and what it states as local time.</summary>
    public double?[]? Activity { get; init; }

    /// <summary>Time, heart rate, steps, kind of movement of monitoring messages.</summary>
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

internal sealed record MonitoredEntry(double? Time, double? HeartRate, double? Cycles, string? Kind);
