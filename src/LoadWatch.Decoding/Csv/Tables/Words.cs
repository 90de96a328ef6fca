using System.Text.Json;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The words of an enumeration: lower case, joined by underscores.</summary>
internal static class Words<T>
    where T : struct, Enum
{
    private static readonly Dictionary<string, T> ByWord = Enum.GetValues<T>().ToDictionary(Of, StringComparer.Ordinal);

    /// <summary>In the order of the enumeration.</summary>
    public static IReadOnlyList<string> All { get; } = [.. Enum.GetValues<T>().Select(Of)];

    public static string Of(T value) => JsonNamingPolicy.SnakeCaseLower.ConvertName(value.ToString());

    public static T Parse(string word) => ByWord[word];
}

/// <summary>The words of a field that is yes or no.</summary>
internal static class YesNo
{
    public const string Yes = "yes";
    public const string No = "no";

    public static WordRole Role(string name) => new(name, Yes, No);
}
