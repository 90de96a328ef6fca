using System.Text.Json.Serialization;
using LoadWatch.Recordings;

namespace LoadWatch.Service.Export;

/// <summary>One recording of a file, or a file that holds none, as <c>inspect --json</c> writes it: raw, before any quality cut.</summary>
/// <param name="FirstSample">Smallest sample time, UTC.</param>
/// <param name="LastSample">Largest sample time, UTC.</param>
/// <param name="Samples">Record messages, or rows.</param>
/// <param name="DistanceM">Largest distance reading.</param>
/// <param name="Channels">Unweighted numbers over valid readings.</param>
/// <param name="Problems">Of the whole file.</param>
public sealed record InspectLine(
    string File,
    string Kind,
    int? Part,
    string? Sport,
    string? FirstSample,
    string? LastSample,
    int Samples,
    double? ElapsedS,
    double? TimerS,
    double? DistanceM,
    IReadOnlyDictionary<string, ChannelLine> Channels,
    int Laps,
    int Sets,
    int Lengths,
    DeviceLine? Device,
    IReadOnlyList<ProblemLine> Problems)
{
    /// <summary>What a table holds, in words, for people, on the first line of a file; null for everything else.</summary>
    [JsonIgnore]
    public string? Table { get; init; }

    /// <summary>What an app on the device states beside the device's own fields; null where nothing is stated twice, and then not written.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public ShadowedLine? Shadowed { get; init; }

    public static InspectLine Of(string path, DecodedFile file, Recording recording) => new(
        path,
        file.Kind,
        recording.Part,
        recording.Sport.ToString(),
        Words.Utc(recording.Samples.First),
        Words.Utc(recording.Samples.Last),
        recording.Samples.Count,
        recording.ElapsedSeconds,
        recording.TimerSeconds,
        ChannelStatistics.Of(recording.Samples, Channel.Distance).Max,
        recording.Samples.Channels.ToDictionary(Words.Channel, channel => ChannelLine.Of(recording.Samples, channel), StringComparer.Ordinal),
        recording.Laps,
        recording.Sets.Count,
        recording.Lengths,
        new DeviceLine(recording.Device.Manufacturer, recording.Device.Product, recording.Device.Serial),
        file.Problems.Select(ProblemLine.Of).ToList())
    {
        Shadowed = ShadowedLine.Of(recording.Shadowed),
    };

    public static InspectLine WithoutRecording(string path, string kind, IReadOnlyList<Problem> problems) => new(
        path, kind, null, null, null, null, 0, null, null, null, new Dictionary<string, ChannelLine>(), 0, 0, 0, null, problems.Select(ProblemLine.Of).ToList());

    public static InspectLine Unreadable(string path, string reason) =>
        WithoutRecording(path, "unknown", [new Problem(ProblemSeverity.Error, reason)]);
}

public sealed record ChannelLine(int N, double? Mean, double? Max)
{
    public static ChannelLine Of(SampleSeries samples, Channel channel) => Of(ChannelStatistics.Of(samples, channel));

    public static ChannelLine Of(ChannelStatistics numbers) => new(numbers.Count, numbers.Mean, numbers.Max);
}

/// <summary>Totals and channels as <see cref="InspectLine"/> has them, each null or absent where it is not stated twice.</summary>
public sealed record ShadowedLine(double? ElapsedS, double? TimerS, double? DistanceM, IReadOnlyDictionary<string, ChannelLine> Channels)
{
    public static ShadowedLine? Of(Shadowed shadowed) => shadowed is { ElapsedSeconds: null, TimerSeconds: null, DistanceMetres: null, Channels.Count: 0 } ? null : new(
        shadowed.ElapsedSeconds,
        shadowed.TimerSeconds,
        shadowed.DistanceMetres,
        shadowed.Channels.ToDictionary(pair => Words.Channel(pair.Key), pair => ChannelLine.Of(pair.Value), StringComparer.Ordinal));
}

public sealed record DeviceLine(int? Manufacturer, int? Product, long? Serial);

public sealed record ProblemLine(string Severity, string Reason, long? ByteOffset, long? Line, int? Column, string? Field, [property: JsonIgnore] string Text)
{
    public static ProblemLine Of(Problem problem) => new(
        Words.Of(problem.Severity), problem.Reason, problem.ByteOffset, problem.Line, problem.Column, problem.Field, problem.ToString());
}
