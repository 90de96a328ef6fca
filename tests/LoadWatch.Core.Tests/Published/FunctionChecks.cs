namespace LoadWatch.Tests.Published;

/// <summary>Function tests of older people.</summary>
internal static class FunctionChecks
{
    public static IReadOnlyList<PublishedCheck> Rows { get; } = [];
}
