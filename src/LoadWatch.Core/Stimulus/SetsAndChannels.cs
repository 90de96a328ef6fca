namespace LoadWatch.Stimulus;

/// <summary>
/// Sets and endurance channels of one session, whether the sets stand in the recording or in a table. Sets are the whole work of their session but for regions that
/// power or speed saw better; the two are never added, as nobody knows which moments they share.
/// </summary>
internal static class SetsAndChannels
{
    /// <summary>By region what is graded best, the sets where both are alike, with a word on the other.</summary>
    /// <param name="sets">What the sets asked of each region.</param>
    /// <param name="recorded">What the channels of the recording say; those that are not power or speed are left out.</param>
    public static IReadOnlyList<RegionStimulus> Best(IReadOnlyList<RegionStimulus> sets, IReadOnlyList<RegionStimulus> recorded) =>
    [
        .. sets.Concat(recorded.Where(IsOfWork))
            .GroupBy(region => region.Region)
            .OrderBy(region => region.Key)
            .Select(region => Best([.. region.OrderBy(one => one.Grade)])),
    ];

    private static bool IsOfWork(RegionStimulus region) => region.Channel is StimulusChannels.Power or StimulusChannels.Speed;

    private static RegionStimulus Best(List<RegionStimulus> byGrade) => byGrade is [var best, var other]
        ? best with { NotSeen = [.. best.NotSeen, .. OfOther(other)] }
        : byGrade[0];

    private static IEnumerable<string> OfOther(RegionStimulus other) => other.Channel == StimulusChannels.None
        ? other.NotSeen
        : [$"{other.Channel} of the same session: not added, as its moments may be the same"];
}
