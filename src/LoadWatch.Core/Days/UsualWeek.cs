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
        Span<double> newest = stackalloc double[weeks];
        var loads = newest[..Fill(newest, before)];
        loads.Sort();
        return loads.Length < wanted || loads.Length == 0
            ? null
            : new UsualWeek(Significant.Round((loads[(loads.Length - 1) / 2] + loads[loads.Length / 2]) / 2), loads.Length);
    }

    /// <returns>How many there are.</returns>
    private static int Fill(Span<double> newest, IEnumerable<PastWeek> before)
    {
        var count = 0;
        foreach (var week in before)
        {
            if (count == newest.Length)
            {
                break;
            }

            if (week.IsOrdinary)
            {
                newest[count++] = week.Load!.Value;
            }
        }

        return count;
    }
}
