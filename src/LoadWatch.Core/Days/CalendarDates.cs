using LoadWatch.Plans;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>Lays activities out on unbroken dates and settles the state of every date (I-6).</summary>
internal static class CalendarDates
{
    /// <summary>A recording speaks for its source's empty days up to this many days before it, back to the source's last recording. Days.</summary>
    private const int SettledDaysBack = 7;

    public static IEnumerable<CalendarDate> Lay(IReadOnlyList<ActivityOnDay> activities, LocalDate through, PersonPlan plan)
    {
        var counted = activities.Where(activity => activity.Date <= through).ToList();
        return counted.Count == 0 ? [] : Settle(counted.Min(activity => activity.Date), ByDate(counted, through), plan);
    }

    private static List<ActivityOnDay>[] ByDate(List<ActivityOnDay> activities, LocalDate through)
    {
        var first = activities.Min(activity => activity.Date);
        var dates = new List<ActivityOnDay>[Period.DaysBetween(first, through) + 1];
        for (var index = 0; index < dates.Length; index++)
        {
            dates[index] = [];
        }

        foreach (var activity in activities.OrderBy(activity => activity.Key, StringComparer.Ordinal))
        {
            dates[Period.DaysBetween(first, activity.Date)].Add(activity);
        }

        return dates;
    }

    private static IEnumerable<CalendarDate> Settle(LocalDate first, List<ActivityOnDay>[] dates, PersonPlan plan)
    {
        var witnesses = Witnesses(dates);
        var recorded = 0;
        for (var index = 0; index < dates.Length; index++)
        {
            recorded = dates[index].Count > 0 ? index : recorded;
            var planned = plan.On(first.PlusDays(index));
            var (state, source) = State(dates[index].Count > 0, planned.RestStatedBy, witnesses[index]);
            yield return new CalendarDate(first.PlusDays(index), index, state, source, index - recorded, dates[index], planned);
        }
    }

    private static (DayState State, string? Source) State(bool recorded, string? stated, string? witness) => (recorded, stated, witness) switch
    {
        (true, _, _) => (DayState.Recorded, "activities"),
        (false, not null, _) => (DayState.Rest, $"stated by {stated}"),
        (false, null, not null) => (DayState.Rest, $"inferred from {witness}"),
        _ => (DayState.Unknown, null),
    };

    /// <summary>
    /// For every date the ordinally smallest source that recorded before it and again within the 7 days after it, or null. A source says nothing about
    /// the time before its first recording: a new watch does not know what the old one would have seen.
    /// </summary>
    private static string?[] Witnesses(List<ActivityOnDay>[] dates)
    {
        var witnesses = new string?[dates.Length];
        var before = new Dictionary<string, int>(StringComparer.Ordinal);
        for (var index = 0; index < dates.Length; index++)
        {
            foreach (var source in dates[index].SelectMany(activity => activity.Sources).Distinct(StringComparer.Ordinal))
            {
                if (before.TryGetValue(source, out var last))
                {
                    Testify(witnesses.AsSpan(Math.Max(last + 1, index - SettledDaysBack)..index), source);
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
