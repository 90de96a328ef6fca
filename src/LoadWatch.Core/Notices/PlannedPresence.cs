using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Notices;

/// <summary>How many recordings of the last planned session are in: somebody who sees 0 of 24 looks at the upload, not at 24 people.</summary>
/// <param name="Date">The last date on which a recording was expected of somebody.</param>
/// <param name="Expected">People of whom one was expected.</param>
/// <param name="In">Of these, those with a recording of the date.</param>
internal sealed record PlannedPresence(LocalDate Date, int Expected, int In)
{
    private const int DaysBack = 3;

    /// <summary>Null where nothing was expected of anybody lately.</summary>
    public static PlannedPresence? Of(IReadOnlyList<BriefSubject> shown, LocalDate upTo)
    {
        var expected = shown
            .SelectMany(subject => subject.Days.TakeLast(DaysBack))
            .Where(day => day.Plan.Expected > 0 && day.Date > upTo.PlusDays(-DaysBack) && day.Date <= upTo)
            .ToLookup(day => day.Date);
        if (expected.Count == 0)
        {
            return null;
        }

        var last = expected.MaxBy(days => days.Key)!;
        return new PlannedPresence(last.Key, last.Count(), last.Count(day => day.State == DayState.Recorded));
    }
}
