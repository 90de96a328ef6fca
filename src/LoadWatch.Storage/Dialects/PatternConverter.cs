using System.Text.Json;
using System.Text.Json.Serialization;
using NodaTime.Text;

namespace LoadWatch.Storage.Dialects;

/// <summary>A date or time in JSON as its pattern writes it.</summary>
internal sealed class PatternConverter<T>(IPattern<T> pattern) : JsonConverter<T>
{
    public override T Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) =>
        pattern.Parse(reader.GetString() ?? "") is { Success: true, Value: var value } ? value : throw new JsonException($"no {typeof(T).Name}");

    public override void Write(Utf8JsonWriter writer, T value, JsonSerializerOptions options) => writer.WriteStringValue(pattern.Format(value));
}
