// Acute and chronic load and their ratios.
//   coupled    A / ((A + W1 + W2 + W3) / 4)    Lolli et al. 2019, Br J Sports Med 53:921-922
//   uncoupled  A / ((W1 + W2 + W3) / 3)        Windt and Gabbett 2018, Br J Sports Med 53:988-990
//   weighted   E7 / E28                        Williams, West, Cross and Stokes 2017, Br J Sports Med 51:209-210
// A: load of the last 7 days, W1..W3: the weeks before, E: see WeightedAverage. Loads in the group's unit, ratios dimensionless.
// Departures: a window with unknown days is scaled to its known ones, and is null where too few are known; over zero a ratio is null.
using System.Runtime.InteropServices;
using NodaTime;

namespace LoadWatch.Days;

/// <summary>One person's load trends. Takes every date in order, oldest first.</summary>
/// <param name="deviation">Of monotony.</param>
/// <param name="firstCovered">The first date with known load, where that is known already.</param>
internal sealed class LoadTrend(LoadDeviation deviation, LocalDate? firstCovered = null)
{
    internal const int KnownOf7 = 5;
    internal const int KnownOf21 = 17;
    internal const int KnownOf28 = 22;
    internal const int MedianDays = 365;

    private readonly List<double?> loads = [];
    private readonly List<double?> chronics = [];
    private readonly RunningMedian chronicMedian = new();
    private readonly WeightedAverage acuteAverage = new(7);
    private readonly WeightedAverage chronicAverage = new(28);
    private readonly WeekTrend weeks = new();
    private LocalDate? firstCovered = firstCovered;

    /// <summary>The trends as they stood on the last of some days: all of them, or the last <see cref="LoadCalendar.LookBackDays"/>.</summary>
    public static LoadTrend After(IReadOnlyList<Day> days, LoadDeviation deviation)
    {
        if (days.Count == 0)
        {
            return new LoadTrend(deviation);
        }

        var last = days[^1];
        var trend = new LoadTrend(deviation, last.DaysSinceFirstCovered is { } ago ? last.Date.PlusDays(-ago) : null);
        foreach (var day in days)
        {
            trend.loads.Add(day.Load);
            trend.Learn(day.Chronic);
            trend.weeks.Learn(day);
        }

        trend.acuteAverage.GoOnFrom(last.EwmaAcute);
        trend.chronicAverage.GoOnFrom(last.EwmaChronic);
        return trend;
    }

    /// <summary>The same day with its load trends.</summary>
    public Day Add(Day day)
    {
        loads.Add(day.Load);
        firstCovered ??= day.Load.HasValue ? day.Date : null;
        var covered = firstCovered <= day.Date ? Period.DaysBetween(firstCovered.Value, day.Date) : (int?)null;
        var sums = Sums(covered);
        var (averageAcute, averageChronic) = (acuteAverage.Add(day.Load), chronicAverage.Add(day.Load));
        var monotony = LoadSpread.Monotony(Loads, deviation);
        var (usual, change) = weeks.Add(day.Date, sums.Acute, sums.Coverage7, day.Plan);
        Learn(sums.Chronic);
        return day with
        {
            DaysSinceFirstCovered = covered,
            Acute = sums.Acute,
            Chronic = sums.Chronic,
            ChronicBefore = sums.ChronicBefore,
            RatioCoupled = Ratio(sums.Acute, sums.Chronic),
            RatioUncoupled = Ratio(sums.Acute, sums.ChronicBefore),
            RatioEwma = sums is { Acute: not null, Chronic: not null } ? Ratio(averageAcute, averageChronic) : null,
            EwmaAcute = averageAcute,
            EwmaChronic = averageChronic,
            WeeklyChange = Ratio(sums.Acute - sums.LastWeek, sums.LastWeek),
            WeeklyChangeOrdinary = change,
            UsualWeek = usual,
            Monotony = monotony,
            Strain = LoadSpread.Strain(sums.Acute, monotony),
            ChronicMedian = chronicMedian.Value,
            Coverage7 = sums.Coverage7,
            Coverage28 = sums.Coverage28,
        };
    }

    private ReadOnlySpan<double?> Loads => CollectionsMarshal.AsSpan(loads);

    private WeekSums Sums(int? covered)
    {
        var (week, month) = (LoadWindow.Of(Loads, 0, 7), LoadWindow.Of(Loads, 0, 28));
        var chronic = covered >= 27 ? month.MeanWeek(KnownOf28) : null;
        return new WeekSums(
            week.MeanWeek(KnownOf7),
            LoadWindow.Of(Loads, 7, 7).MeanWeek(KnownOf7),
            chronic,
            chronic.HasValue ? LoadWindow.Of(Loads, 7, 21).MeanWeek(KnownOf21) : null,
            week.Coverage,
            month.Coverage);
    }

    private void Learn(double? chronic)
    {
        chronics.Add(chronic);
        chronicMedian.Add(chronic);
        chronicMedian.Remove(chronics.Count > MedianDays ? chronics[^(MedianDays + 1)] : null);
    }

    private static double? Ratio(double? value, double? over) => over is null or 0 ? null : Significant.Round(value / over);

    /// <summary>Of the weeks that end with a date.</summary>
    private readonly record struct WeekSums(double? Acute, double? LastWeek, double? Chronic, double? ChronicBefore, double Coverage7, double Coverage28);
}
