using System.Globalization;
using System.Text;

namespace LoadWatch.Notices;

/// <summary>
/// Makes a name or sentence from outside safe for one line of text: nothing in it can start a new line, turn the reading direction or control a terminal.
/// </summary>
public static class OneLine
{
    /// <summary>
    /// Controls, line breaks and direction marks become a space, runs of space one space; the ends are trimmed, halves of a surrogate pair replaced.
    /// </summary>
    public static string Of(string text)
    {
        var line = new StringBuilder(text.Length);
        var gap = false;
        foreach (var rune in text.EnumerateRunes())
        {
            if (Separates(rune))
            {
                gap = line.Length > 0;
                continue;
            }

            if (gap)
            {
                line.Append(' ');
                gap = false;
            }

            line.Append(rune);
        }

        return line.ToString();
    }

    /// <summary>As one line that begins with a capital and ends with a full stop.</summary>
    public static string Sentence(string text)
    {
        var line = Of(text);
        if (line.Length == 0)
        {
            return line;
        }

        var whole = line[^1] is '.' or '!' or '?' ? line : line + ".";
        return char.ToUpperInvariant(whole[0]) + whole[1..];
    }

    private static bool Separates(Rune rune) =>
        Rune.IsWhiteSpace(rune)
        || Rune.GetUnicodeCategory(rune) is UnicodeCategory.Control or UnicodeCategory.LineSeparator or UnicodeCategory.ParagraphSeparator
        || TurnsDirection(rune.Value);

    private static bool TurnsDirection(int code) =>
        code is 0x061C or 0x200E or 0x200F or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x2069) or 0xFEFF;
}
