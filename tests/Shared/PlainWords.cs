using System.Text.RegularExpressions;
using LoadWatch.Notices;

namespace LoadWatch.Tests;

/// <summary>
/// I-13: words describe change and stimulus, never a probability, a diagnosis, a clearance or a debt. One list for whatever people read but the cautions, which say what LoadWatch
/// does not do. What staff state (ill, injured) is no word of ours, and a figure may be said to be no debt.
/// </summary>
internal static partial class PlainWords
{
    /// <summary>The first word that does not belong in a text; null: none.</summary>
    public static string? FirstBanned(string text) => Banned().Match(WithoutCautions(text)) is { Success: true } found ? found.Value : null;

    /// <summary>Passes over a text of nothing but plain words; the failure names the word and what stands around it.</summary>
    public static void Hold(string text)
    {
        var plain = WithoutCautions(text);
        if (Banned().Match(plain) is { Success: true } found)
        {
            var from = Math.Max(0, found.Index - 60);
            Assert.Fail($"\"{found.Value}\" in: {plain.Substring(from, Math.Min(plain.Length - from, 140))}");
        }
    }

    /// <summary>Cautions as they stand, and as lines of a text are folded.</summary>
    private static string WithoutCautions(string text) => ReadingNotes.Cautions.Aggregate(
        OneLine.Of(text.ReplaceLineEndings(" ")), (left, caution) => left.Replace(OneLine.Of(caution), "", StringComparison.Ordinal));

    [GeneratedRegex(
        @"\b(risk\w*|probab\w*|likel(y|ihood)|unlikely|chances?|predict\w*|foretell\w*|foresee\w*|prevent\w*|injury|injuries|diagnos\w*|overtrain\w*|overreach\w*|fatigue[ds]?|"
        + @"readiness|ready|safe\w*|danger\w*|harm(s|ed|ful|less)?|cleared|clearance|fit to|allowed to|must|should|ought|(?<!not a )debts?|owes?|owed|make up for|catch up)\b",
        RegexOptions.IgnoreCase | RegexOptions.ExplicitCapture)]
    private static partial Regex Banned();
}
