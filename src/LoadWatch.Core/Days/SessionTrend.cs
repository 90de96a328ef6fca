namespace LoadWatch.Days;

/// <summary>The largest sessions of the last 30 days. Takes every date in order, with its sessions, oldest first.</summary>
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

    public Day Add(Day day)
    {
        largest.Add(SessionSize.Largest(day.Sessions));
        (double? Load, double? Run) found = (null, null);
        for (var index = Math.Max(0, largest.Count - Days); index < largest.Count; index++)
        {
            found = (SessionSize.Larger(found.Load, largest[index].Load), SessionSize.Larger(found.Run, largest[index].Run));
        }

        return day with { LargestSession30 = found.Load, LongestRunMetres30 = found.Run };
    }
}
