namespace LoadWatch.Days;

/// <summary>What a person's week usually holds: the median of their ordinary weeks (<see cref="PastWeek.IsOrdinary"/>). Rules and days ask here.</summary>
/// <param name="Load">In the unit of the series.</param>
/// <param name="Weeks">Weeks that it rests on, count.</param>
internal readonly record struct UsualWeek(double Load, int Weeks)
{
    /// <summary>Null under <paramref name="wanted"/> ordinary weeks.</summary>
    /// <param name="before">Weeks before, the newest first.</param>
    /// <param name="weeks">So many ordinary ones count, the newest.</param>
    public static UsualWeek? Of(IEnumerable<PastWeek> before, int weeks, int wanted)
    {
        var loads = Newest(before, weeks);
        loads.Sort();
        return loads.Count < wanted || loads.Count == 0
            ? null
            : new UsualWeek(Significant.Round((loads[(loads.Count - 1) / 2] + loads[loads.Count / 2]) / 2), loads.Count);
    }

    private static List<double> Newest(IEnumerable<PastWeek> before, int weeks)
    {
        var loads = new List<double>(weeks);
        foreach (var week in before)
        {
            if (week.IsOrdinary)
            {
                loads.Add(week.Load!.Value);
                if (loads.Count == weeks)
                {
                    break;
                }
            }
        }

        return loads;
    }
}
