using System.Globalization;
using System.Text;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>A column's name as words, in lower case and without accents, and the unit that it states.</summary>
/// <param name="Words">In order, a unit at the end among them.</param>
/// <param name="Unit">In the words of <see cref="UnitWords"/>, or null.</param>
internal sealed record NameWords(IReadOnlyList<string> Words, string? Unit)
{
    public static NameWords Of(string name)
    {
        var words = Split(Plain(name));
        return new NameWords(words, UnitWords.InBrackets(name) ?? UnitWords.AtEnd(words));
    }

    /// <summary>Whether one of the phrases stands in the name: its words side by side, or written as one.</summary>
    public bool Says(IEnumerable<string> phrases) => phrases.Any(Holds);

    /// <summary>Lower case without accents; a capital letter behind a small one begins a word.</summary>
    public static string Plain(string text)
    {
        var plain = new StringBuilder();
        var before = ' ';
        foreach (var c in text.Normalize(NormalizationForm.FormD).Where(c => CharUnicodeInfo.GetUnicodeCategory(c) != UnicodeCategory.NonSpacingMark))
        {
            plain.Append(char.IsUpper(c) && char.IsLower(before) ? " " : "").Append(char.ToLowerInvariant(c));
            before = c;
        }

        return plain.Replace("ß", "ss").ToString();
    }

    private static List<string> Split(string plain) =>
        [.. string.Concat(plain.Select(c => char.IsLetter(c) ? c : ' ')).Split(' ', StringSplitOptions.RemoveEmptyEntries)];

    private bool Holds(string phrase)
    {
        var wanted = Split(Plain(phrase));
        return Words.Contains(string.Concat(wanted))
            || Enumerable.Range(0, Math.Max(0, Words.Count - wanted.Count + 1)).Any(start => Words.Skip(start).Take(wanted.Count).SequenceEqual(wanted));
    }
}
