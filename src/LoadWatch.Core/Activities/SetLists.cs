using LoadWatch.People;
using LoadWatch.Rows;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>
/// Puts rows of a set log together: rows of one table and date with the same number are one session. Rows without a number are one session until nothing
/// was logged for 2 hours (a choice: nobody rests that long between sets); it is told by its first time.
/// </summary>
internal static class SetLists
{
    private static readonly Duration LongestBreak = Duration.FromHours(2);

    public static IEnumerable<StatedSession> Of(IEnumerable<OwnedRow> rows, Person person, AnchorBook anchors, ComputationSettings settings) => rows
        .Where(row => row.Content is SetRow)
        .Select(row => new LoggedSet(row.Layout, row.Date, row.Key, (SetRow)row.Content))
        .GroupBy(set => (set.Layout, set.Date))
        .SelectMany(table => Marked([.. table]).GroupBy(set => set.Mark, set => set.Set, StringComparer.Ordinal))
        .Select(session => OfSession(session.Key, [.. InOrder(session)], person, anchors, settings));

    private static StatedSession OfSession(
        string mark, List<LoggedSet> sets, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var date = sets[0].Date;
        return new StatedSession
        {
            Layout = sets[0].Layout,
            Date = date,
            Mark = mark,
            Order = sets.Min(set => set.Row.Order),
            Start = sets.Min(set => set.Row.Time),
            Sets = StatedSets.Of([.. sets.Select(set => SetRows.Set(set.Row, date, person))], date, person, anchors, settings),
        };
    }

    private static IEnumerable<(string Mark, LoggedSet Set)> Marked(List<LoggedSet> sets)
    {
        var unnumbered = sets.FindAll(set => set.Row.Order is null);
        var starts = Starts([.. unnumbered.Select(set => set.Row.Time).OfType<LocalTime>().Order()]);
        return sets.Select(set => (StatedSessions.Mark(set.Row.Order, StartOf(set.Row.Time, starts)), set));
    }

    /// <summary>First times of the stretches between long breaks.</summary>
    private static List<LocalTime> Starts(List<LocalTime> times)
    {
        List<LocalTime> starts = [];
        for (var at = 0; at < times.Count; at++)
        {
            if (at == 0 || SinceMidnight(times[at]) - SinceMidnight(times[at - 1]) > LongestBreak)
            {
                starts.Add(times[at]);
            }
        }

        return starts;
    }

    /// <summary>A set without a time belongs to the first stretch.</summary>
    private static LocalTime? StartOf(LocalTime? time, List<LocalTime> starts)
    {
        if (starts.Count == 0)
        {
            return null;
        }

        return time is { } known ? starts.FindLast(start => start <= known) : starts[0];
    }

    private static Duration SinceMidnight(LocalTime time) => Duration.FromNanoseconds(time.NanosecondOfDay);

    private static IEnumerable<LoggedSet> InOrder(IEnumerable<LoggedSet> sets) => sets
        .OrderBy(set => set.Row.Time)
        .ThenBy(set => set.Row.Exercise, StringComparer.Ordinal)
        .ThenBy(set => set.Row.Set)
        .ThenBy(set => set.Key, StringComparer.Ordinal);

    private sealed record LoggedSet(string Layout, LocalDate Date, string Key, SetRow Row);
}
