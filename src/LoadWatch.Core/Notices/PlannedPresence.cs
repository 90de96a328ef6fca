using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>How many recordings of the last planned session are in: somebody who sees 0 of 24 looks at the upload, not at 24 people.</summary>
/// <param name="Date">The last date on which a recording was expected of somebody.</param>
/// <param name="Expected">People of whom one was expected.</param>
/// <param name="In">Of these, those with a recording of the date.</param>
/// <param name="NotYet">Those whose recording may still come in by the limits of silence (<see cref="IsNotInYet"/>).</param>
internal sealed record PlannedPresence(LocalDate Date, int Expected, int In, int NotYet)
{
    private const int DaysBack = 3;

    /// <summary>Null where nothing was expected of anybody lately.</summary>
    public static PlannedPresence? Of(IReadOnlyList<BriefSubject> shown, LocalDate upTo)
    {
        var expected = shown
            .SelectMany(subject => subject.Days.TakeLast(DaysBack).Select(day => (Subject: subject, Day: day)))
            .Where(one => one.Day.Plan.Expected > 0 && one.Day.Date > upTo.PlusDays(-DaysBack) && one.Day.Date <= upTo)
            .ToLookup(one => one.Day.Date);
        if (expected.Count == 0)
        {
            return null;
        }

        var last = expected.MaxBy(days => days.Key)!;
        return new PlannedPresence(last.Key, last.Count(), last.Count(one => one.Day.State == DayState.Recorded), last.Count(one => IsNotInYet(one.Subject, one.Day, upTo)));
    }

    /// <summary>
    /// Whether a recording that the plan expects is not there, and the days that files are given to come in are not over: no reason to ask anybody yet. Of whom silence is told
    /// already, nothing is waited for.
    /// </summary>
    public static bool IsNotInYet(BriefSubject subject, Day day, LocalDate upTo) =>
        day is { State: DayState.Unknown, Plan: { Expected: > 0, Absence: null } }
        && day.Date.PlusDays(subject.Group.Limits.Silence.PlannedWaitDays) > upTo
        && BriefBuilder.Active(subject).All(news => news.Alert.Key.Rule != "silence");
}
