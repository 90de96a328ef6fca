using LoadWatch.Days;
using NodaTime;

namespace LoadWatch.Findings;

/// <summary>The planned sessions of a person that should have brought a recording and have not, since the last one that came. Takes every day in order.</summary>
/// <param name="before">As it stood on the day before the first date.</param>
internal sealed class PlannedSessions(SilenceLimits limits, MissedSessions? before)
{
    /// <summary>A plan that has expected nothing for so long says nothing about silence any more. Days.</summary>
    internal const int WatchedDays = 28;

    /// <summary>Of more than these only the number is kept: a season without any recording is told by its first ones.</summary>
    private const int Told = 20;

    /// <summary>A plan that told fewer of the recent sessions than this says little of when the next is to come: then the person's own rhythm does. A choice. Share.</summary>
    internal const double ToldShare = 0.7;

    private readonly List<LocalDate> expected = [];
    private readonly List<(LocalDate Date, bool Told)> recorded = [];
    private readonly List<LocalDate> first = [.. before?.First ?? []];
    private readonly List<LocalDate> pending = [.. before?.Pending ?? []];
    private int missed = before?.Count ?? 0;
    private LocalDate today;

    /// <summary>
    /// Whether the plan has told often enough when recordings are to come, and told most of those that came; a plan that begins does not hide a silence that stands.
    /// </summary>
    public bool IsWatched => expected.Count(date => date.PlusDays(limits.PlannedWaitDays) <= today) >= limits.PlannedMissed
        && recorded.Count(session => session.Told) >= Significant.Round(ToldShare * recorded.Count);

    /// <summary>How many are without a recording, those left out that may still come in.</summary>
    public int Missed => missed;

    /// <summary>Dates of the first of them, oldest first; at least as many as raise something.</summary>
    public IReadOnlyList<LocalDate> First => first;

    /// <summary>What the next date needs; null: nothing.</summary>
    public MissedSessions? State => missed == 0 && pending.Count == 0 ? null : new MissedSessions(missed, [.. first], [.. pending]);

    /// <summary>A day before the first date.</summary>
    public void Learn(Day day)
    {
        today = day.Date;
        expected.RemoveAll(date => Period.DaysBetween(date, today) > WatchedDays);
        if (day.Plan.Expected > 0)
        {
            expected.Add(day.Date);
        }

        if (day.State == DayState.Recorded)
        {
            recorded.RemoveAll(session => Period.DaysBetween(session.Date, today) > WatchedDays);
            recorded.Add((day.Date, day.Plan.Expected > 0));
        }
    }

    public void Add(Day day)
    {
        Learn(day);
        if (day.State == DayState.Recorded || day.Plan.Absence is not null)
        {
            missed = 0;
            first.Clear();
            pending.Clear();
        }
        else if (day.Plan.Expected > 0)
        {
            pending.Add(day.Date);
        }

        Count();
    }

    private void Count()
    {
        var due = pending.FindAll(date => date.PlusDays(limits.PlannedWaitDays) <= today);
        pending.RemoveRange(0, due.Count);
        missed += due.Count;
        first.AddRange(due.Take(Told - first.Count));
    }
}

/// <param name="Count">Sessions without a recording.</param>
/// <param name="First">Dates of the first of them.</param>
/// <param name="Pending">Dates of those that may still come in.</param>
internal sealed record MissedSessions(int Count, IReadOnlyList<LocalDate> First, IReadOnlyList<LocalDate> Pending);
