using System.Text.Json;

namespace LoadWatch.Storage.Dialects;

/// <summary>The word of an enum's value in a column: lower case, joined by underscores. Numbers would change when a value is put in between.</summary>
internal static class Words<T>
    where T : struct, Enum
{
    private static readonly Dictionary<T, string> ByValue =
        Enum.GetValues<T>().ToDictionary(value => value, value => JsonNamingPolicy.SnakeCaseLower.ConvertName(value.ToString()));

    private static readonly Dictionary<string, T> ByWord = ByValue.ToDictionary(pair => pair.Value, pair => pair.Key, StringComparer.Ordinal);

    public static string Of(T value) => ByValue[value];

    /// <exception cref="InvalidDataException">No value has this word: the database was written by something else.</exception>
    public static T Parse(string word) =>
        ByWord.TryGetValue(word, out var value) ? value : throw new InvalidDataException($"'{word}' is no {typeof(T).Name}");
}
