namespace LoadWatch.Tests.Published;

/// <summary>Loads and their trends.</summary>
internal static class LoadChecks
{
    public static IReadOnlyList<PublishedCheck> Rows { get; } = [];
}
