using System.Text.Json.Serialization;

namespace LoadWatch.Service.Export;

// The rows of the export contract (config/README.md). Names carry units; unknown is null; nothing in them depends on the clock or on the order of arrival.

public sealed record ArrivalLine([property: JsonPropertyName("sha256")] string Sha256, string File, string? Kind, string State, string? Reason, string? Person);

public sealed record RecordingLine([property: JsonPropertyName("sha256")] string Sha256, string File, int Part, string Role, IReadOnlyList<string>? Gives);

public sealed record QuantityLine(string Name, double Value, string Unit, bool Estimated);

public sealed record ZonesLine(string Basis, IReadOnlyList<double> Bounds, string Unit, bool Estimated);

public sealed record TimeInZoneLine(
    IReadOnlyList<double>? HeartRate, IReadOnlyList<double>? Power, IReadOnlyList<double>? Speed, IReadOnlyDictionary<string, ZonesLine> Zones);

public sealed record CutLine(string? Channel, string Reason, string? From, string? To, int Readings, double Seconds, double Share);

public sealed record BandLine(double Low, double Mid, double High);

public sealed record StimulusLine(
    string Region,
    BandLine? HardBouts,
    BandLine? HardRepetitions,
    BandLine? SlowS,
    BandLine? MediumS,
    BandLine? LargeS,
    string Grade,
    string Channel,
    IReadOnlyList<string> NotSeen);

public sealed record ActivityLine(
    string Person,
    string Date,
    string? Start,
    string Sport,
    double? ElapsedS,
    double? TimerS,
    IReadOnlyList<QuantityLine> Quantities,
    string LoadQuantity,
    TimeInZoneLine TimeInZoneS,
    double? HeartRateMeanBpm,
    int? HeartRateMaxBpm,
    double? PowerMeanW,
    double? PowerMaxW,
    IReadOnlyDictionary<string, double> UsableShare,
    IReadOnlyList<CutLine> Cuts,
    IReadOnlyList<StimulusLine> Stimulus,
    IReadOnlyList<RecordingLine> Recordings,
    IReadOnlyList<string> Tables,
    bool AddsLoad,
    IReadOnlyList<string> Remarks);

public sealed record DayLine(
    string Person,
    string Date,
    string State,
    string? StateSource,
    double? Load,
    double? LoadError,
    double? Acute,
    double? Chronic,
    double? RatioCoupled,
    double? RatioUncoupled,
    double? RatioEwma,
    double? WeeklyChange,
    double? WeeklyChangeOrdinary,
    double? UsualWeek,
    [property: JsonPropertyName("largest_session_30")] double? LargestSession30,
    [property: JsonPropertyName("longest_run_30_m")] double? LongestRun30M,
    double? Monotony,
    double? Strain,
    [property: JsonPropertyName("coverage_7")] double Coverage7,
    [property: JsonPropertyName("coverage_28")] double Coverage28,
    [property: JsonPropertyName("heavy_or_fast_7")] IReadOnlyDictionary<string, int?> HeavyOrFast7,
    [property: JsonPropertyName("heavy_or_fast_28")] IReadOnlyDictionary<string, int?> HeavyOrFast28,
    [property: JsonPropertyName("heavy_or_fast_14")] IReadOnlyDictionary<string, int?> HeavyOrFast14,
    [property: JsonPropertyName("heavy_or_fast_usual_14")] IReadOnlyDictionary<string, double?> HeavyOrFastUsual14,
    [property: JsonPropertyName("heavy_or_fast_known_7")] IReadOnlyDictionary<string, int?> HeavyOrFastKnown7,
    [property: JsonPropertyName("heavy_or_fast_known_14")] IReadOnlyDictionary<string, int?> HeavyOrFastKnown14,
    [property: JsonPropertyName("heavy_or_fast_known_28")] IReadOnlyDictionary<string, int?> HeavyOrFastKnown28,
    IReadOnlyDictionary<string, int?> DaysSinceHeavyOrFast);

public sealed record HeavyWeekLine(int? Days, int Known, double? Usual, bool? Reached);

public sealed record RoomLine(
    string Person,
    string Date,
    string LoadQuantity,
    double? InsideLimits,
    string? Reason,
    string? HeldBy,
    bool PassedAtRest,
    [property: JsonPropertyName("largest_day_30")] double? LargestDay30,
    [property: JsonPropertyName("largest_day_30_on")] string? LargestDay30On,
    IReadOnlyDictionary<string, HeavyWeekLine> HeavyOrFastWeek);

public sealed record FindingLine(
    string Person, string Rule, string? Region, string? Quantity, string Date, string Severity, double Value, double Limit, string Unit);

public sealed record AlertLine(
    string Id, string Person, string Rule, string? Region, string? Quantity, string Raised, string State, string Severity, string? ShelvedUntil, string Watch, string Text);
