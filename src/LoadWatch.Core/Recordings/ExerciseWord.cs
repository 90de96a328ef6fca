using System.Text;

namespace LoadWatch.Recordings;

/// <summary>The word of an exercise or a machine as people write it, in one form: <c>Leg  Press</c>, <c>leg-press</c> and <c>leg_press</c> are one.</summary>
public static class ExerciseWord
{
    /// <summary>Lower case, every run of blanks, hyphens and underscores one underscore, none at the ends. Null for null and where nothing is left.</summary>
    public static string? Canonical(string? word)
    {
        if (word is null)
        {
            return null;
        }

        var text = new StringBuilder(word.Length);
        var apart = false;
        foreach (var letter in word)
        {
            if (IsBetween(letter))
            {
                apart = text.Length > 0;
                continue;
            }

            text.Append(apart ? "_" : "").Append(char.ToLowerInvariant(letter));
            apart = false;
        }

        return text.Length == 0 ? null : text.ToString();
    }

    /// <summary>U+2010 to U+2015 are the hyphens and dashes that word processors put in.</summary>
    private static bool IsBetween(char letter) => letter is '_' or '-' or (>= '\u2010' and <= '\u2015') || char.IsWhiteSpace(letter);
}
