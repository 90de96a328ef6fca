namespace LoadWatch.Tests.Published;

/// <summary>Every check against a published number. A new one is one more line in one of the lists, or one more list here.</summary>
public static class PublishedChecks
{
    /// <summary>By the name of its list, in the order of the table.</summary>
    public static IReadOnlyList<(string List, PublishedCheck Check)> All { get; } =
    [
        .. List(nameof(PoolChecks), PoolChecks.Rows),
        .. List(nameof(CapacityChecks), CapacityChecks.Rows),
        .. List(nameof(StimulusChecks), StimulusChecks.Rows),
        .. List(nameof(StrengthChecks), StrengthChecks.Rows),
        .. List(nameof(HeartRateChecks), HeartRateChecks.Rows),
        .. List(nameof(EffortChecks), EffortChecks.Rows),
        .. List(nameof(LoadChecks), LoadChecks.Rows),
        .. List(nameof(FunctionChecks), FunctionChecks.Rows),
    ];

    private static IEnumerable<(string List, PublishedCheck Check)> List(string name, IEnumerable<PublishedCheck> rows) => rows.Select(row => (name, row));
}
