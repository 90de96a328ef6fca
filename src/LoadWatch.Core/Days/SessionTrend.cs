namespace LoadWatch.Days;

/// <summary>The largest sessions of the last 30 days. Takes the sessions of every date in order, oldest first.</summary>
internal sealed class SessionTrend
{
    private const int Days = 30;

    private readonly List<(double? Load, double? Run)> largest = [];

    /// <summary>As it stood on the last of some days.</summary>
    public static SessionTrend After(IReadOnlyList<Day> days)
    {
        var trend = new SessionTrend();
        foreach (var day in days.Skip(days.Count - Days))
        {
            trend.largest.Add(SessionSize.Largest(day.Sessions));
        }

        return trend;
    }

    /// <returns>By load, and the longest run in metres; each null where there is none.</returns>
    public (double? Load, double? Run) Add(IReadOnlyList<DaySession> sessions)
    {
        largest.Add(SessionSize.Largest(sessions));
        (double? Load, double? Run) found = (null, null);
        for (var index = Math.Max(0, largest.Count - Days); index < largest.Count; index++)
        {
            found = (SessionSize.Larger(found.Load, largest[index].Load), SessionSize.Larger(found.Run, largest[index].Run));
        }

        return found;
    }
}
