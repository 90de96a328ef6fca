using LoadWatch.Service.Export;
using LoadWatch.Storage.Decisions;

namespace LoadWatch.Service.Explain;

/// <summary>What was decided, when and by whom, by which table, and why.</summary>
public static class DecisionText
{
    /// <summary><c>shelved until 2026-04-07 2026-03-31T06:30:00Z by NAME: NOTE</c>, without what was not said.</summary>
    /// <param name="all">Where a withdrawal finds what it withdrew.</param>
    public static string Sentence(Decision decision, IReadOnlyList<Decision> all) => $"{What(decision, all)}{Circumstances(decision)}";

    /// <summary><c> 2026-03-31T06:30:00Z by NAME: NOTE</c>, without what was not said.</summary>
    public static string Circumstances(Decision decision)
    {
        var by = decision.By is { } name ? $" by {OneLine.Of(name)}" : "";
        var table = decision.Via is { } via ? $" in {OneLine.Of(via.Split('|')[1])}" : "";
        var note = decision.Note is { } words ? $": {OneLine.Of(words)}" : "";
        return $" {Words.Utc(decision.Made)}{by}{table}{note}";
    }

    /// <summary><c>ill from 2026-03-02 until 2026-03-09</c>.</summary>
    public static string What(Decision decision, IReadOnlyList<Decision> all) => decision.Kind switch
    {
        DecisionKind.Acknowledge => "acknowledged",
        DecisionKind.Assign => $"assigned to {decision.Person}",
        DecisionKind.Shelve => $"shelved until {Words.Date(decision.Until!.Value)}",
        DecisionKind.Withdraw when all.FirstOrDefault(earlier => earlier.Id == decision.Subject) is { } earlier => $"withdrawn: {What(earlier, all)}",
        DecisionKind.Withdraw => "withdrawn",
        DecisionKind.Rest or DecisionKind.Match when decision.Until is null => $"{Words.Of(decision.Kind)} on {Words.Date(decision.From!.Value)}",
        _ => $"{Words.Of(decision.Kind)} from {Words.Date(decision.From!.Value)}{(decision.Until is { } until ? $" until {Words.Date(until)}" : "")}",
    };
}
