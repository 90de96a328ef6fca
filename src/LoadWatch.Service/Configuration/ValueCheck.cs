using System.Text.Json;
using NodaTime;
using System.Text.Json.Serialization.Metadata;

namespace LoadWatch.Service.Configuration;

/// <summary>Says in plain words what is wrong with the type of a value.</summary>
public static class ValueCheck
{
    private const int ShownCharacters = 40;

    /// <summary><c>"mvoe" is not one of leave, move; did you mean "move"?</c>, or null where the value fits.</summary>
    public static string? Complaint(JsonElement element, JsonTypeInfo type)
    {
        var (fits, wanted) = Judge(element, type);
        return fits ? null : $"{Shown(element)} is not {wanted}{Hint(element, type)}";
    }

    /// <summary>The words of an enumeration as the configuration writes them; no day is no weekday.</summary>
    public static IReadOnlyList<string> WordsOf(Type enumeration) =>
        [.. Enum.GetNames(enumeration).Where(name => enumeration != typeof(IsoDayOfWeek) || name != nameof(IsoDayOfWeek.None)).Select(JsonNamingPolicy.SnakeCaseLower.ConvertName)];

    private static (bool Fits, string Wanted) Judge(JsonElement element, JsonTypeInfo type) => type switch
    {
        { Kind: JsonTypeInfoKind.Object or JsonTypeInfoKind.Dictionary } => (element.ValueKind == JsonValueKind.Object, "an object in braces"),
        { Kind: JsonTypeInfoKind.Enumerable } => (element.ValueKind == JsonValueKind.Array, "a list in brackets"),
        { Type.IsEnum: true } => (IsOneOf(element, WordsOf(type.Type)), $"one of {string.Join(", ", WordsOf(type.Type))}"),
        _ when type.Type == typeof(bool) => (element.ValueKind is JsonValueKind.True or JsonValueKind.False, "true or false"),
        _ when type.Type == typeof(int) => (element.ValueKind == JsonValueKind.Number && element.TryGetInt32(out _), "a whole number"),
        _ when type.Type == typeof(double) => (IsFinite(element), "a number"),
        _ when type.Type == typeof(char) => (element.ValueKind == JsonValueKind.String && element.GetString()!.Length == 1, "one character in quotes"),
        _ => (element.ValueKind == JsonValueKind.String, "text in quotes"),
    };

    private static bool IsOneOf(JsonElement element, IReadOnlyList<string> words) =>
        element.ValueKind == JsonValueKind.String && words.Contains(element.GetString()!, StringComparer.OrdinalIgnoreCase);

    private static bool IsFinite(JsonElement element) =>
        element.ValueKind == JsonValueKind.Number && element.TryGetDouble(out var number) && double.IsFinite(number);

    private static string Hint(JsonElement element, JsonTypeInfo type) =>
        type.Type.IsEnum && element.ValueKind == JsonValueKind.String ? Nearest.Hint(element.GetString()!, WordsOf(type.Type)) : "";

    private static string Shown(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => "an object",
        JsonValueKind.Array => "a list",
        _ when element.GetRawText() is { Length: > ShownCharacters } text => $"{text[..ShownCharacters]}...",
        _ => element.GetRawText(),
    };
}
