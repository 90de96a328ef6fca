// A heavy-or-fast day of a body region: the line of HeavyOrFastLine, with counts summed over the activities of the day, mid values of their bands.
using LoadWatch.Stimulus;

namespace LoadWatch.Days;

/// <summary>Judges whether a date was heavy or fast for a body region.</summary>
internal static class HeavyOrFast
{
    /// <summary>Null when unknown: nothing is known of the date, or work of the region was done that no channel could see.</summary>
    public static bool? Judge(CalendarDate date, BodyRegion region) => date.State switch
    {
        DayState.Rest => false,
        DayState.Recorded => JudgeWork(date, region),
        _ => null,
    };

    /// <summary>Whether some activity of the date had a figure that could see hard work of the region.</summary>
    public static bool IsSeen(CalendarDate date, BodyRegion region) => date.Activities.Any(activity => Of(activity, region).Any(stimulus => stimulus.SeesHardWork));

    private static bool? JudgeWork(CalendarDate date, BodyRegion region)
    {
        if (Reaches(date, region))
        {
            return true;
        }

        return HasUnseenWork(date, region) ? null : false;
    }

    private static bool Reaches(CalendarDate date, BodyRegion region)
    {
        var work = date.Activities.SelectMany(activity => Of(activity, region)).ToList();
        return HeavyOrFastLine.Reached(
            work.Sum(stimulus => stimulus.HardBouts?.Mid ?? 0),
            work.Sum(stimulus => stimulus.HardRepetitions?.Mid ?? 0),
            work.Sum(stimulus => stimulus.HardSets ?? 0));
    }

    /// <summary>An activity without an entry for the region is no work of it.</summary>
    private static bool HasUnseenWork(CalendarDate date, BodyRegion region) =>
        date.Activities.Any(activity => Of(activity, region).Any() && !Of(activity, region).Any(stimulus => stimulus.SeesHardWork));

    private static IEnumerable<RegionStimulus> Of(ActivityOnDay activity, BodyRegion region) =>
        activity.Stimulus.Where(stimulus => stimulus.Region == region);
}
