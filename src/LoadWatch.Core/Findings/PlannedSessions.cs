using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>The planned sessions of a person that should have brought a recording and have not, since the last one that came. Takes every day in order.</summary>
internal sealed class PlannedSessions(SilenceLimits limits)
{
    /// <summary>A plan that has expected nothing for so long says nothing about silence any more. Days.</summary>
    private const int WatchedDays = 28;

    private readonly List<LocalDate> without = [];
    private readonly List<LocalDate> expected = [];
    private LocalDate today;

    /// <summary>Whether the plan has told often enough when recordings are to come; a plan that begins does not hide a silence that stands.</summary>
    public bool IsWatched => expected.Count(date => date.PlusDays(limits.PlannedWaitDays) <= today) >= limits.PlannedMissed;

    /// <summary>Dates without a recording, oldest first, those left out that may still come in.</summary>
    public IReadOnlyList<LocalDate> Missed => [.. without.TakeWhile(date => date.PlusDays(limits.PlannedWaitDays) <= today)];

    public void Add(Day day)
    {
        today = day.Date;
        expected.RemoveAll(date => Period.DaysBetween(date, today) > WatchedDays);
        if (day.Plan.Expected > 0)
        {
            expected.Add(day.Date);
        }

        if (day.State == DayState.Recorded || day.Plan.Absence is not null)
        {
            without.Clear();
        }
        else if (day.Plan.Expected > 0)
        {
            without.Add(day.Date);
        }
    }
}
