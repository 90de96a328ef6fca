using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Export;

/// <summary>How values are written in exports and other JSON for programs.</summary>
public static class Words
{
    public static JsonSerializerOptions Json { get; } = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    private static JsonSerializerOptions Indented { get; } = new(Json) { WriteIndented = true, NewLine = "\n" };

    /// <summary>One line of JSON. What would turn the reading direction or show nothing stands as an escape, so a terminal shows it as it is.</summary>
    public static string Line(object value) => Escaped(JsonSerializer.Serialize(value, value.GetType(), Json));

    /// <summary>The same over several lines, to be read and changed by a person.</summary>
    public static string Lines(JsonNode value) => string.Join('\n', value.ToJsonString(Indented).Split('\n').Select(Escaped));

    private static string Escaped(string json) =>
        json.All(IsPlain) ? json : string.Concat(json.Select(letter => IsPlain(letter) ? letter.ToString() : $"\\u{(int)letter:x4}"));

    /// <summary>ISO 8601 with offset.</summary>
    public static string Start(OffsetDateTime start) => OffsetDateTimePattern.Rfc3339.Format(start);

    /// <summary>ISO 8601 in UTC.</summary>
    public static string? Utc(Instant? instant) => instant is { } known ? InstantPattern.ExtendedIso.Format(known) : null;

    public static string Date(LocalDate date) => LocalDatePattern.Iso.Format(date);

    public static string Channel(Channel channel) => JsonNamingPolicy.SnakeCaseLower.ConvertName(channel.ToString());

    /// <summary>An enumeration value in lower case with underscores.</summary>
    public static string Of<T>(T value)
        where T : struct, Enum =>
        JsonNamingPolicy.SnakeCaseLower.ConvertName(value.ToString());

    /// <summary>Such characters can only stand inside a string of the JSON, where their escape means the same.</summary>
    private static bool IsPlain(char letter) =>
        !char.IsControl(letter) && CharUnicodeInfo.GetUnicodeCategory(letter) is not (UnicodeCategory.Format or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator);

    public static string Unit(Channel channel) => channel switch
    {
        Recordings.Channel.HeartRate => "bpm",
        Recordings.Channel.Power => "W",
        Recordings.Channel.Speed => "m/s",
        Recordings.Channel.Cadence => "rpm",
        _ => "m",
    };
}
