using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace LoadWatch.Service.Configuration;

/// <summary>Finds every key that the configuration does not know or that stands twice, and every value of a wrong type, with line and nearest word.</summary>
public static class KeyCheck
{
    public static IEnumerable<ConfigurationFault> Faults(string file, JsonElement root, Type type, JsonPlaces places) =>
        Walk(root, Info(type), "$")
            .Select(fault => new ConfigurationFault(file, places.LineOf(fault.Path), fault.Reason))
            .Concat(places.Repeated.Select(again => new ConfigurationFault(
                file, again.Line, $"\"{again.Key}\" stands twice here, first in line {places.LineOf(again.Path)}")))
            .OrderBy(fault => fault.Line);

    private static IEnumerable<(string Path, string Reason)> Walk(JsonElement element, JsonTypeInfo type, string path) =>
        (type.Kind, element.ValueKind) switch
        {
            (JsonTypeInfoKind.Object, JsonValueKind.Object) =>
                element.EnumerateObject().SelectMany(property => Property(property, type, $"{path}.{property.Name}")),
            (JsonTypeInfoKind.Dictionary, JsonValueKind.Object) =>
                element.EnumerateObject().SelectMany(property => Walk(property.Value, Info(type.ElementType!), $"{path}.{property.Name}")),
            (JsonTypeInfoKind.Enumerable, JsonValueKind.Array) =>
                element.EnumerateArray().SelectMany((item, i) => Walk(item, Info(type.ElementType!), $"{path}[{i}]")),
            _ => ValueCheck.Complaint(element, type) is { } reason ? [(path, path.Length > 2 ? $"{path[2..]}: {reason}" : reason)] : [],
        };

    private static IEnumerable<(string Path, string Reason)> Property(JsonProperty property, JsonTypeInfo type, string path)
    {
        var known = type.Properties.FirstOrDefault(candidate => candidate.Name == property.Name);
        if (known is null)
        {
            return [(path, $"\"{property.Name}\" is not a key here{Nearest.Hint(property.Name, type.Properties.Select(candidate => candidate.Name))}")];
        }

        var plain = Nullable.GetUnderlyingType(known.PropertyType) ?? known.PropertyType;
        return property.Value.ValueKind == JsonValueKind.Null && known.IsSetNullable ? [] : Walk(property.Value, Info(plain), path);
    }

    private static JsonTypeInfo Info(Type type) => ConfigurationJson.Options.GetTypeInfo(type);
}
