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
    public static bool IsSeen(CalendarDate date, BodyRegion region)
    {
        foreach (var activity in date.Activities)
        {
            foreach (var stimulus in activity.Stimulus)
            {
                if (stimulus.Region == region && stimulus.SeesHardWork)
                {
                    return true;
                }
            }
        }

        return false;
    }

    /// <summary>An activity without an entry for the region is no work of it.</summary>
    private static bool? JudgeWork(CalendarDate date, BodyRegion region)
    {
        var (bouts, repetitions, sets, unseen) = (0.0, 0.0, 0, false);
        foreach (var activity in date.Activities)
        {
            var (told, seen) = (false, false);
            foreach (var stimulus in activity.Stimulus)
            {
                if (stimulus.Region == region)
                {
                    (told, seen) = (true, seen || stimulus.SeesHardWork);
                    bouts += stimulus.HardBouts?.Mid ?? 0;
                    repetitions += stimulus.HardRepetitions?.Mid ?? 0;
                    sets += stimulus.HardSets ?? 0;
                }
            }

            unseen |= told && !seen;
        }

        return HeavyOrFastLine.Reached(bouts, repetitions, sets) ? true : unseen ? null : false;
    }
}
