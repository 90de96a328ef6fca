namespace LoadWatch.Notices;

/// <summary>Folds what is to be said of one person into one sentence.</summary>
internal static class PersonSentence
{
    /// <summary>Further reasons that are named; the rest is counted.</summary>
    private const int AlsoAtMost = 2;

    public static string What(FlaggedPerson person)
    {
        var also = Listed([.. person.Reasons.Skip(1).Select(Named)]);
        return also is null ? Part(person.Reasons[0].Sentence) : $"{Part(person.Reasons[0].Sentence)}; also {also}";
    }

    /// <summary>Several sentences as one, without the last full stop.</summary>
    public static string Part(string text) => OneLine.Of(text).TrimEnd('.').Split(". ").Aggregate((told, next) => $"{told}; {Lowered(next)}");

    public static string Since(FlaggedReason reason) => (reason.IsNew, reason.StandsSince) switch
    {
        (true, _) => "new",
        (_, { } since) => $"since {BriefNumbers.Day(since)}",
        _ => "",
    };

    /// <summary>The first ones by name, the rest counted; null for none.</summary>
    public static string? Listed(IReadOnlyList<string> names) => (names.Count, names.Count - AlsoAtMost) switch
    {
        (0, _) => null,
        (_, <= 0) => string.Join(" and ", names),
        var (_, more) => $"{string.Join(", ", names.Take(AlsoAtMost))} and {more} more",
    };

    private static string Named(FlaggedReason reason)
    {
        var words = reason.Named.Length > 0 ? OneLine.Of(reason.Named) : Lowered(Part(reason.Sentence));
        return (reason.IsNew, reason.IsSeen) switch
        {
            (true, _) => $"{words} (new)",
            (_, true) => $"{words} (seen)",
            _ => words,
        };
    }

    /// <summary>Without what another one begins with and says more of.</summary>
    public static IEnumerable<string> WithoutBeginnings(IReadOnlyList<string> parts) =>
        parts.Where(part => !parts.Any(other => other != part && other.StartsWith(part, StringComparison.Ordinal)));

    public static string Lowered(string text) => text.Length == 0 ? text : char.ToLowerInvariant(text[0]) + text[1..];
}
