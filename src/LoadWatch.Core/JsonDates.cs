using System.Text.Json;
using System.Text.Json.Serialization;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch;

/// <summary>Dates and times of day in JSON text by their ISO form: the serializer would write every part of them and read none.</summary>
public sealed class JsonDates<T>(IPattern<T> pattern) : JsonConverter<T>
    where T : struct
{
    public override T Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options)
    {
        var parsed = pattern.Parse(reader.GetString()!);
        return parsed.Success ? parsed.Value : throw new JsonException(parsed.Exception.Message);
    }

    public override void Write(Utf8JsonWriter writer, T value, JsonSerializerOptions options) => writer.WriteStringValue(pattern.Format(value));
}
