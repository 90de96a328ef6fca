using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Stimulus;

namespace LoadWatch.Activities;

/// <summary>
/// What a session with table rows asked of each region. Logged sets are the whole work of their session, so they stand for the recording's regions, but
/// for those that power or speed saw better; they are never added. Declared content speaks only where no channel could see hard work.
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
        IReadOnlyList<RegionStimulus>? recorded, IReadOnlyList<RegionStimulus>? log, IReadOnlyList<BodyRegion>? regions)
    {
        if (log is null)
        {
            return recorded ?? [.. (regions ?? BodyRegions.All).Select(region => EnduranceEstimate.Nothing.For(region, [Unseen]))];
        }

        var ofChannels = (recorded ?? []).Where(region => region.Channel is StimulusChannels.Power or StimulusChannels.Speed);
        return [.. log.Concat(ofChannels)
            .GroupBy(region => region.Region)
            .Select(region => region.OrderBy(one => one.Grade).First())
            .OrderBy(region => region.Region)];
    }
}
