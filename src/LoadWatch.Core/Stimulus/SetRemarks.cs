namespace LoadWatch.Stimulus;

/// <summary>What the sets that were read leave open, in plain words.</summary>
internal static class SetRemarks
{
    public static IEnumerable<string> Of(IReadOnlyList<SetDemand> demands)
    {
        (Func<SetDemand, bool> Holds, string Before, string After)[] remarks =
        [
            (demand => demand is { Rule: SetRule.LoadAndMaximum, Reserve: null }, "repetitions in reserve", "a lower bound"),
            (demand => demand.IsMaximumBorrowed, "maximum on the machine", "that of the exercise stands in"),
            (demand => demand.Rule == SetRule.DeclaredFast, "load or maximum", "counted as hard because they were declared fast"),
            (demand => demand is { Rule: SetRule.Fast, Grade: Grade.C }, "speed", "fast as declared"),
            (demand => demand.IsSlowerThanDeclared, "speed", "declared fast, measured slower: read by the load"),
            (demand => demand.Rule == SetRule.Hold, "force", "held, only the last 3 s are read, by the rating"),
        ];
        return remarks
            .Select(remark => (Count: demands.Count(remark.Holds), remark.Before, remark.After))
            .Where(remark => remark.Count > 0)
            .Select(remark => $"{remark.Before} of {remark.Count} of {demands.Count} sets: {remark.After}");
    }
}
