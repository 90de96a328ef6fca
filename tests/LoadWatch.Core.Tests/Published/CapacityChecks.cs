namespace LoadWatch.Tests.Published;

/// <summary>Critical power and speed, W' and its recovery, time to exhaustion.</summary>
internal static class CapacityChecks
{
    public static IReadOnlyList<PublishedCheck> Rows { get; } = [];
}
