using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Stimulus;

namespace LoadWatch.Activities;

/// <summary>
/// What a session with table rows asked of each region. Logged sets stand for the recording's regions as <see cref="SetsAndChannels"/> says. Declared content speaks only where no channel could see hard work.
/// </summary>
internal static class JoinedStimulus
{
    private const string Unseen = "nothing recorded it: logged sets or declared content would tell";

    /// <param name="log">What the logged sets of the session asked of each region, or null without any.</param>
    /// <param name="content">As declared, or null.</param>
    /// <returns>Legs first, and whether the content asks for a body region.</returns>
    public static (IReadOnlyList<RegionStimulus> Regions, bool IsRegionAsked) Of(
        RecordedActivity? recording, IReadOnlyList<RegionStimulus>? log, DeclaredContent? content, Sport sport, ComputationSettings settings)
    {
        var regions = SportRegions.Of(sport, settings.Sports) ?? (sport.IsTeamSport ? [BodyRegion.Legs] : null);
        var seen = Seen(recording?.Values.Stimulus, log, regions);
        if (content is not { } declared || seen.Any(region => region.SeesHardWork))
        {
            return (seen, false);
        }

        return DeclaredStimulus.IsHard(declared) && regions is null
            ? (seen, true)
            : (DeclaredStimulus.Of(declared, JoinWording.Word(declared), regions ?? BodyRegions.All, seen), false);
    }

    private static IReadOnlyList<RegionStimulus> Seen(
        IReadOnlyList<RegionStimulus>? recorded, IReadOnlyList<RegionStimulus>? log, IReadOnlyList<BodyRegion>? regions) => log is null
        ? recorded ?? [.. (regions ?? BodyRegions.All).Select(region => EnduranceEstimate.Nothing.For(region, [Unseen]))]
        : SetsAndChannels.Best(log, recorded ?? []);
}
