using LoadWatch.Stimulus;

namespace LoadWatch.Days;

/// <summary>
/// One body region's days of a person. Takes every date in order, oldest first. The region counts as covered from the first date on
/// which some channel could see hard work of it: before that, nothing is known of it, not even on a rest day.
/// </summary>
internal sealed class StimulusTrend(BodyRegion region)
{
    internal const int UsualDays = 365;
    internal const int GapsWanted = 4;

    /// <summary>Share of the days behind the usual number that must be known. A choice, as that of the rule at its default.</summary>
    private const double KnownShare = 0.7;

    private readonly List<bool?> judged = [];
    private readonly HeavyTally tally = new();
    private readonly List<int> heavyDays = [];
    private readonly RunningMedian gaps = new();
    private int oldestHeavy;
    private int knownDaysSince;

    /// <summary>Index of the first covered day, which stands in where there was no heavy-or-fast day yet; below 0 before the days at hand.</summary>
    private int firstCovered;

    public BodyRegion Region => region;

    /// <summary>The trend as it stood on the last of some days: all of them, or the last <see cref="LoadCalendar.LookBackDays"/>.</summary>
    public static StimulusTrend After(BodyRegion region, IReadOnlyList<Day> days)
    {
        var trend = new StimulusTrend(region);
        if (days.Count > 0 && days[^1].Regions.GetValueOrDefault(region) is { DaysSince: { } ago } last)
        {
            foreach (var day in days)
            {
                trend.Learn(day.Regions.GetValueOrDefault(region)?.HeavyOrFast);
            }

            trend.knownDaysSince = last.KnownDaysSince;
            trend.Remember(trend.Today - ago, last.Never);
        }

        return trend;
    }

    public RegionDay Add(CalendarDate date)
    {
        if (judged.Count == 0 && !HeavyOrFast.IsSeen(date, region))
        {
            return RegionDay.NotCovered;
        }

        Learn(HeavyOrFast.Judge(date, region));
        Count();
        ForgetOldGaps();
        return Told();
    }

    private RegionDay Told()
    {
        var (week, fortnight, month) = (tally.Among(Today, 7), tally.Among(Today, HeavyTally.WindowDays), tally.Among(Today, 28));
        return new RegionDay(judged[^1], Number(week), Number(month), Today - LastHeavy, knownDaysSince, gaps.Count >= GapsWanted ? gaps.Value : null)
        {
            Never = heavyDays.Count == 0,
            Days14 = Number(fortnight),
            Usual14 = tally.Usual(Today, KnownShare),
            Known7 = week.Known,
            Known14 = fortnight.Known,
            Known28 = month.Known,
        };
    }

    private static int? Number(HeavyCount count) => count.Known == 0 ? null : count.Heavy;

    private void Learn(bool? heavyOrFast)
    {
        judged.Add(heavyOrFast);
        tally.Add(heavyOrFast);
    }

    private int Today => judged.Count - 1;

    private int LastHeavy => heavyDays.Count == 0 ? firstCovered : heavyDays[^1];

    private void Remember(int reference, bool never)
    {
        firstCovered = reference;
        heavyDays.AddRange(Enumerable.Range(0, judged.Count).Where(index => judged[index] is true));
        if (!never && heavyDays.Count == 0)
        {
            heavyDays.Add(reference);
        }

        gaps.AddAll(heavyDays.Zip(heavyDays.Skip(1), (one, next) => (double)(next - one)));
        ForgetOldGaps();
    }

    private void Count()
    {
        if (judged[^1] is true)
        {
            gaps.Add(oldestHeavy < heavyDays.Count ? Today - LastHeavy : null);
            heavyDays.Add(Today);
            knownDaysSince = 0;
        }
        else if (judged[^1] is false && Today > 0)
        {
            knownDaysSince++;
        }
    }

    /// <summary>A gap counts while both of its heavy-or-fast days are among the last 365.</summary>
    private void ForgetOldGaps()
    {
        while (oldestHeavy < heavyDays.Count && heavyDays[oldestHeavy] <= Today - UsualDays)
        {
            gaps.Remove(oldestHeavy + 1 < heavyDays.Count ? heavyDays[oldestHeavy + 1] - heavyDays[oldestHeavy] : null);
            oldestHeavy++;
        }
    }
}
