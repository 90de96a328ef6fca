using LoadWatch.Notices;
using LoadWatch.Service.Export;
using LoadWatch.Storage.Decisions;

namespace LoadWatch.Service.Explain;

/// <summary>When and by whom something was decided, and why.</summary>
public static class DecisionText
{
    /// <summary><c> 2026-03-31T06:30:00Z by NAME: NOTE</c>, without what was not said.</summary>
    public static string Circumstances(Decision decision)
    {
        var by = decision.By is { } name ? $" by {OneLine.Of(name)}" : "";
        var note = decision.Note is { } words ? $": {OneLine.Of(words)}" : "";
        return $" {Words.Utc(decision.Made)}{by}{note}";
    }
}
