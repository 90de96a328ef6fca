using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>A sport as a cell or a layout names it.</summary>
internal static class SportWord
{
    private const int LongestCharacters = 64;

    /// <summary><c>cycling</c> or <c>training/strength_training</c>; null for what is no such word.</summary>
    public static Sport? Read(string text)
    {
        var parts = text.Trim().Split('/');
        return text.Length <= LongestCharacters && parts.Length <= 2 && Array.TrueForAll(parts, IsWord)
            ? new Sport(parts[0], parts.Length == 2 ? parts[1] : null)
            : null;
    }

    private static bool IsWord(string part) =>
        part.Length > 0 && part.All(c => char.IsAsciiLetterLower(c) || char.IsAsciiDigit(c) || c == '_');
}
