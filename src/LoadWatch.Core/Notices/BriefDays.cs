using NodaTime;

namespace LoadWatch.Notices;

/// <summary>How many days of somebody a brief looks back at: few of most people, more of those who were away, return, or have a picture.</summary>
public static class BriefDays
{
    /// <summary>A strip of 28 days, and the day before it, on which the four weeks before end.</summary>
    public const int Usual = 29;

    /// <summary>The 56 days of a picture, or the 12 weeks before the last seven days in which its usual weeks lie, with the week that each begins from.</summary>
    public const int OfPicture = 126;

    /// <summary>Nobody's break is followed further back.</summary>
    public const int AtMost = 400;

    /// <summary>Whether the days read do not reach back to where a break began that the brief tells of.</summary>
    /// <param name="subject">With the days read so far.</param>
    public static bool WantsMore(BriefSubject subject)
    {
        if (subject.Days is not [var first, .., var last] || Period.DaysBetween(first.Date, last.Date) + 1 >= AtMost)
        {
            return false;
        }

        return last.Plan.Absence is { } absence
            ? subject.Days.All(day => day.Plan.Absence == absence)
            : last.Plan.ReturnDay is not null && first.Plan.Absence is not null;
    }
}
