namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Ways of writing units, and what they are called in a layout; some are known only to say that nothing reads them.</summary>
internal static class UnitWords
{
    /// <summary>Beats or revolutions, as the channel has it.</summary>
    public const string PerMinute = "1/min";

    private static readonly Dictionary<string, string> Known = new(StringComparer.Ordinal)
    {
        ["bpm"] = "bpm", ["beats/min"] = "bpm", ["schlage/min"] = "bpm", ["puls/min"] = "bpm",
        ["1/min"] = PerMinute, ["/min"] = PerMinute, ["min-1"] = PerMinute, ["min^-1"] = PerMinute,
        ["w"] = "W", ["watt"] = "W", ["watts"] = "W",
        ["m/s"] = "m/s", ["mps"] = "m/s", ["ms-1"] = "m/s", ["m*s-1"] = "m/s",
        ["km/h"] = "km/h", ["kmh"] = "km/h", ["kph"] = "km/h", ["km/t"] = "km/h",
        ["rpm"] = "rpm", ["u/min"] = "rpm", ["tr/min"] = "rpm", ["giri/min"] = "rpm", ["kierrosta/min"] = "rpm", ["varv/min"] = "rpm",
        ["m"] = "m", ["meter"] = "m", ["meters"] = "m", ["metre"] = "m", ["metres"] = "m", ["metri"] = "m", ["metros"] = "m", ["metria"] = "m",
        ["km"] = "km", ["kilometer"] = "km", ["kilometers"] = "km", ["kilometres"] = "km",
        ["s"] = "s", ["sec"] = "s", ["sek"] = "s", ["seconds"] = "s", ["sekunden"] = "s",
        ["ms"] = "ms", ["min"] = "min", ["minutes"] = "min", ["minuten"] = "min", ["h"] = "h",
        ["kg"] = "kg", ["lb"] = "lb", ["lbs"] = "lb", ["kj"] = "kJ",
        ["mph"] = "mph", ["mi"] = "mi", ["ft"] = "ft", ["yd"] = "yd", ["min/km"] = "min/km", ["min/mi"] = "min/mi", ["spm"] = "spm",
    };

    /// <summary>The unit that a text is, or null.</summary>
    public static string? Find(string text) => Known.GetValueOrDefault(NameWords.Plain(text).Replace(" ", "", StringComparison.Ordinal));

    /// <summary>The unit behind the last bracket of a name, or null.</summary>
    public static string? InBrackets(string name)
    {
        var open = name.LastIndexOfAny(['(', '[']);
        var close = open < 0 ? -1 : name.IndexOfAny([')', ']'], open);
        return close < 0 ? null : Find(name[(open + 1)..close]);
    }

    /// <summary>The unit that the last words of a name are, or null; a name of one word states none.</summary>
    public static string? AtEnd(IReadOnlyList<string> words) => words.Count switch
    {
        < 2 => null,
        2 => Find(words[^1]),
        _ => Find($"{words[^2]}/{words[^1]}") ?? Find(words[^1]),
    };
}
