using System.Collections.Immutable;
using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Lays activities out on unbroken dates and settles the state of every date (I-6).</summary>
internal static class CalendarDates
{
    /// <summary>A recording speaks for its source's empty days up to this many days before it, back to the source's last recording. Days.</summary>
    private const int SettledDaysBack = LoadCalendar.SettledDaysBack;

    /// <summary>Of every date without one; nothing is ever added to it.</summary>
    private static readonly List<ActivityOnDay> NoActivity = [];

    /// <summary>The dates behind <paramref name="last"/>, else from the first activity on, up to <paramref name="to"/>. Later activities only settle them.</summary>
    public static IEnumerable<CalendarDate> Lay(Day? last, IReadOnlyList<ActivityOnDay> activities, LocalDate to, PersonPlan plan)
    {
        var first = last?.Date.PlusDays(1) ?? (activities.Count == 0 ? LocalDate.MaxIsoValue : activities.Min(activity => activity.Date));
        return first > to ? [] : Settle(first, last, ByDate(first, to, activities), Period.DaysBetween(first, to) + 1, plan);
    }

    private static List<ActivityOnDay>[] ByDate(LocalDate first, LocalDate to, IReadOnlyList<ActivityOnDay> activities)
    {
        var dates = new List<ActivityOnDay>[Period.DaysBetween(first, to) + 1 + SettledDaysBack];
        Array.Fill(dates, NoActivity);
        foreach (var activity in activities.Where(activity => activity.Date >= first && activity.Date <= to.PlusDays(SettledDaysBack)).OrderBy(activity => activity.Key, StringComparer.Ordinal))
        {
            ref var date = ref dates[Period.DaysBetween(first, activity.Date)];
            date = ReferenceEquals(date, NoActivity) ? [] : date;
            date.Add(activity);
        }

        return dates;
    }

    private static IEnumerable<CalendarDate> Settle(LocalDate first, Day? last, List<ActivityOnDay>[] dates, int count, PersonPlan plan)
    {
        var sources = last?.Carried.Sources ?? Carried.Nothing.Sources;
        var witnesses = Witnesses(dates, sources.ToDictionary(seen => seen.Key, seen => Period.DaysBetween(first, seen.Value), StringComparer.Ordinal));
        var recorded = -1 - (last?.DaysSinceRecorded ?? 0);
        for (var index = 0; index < count; index++)
        {
            var date = first.PlusDays(index);
            recorded = dates[index].Count > 0 ? index : recorded;
            sources = Seen(sources, dates[index], date);
            var planned = plan.On(date);
            var (state, source) = State(dates[index].Count > 0, planned.RestStatedBy, planned.Expected > 0 ? null : witnesses[index]);
            yield return new CalendarDate(date, state, source, index - recorded, dates[index], planned, sources);
        }
    }

    private static (DayState State, string? Source) State(bool recorded, string? stated, string? witness) => (recorded, stated, witness) switch
    {
        (true, _, _) => (DayState.Recorded, "activities"),
        (false, not null, _) => (DayState.Rest, $"stated by {stated}"),
        (false, null, not null) => (DayState.Rest, $"inferred from {witness}"),
        _ => (DayState.Unknown, null),
    };

    private static IReadOnlyDictionary<string, LocalDate> Seen(IReadOnlyDictionary<string, LocalDate> sources, List<ActivityOnDay> activities, LocalDate date)
    {
        if (activities.Count == 0)
        {
            return sources;
        }

        var seen = sources as ImmutableSortedDictionary<string, LocalDate> ?? sources.ToImmutableSortedDictionary(StringComparer.Ordinal);
        foreach (var activity in activities)
        {
            foreach (var source in activity.Sources)
            {
                seen = seen.SetItem(source, date);
            }
        }

        return seen;
    }

    /// <summary>
    /// For every date the ordinally smallest source that recorded before it and again within the 7 days after it, or null. A source says nothing about
    /// the time before its first recording: a new watch does not know what the old one would have seen.
    /// </summary>
    /// <param name="before">Index of the last recorded date by source; below 0 those before the first date.</param>
    private static string?[] Witnesses(List<ActivityOnDay>[] dates, Dictionary<string, int> before)
    {
        var witnesses = new string?[dates.Length];
        for (var index = 0; index < dates.Length; index++)
        {
            foreach (var source in dates[index].SelectMany(activity => activity.Sources).Distinct(StringComparer.Ordinal))
            {
                if (before.TryGetValue(source, out var last))
                {
                    Testify(witnesses.AsSpan(Math.Max(0, Math.Max(last + 1, index - SettledDaysBack))..index), source);
                }

                before[source] = index;
            }
        }

        return witnesses;
    }

    private static void Testify(Span<string?> earlier, string source)
    {
        foreach (ref var witness in earlier)
        {
            witness = witness is null || string.CompareOrdinal(source, witness) < 0 ? source : witness;
        }
    }
}
