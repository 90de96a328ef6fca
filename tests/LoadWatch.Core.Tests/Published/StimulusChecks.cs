namespace LoadWatch.Tests.Published;

/// <summary>What endurance channels ask of motor units: recruitment in dynamic work, the cost of slopes.</summary>
internal static class StimulusChecks
{
    public static IReadOnlyList<PublishedCheck> Rows { get; } = [];
}
