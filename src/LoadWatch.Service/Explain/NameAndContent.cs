
namespace LoadWatch.Service.Explain;

/// <summary>Content decides what a file is. Where its name ends like another kind, that is told, since a person may look for the mistake there.</summary>
public static class NameAndContent
{
    /// <summary><c>named .fit, but its content is zip</c>; null where they agree, or either says nothing.</summary>
    /// <param name="path">A name, perhaps inside an archive.</param>
    /// <param name="kind">What the content was found to be, in a word; null before it was decoded.</param>
    public static string? Mismatch(string path, string? kind)
    {
        var ending = Path.GetExtension(path).ToLowerInvariant();
        string[] expected = ending switch
        {
            ".fit" => ["fit"],
            ".csv" or ".tsv" or ".txt" => ["csv", "table", "text"],
            ".gz" => ["gzip"],
            ".zip" => ["zip"],
            _ => [],
        };
        return expected.Length == 0 || kind is null or "unknown" || expected.Contains(kind, StringComparer.Ordinal)
            ? null
            : $"named {OneLine.Of(ending)}, but its content is {kind}";
    }
}
