using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>The planned sessions of a person that should have brought a recording and have not, since the last one that came. Takes every day in order.</summary>
internal sealed class PlannedSessions(SilenceLimits limits)
{
    /// <summary>A plan that has expected nothing for so long says nothing about silence any more. Days.</summary>
    private const int WatchedDays = 28;

    private readonly List<LocalDate> without = [];
    private LocalDate? lastExpected;
    private LocalDate today;

    /// <summary>Whether the plan tells when recordings are to come.</summary>
    public bool IsWatched => lastExpected is { } last && Period.DaysBetween(last, today) <= WatchedDays;

    /// <summary>Dates without a recording, oldest first, those left out that may still come in.</summary>
    public IReadOnlyList<LocalDate> Missed => [.. without.TakeWhile(date => date.PlusDays(limits.PlannedWaitDays) <= today)];

    public void Add(Day day)
    {
        today = day.Date;
        if (day.Plan.Expected > 0)
        {
            lastExpected = day.Date;
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
