using LoadWatch.Rows;

namespace LoadWatch.Stimulus;

/// <summary>
/// Stimulus of a session in which no channel could see hard work, as staff declared it: heavy, fast and match count as heavy or fast, easy and
/// rehabilitation as none. Grade D. No source: a statement, taken as stated.
/// </summary>
public static class DeclaredStimulus
{
    /// <summary>Stands for the line, not for a count: nobody counted bouts, so the upper end is not known to hold either.</summary>
    private static readonly Band AtTheLine = new(0, HeavyOrFastLine.Bouts, HeavyOrFastLine.Bouts);

    /// <summary>Whether the content counts as heavy or fast.</summary>
    public static bool IsHard(DeclaredContent content) => content is DeclaredContent.Heavy or DeclaredContent.Fast or DeclaredContent.Match;

    /// <summary>One entry per region, legs first. What a poorer channel told of the slow and medium classes stays.</summary>
    /// <param name="word">The content as people write it.</param>
    /// <param name="regions">That the session went through.</param>
    /// <param name="unseen">What is known of the regions; none of it tells hard work.</param>
    public static IReadOnlyList<RegionStimulus> Of(
        DeclaredContent content, string word, IReadOnlyList<BodyRegion> regions, IReadOnlyList<RegionStimulus> unseen) =>
        [.. regions.Distinct().Order().Select(region => Told(region, unseen)).Select(told => told with
        {
            Grade = Grade.D,
            Channel = StimulusChannels.Declared,
            HardBouts = IsHard(content) ? AtTheLine : default(Band),
            NotSeen = [$"declared {word}: stated, not seen", .. told.NotSeen],
        })];

    private static RegionStimulus Told(BodyRegion region, IReadOnlyList<RegionStimulus> unseen) =>
        unseen.FirstOrDefault(one => one.Region == region && one.Channel != StimulusChannels.None) ?? EnduranceEstimate.Nothing.For(region, []);
}
