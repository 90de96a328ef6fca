using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace LoadWatch.Service.Configuration;

/// <summary>Finds every key that the configuration does not know, with its line and the nearest right word.</summary>
public static class KeyCheck
{
    public static IEnumerable<ConfigurationFault> UnknownKeys(string file, JsonElement root, Type type, JsonPlaces places) =>
        Walk(root, ConfigurationJson.Options.GetTypeInfo(type), "$")
            .Select(unknown => new ConfigurationFault(
                file,
                places.LineOf(unknown.Path),
                $"\"{unknown.Key}\" is not a key here{Nearest.Hint(unknown.Key, unknown.Known)}"));

    private static IEnumerable<(string Path, string Key, IReadOnlyList<string> Known)> Walk(JsonElement element, JsonTypeInfo type, string path)
    {
        if (type.Kind == JsonTypeInfoKind.Object && element.ValueKind == JsonValueKind.Object)
        {
            return element.EnumerateObject().SelectMany(property => Property(property, type, $"{path}.{property.Name}"));
        }

        if (type.Kind == JsonTypeInfoKind.Enumerable && element.ValueKind == JsonValueKind.Array)
        {
            var inner = ConfigurationJson.Options.GetTypeInfo(type.ElementType!);
            return element.EnumerateArray().SelectMany((item, i) => Walk(item, inner, $"{path}[{i}]"));
        }

        return [];
    }

    private static IEnumerable<(string Path, string Key, IReadOnlyList<string> Known)> Property(JsonProperty property, JsonTypeInfo type, string path)
    {
        var known = type.Properties.FirstOrDefault(candidate => candidate.Name == property.Name);
        return known is null
            ? [(path, property.Name, type.Properties.Select(candidate => candidate.Name).ToList())]
            : Walk(property.Value, ConfigurationJson.Options.GetTypeInfo(known.PropertyType), path);
    }
}
