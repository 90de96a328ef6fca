using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Unicode;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Storage.Dialects;

/// <summary>Lists and evidence as JSON text: snake case, enums as words, the same text for the same value.</summary>
internal static class JsonText
{
    private static readonly JsonSerializerOptions Options = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.SnakeCaseLower,
        IgnoreReadOnlyProperties = true,
        Encoder = JavaScriptEncoder.Create(UnicodeRanges.All),
        Converters =
        {
            new JsonStringEnumConverter(JsonNamingPolicy.SnakeCaseLower, allowIntegerValues: false),
            new JsonDates<LocalDate>(LocalDatePattern.Iso),
            new JsonDates<Instant>(ColumnTypes.Moment),
            new JsonDates<LocalTime>(LocalTimePattern.ExtendedIso),
        },
    };

    public static string Write<T>(T value) => JsonSerializer.Serialize(value, Options);

    /// <summary>A dictionary in the order of its keys.</summary>
    public static string WriteSorted<TKey, TValue>(IReadOnlyDictionary<TKey, TValue> values)
        where TKey : struct, Enum =>
        Write(new SortedDictionary<TKey, TValue>(values.ToDictionary()));

    /// <exception cref="InvalidDataException">The text is not a value of the type.</exception>
    public static T Read<T>(string text)
        where T : class
    {
        try
        {
            return JsonSerializer.Deserialize<T>(text, Options) ?? throw new InvalidDataException($"no {typeof(T).Name}: null");
        }
        catch (JsonException exception)
        {
            throw new InvalidDataException($"no {typeof(T).Name}: {exception.Message}", exception);
        }
    }
}
