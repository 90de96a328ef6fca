using System.Collections.Frozen;
using System.Globalization;

namespace LoadWatch.Decoding.Fit;

/// <summary>Words by number. A number without a word is named by the table and itself: <c>sport_99</c>.</summary>
internal sealed class WordTable
{
    private readonly string name;
    private readonly FrozenDictionary<int, string> words;
    private readonly FrozenDictionary<string, int> numbers;

    /// <param name="entries"><c>0 generic, 1 running</c>.</param>
    public WordTable(string name, string entries)
    {
        this.name = name;
        words = entries.Split(',', StringSplitOptions.TrimEntries).Select(Entry).ToFrozenDictionary();
        numbers = words.ToFrozenDictionary(entry => entry.Value, entry => entry.Key, StringComparer.Ordinal);
    }

    public string this[int number] =>
        words.TryGetValue(number, out var word) ? word : string.Create(CultureInfo.InvariantCulture, $"{name}_{number}");

    public bool Knows(int number) => words.ContainsKey(number);

    /// <summary>The number of a word as the indexer gives it, or null.</summary>
    public int? NumberOf(string word)
    {
        if (numbers.TryGetValue(word, out var number))
            return number;

        var prefix = name + "_";
        return word.StartsWith(prefix, StringComparison.Ordinal)
            && int.TryParse(word[prefix.Length..], NumberStyles.None, CultureInfo.InvariantCulture, out var unnamed) ? unnamed : null;
    }

    private static KeyValuePair<int, string> Entry(string text)
    {
        var space = text.IndexOf(' ', StringComparison.Ordinal);
        return new(int.Parse(text[..space], CultureInfo.InvariantCulture), text[(space + 1)..]);
    }
}
