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

    private static (bool Fits, string Wanted) Judge(JsonElement element, JsonTypeInfo type) => type.Kind switch
    {
        JsonTypeInfoKind.Object or JsonTypeInfoKind.Dictionary => (element.ValueKind == JsonValueKind.Object, "an object in braces"),
        JsonTypeInfoKind.Enumerable => (element.ValueKind == JsonValueKind.Array, "a list in brackets"),
        _ => Judge(element, Stated(type)),
    };

    private static (bool Fits, string Wanted) Judge(JsonElement element, Type type) => type switch
    {
        { IsEnum: true } => (IsOneOf(element, WordsOf(type)), $"one of {string.Join(", ", WordsOf(type))}"),
        _ when type == typeof(bool) => (element.ValueKind is JsonValueKind.True or JsonValueKind.False, "true or false"),
        _ when type == typeof(int) => (element.ValueKind == JsonValueKind.Number && element.TryGetInt32(out _), "a whole number"),
        _ when type == typeof(double) => (IsFinite(element), "a number"),
        _ when type == typeof(char) => (element.ValueKind == JsonValueKind.String && element.GetString()!.Length == 1, "one character in quotes"),
        _ => (element.ValueKind == JsonValueKind.String, "text in quotes"),
    };

    /// <summary>The type of a value that is there.</summary>
    private static Type Stated(JsonTypeInfo type) => Nullable.GetUnderlyingType(type.Type) ?? type.Type;

    private static bool IsOneOf(JsonElement element, IReadOnlyList<string> words) =>
        element.ValueKind == JsonValueKind.String && words.Contains(element.GetString()!, StringComparer.OrdinalIgnoreCase);

    private static bool IsFinite(JsonElement element) =>
        element.ValueKind == JsonValueKind.Number && element.TryGetDouble(out var number) && double.IsFinite(number);

    private static string Hint(JsonElement element, JsonTypeInfo type) =>
        Stated(type).IsEnum && element.ValueKind == JsonValueKind.String ? Nearest.Hint(element.GetString()!, WordsOf(Stated(type))) : "";

    private static string Shown(JsonElement element) => element.ValueKind switch
    {
        JsonValueKind.Object => "an object",
        JsonValueKind.Array => "a list",
        _ when element.GetRawText() is { Length: > ShownCharacters } text => $"{text[..ShownCharacters]}...",
        _ => element.GetRawText(),
    };
}
