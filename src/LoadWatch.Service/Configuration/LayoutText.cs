using System.Text.Json;
using System.Text.Json.Nodes;
using LoadWatch.Decoding.Csv;

namespace LoadWatch.Service.Configuration;

/// <summary>A layout as it is written in <c>loadwatch.json</c>: only the keys that differ from their defaults.</summary>
public static class LayoutText
{
    private static readonly string[] Parts = ["time"];

    public static JsonObject Of(CsvLayout layout)
    {
        var text = Written(layout);
        TakeDefaults(text, Written(new CsvLayout()));
        foreach (var field in text["fields"]?.AsArray() ?? [])
        {
            TakeDefaults(field!.AsObject(), Written(new CsvField()));
        }

        return text;
    }

    private static void TakeDefaults(JsonObject text, JsonObject defaults)
    {
        foreach (var (key, value) in text.ToList())
        {
            if (JsonNode.DeepEquals(value, defaults[key]))
            {
                text.Remove(key);
            }
            else if (Parts.Contains(key))
            {
                TakeDefaults(value!.AsObject(), defaults[key]!.AsObject());
            }
        }
    }

    private static JsonObject Written<T>(T value) => JsonSerializer.SerializeToNode(value, ConfigurationJson.Options)!.AsObject();
}
