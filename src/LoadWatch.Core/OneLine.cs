using System.Globalization;
using System.Text;

namespace LoadWatch;

/// <summary>
/// Makes a name or sentence from outside safe for one line of text: nothing in it can start a new line, turn the reading direction or control a terminal.
/// </summary>
public static class OneLine
{
    /// <summary>
    /// Controls, line breaks and direction marks become a space, runs of space one space; the ends are trimmed, halves of a surrogate pair replaced. Marks
    /// that show nothing are dropped, but for the joiners, which some scripts are written with.
    /// </summary>
    public static string Of(string text)
    {
        var line = new StringBuilder(text.Length);
        var gap = false;
        foreach (var rune in text.EnumerateRunes())
        {
            if (ShowsNothing(rune.Value))
            {
                continue;
            }

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

    private static bool ShowsNothing(int code) =>
        code is 0x00AD or 0x180E or 0x200B or (>= 0x2060 and <= 0x2064) or (>= 0xFFF9 and <= 0xFFFB) or (>= 0xE0000 and <= 0xE007F);

    private static bool TurnsDirection(int code) =>
        code is 0x061C or 0x200E or 0x200F or (>= 0x202A and <= 0x202E) or (>= 0x2066 and <= 0x206F) or 0xFEFF;
}
