using System.Globalization;
using System.Text;
using LoadWatch.Days;
using LoadWatch.People;
using LoadWatch.Service.Export;
using NodaTime;
using static LoadWatch.Service.Explain.DayTrendText;

namespace LoadWatch.Service.Explain;

/// <summary>A day's trends of load with the loads that they are computed from.</summary>
internal static class LoadTrendText
{
    private const int WeekDays = 7;
    private const int WeeksBefore = 3;

    /// <param name="day">As it is stored.</param>
    /// <param name="days">Those up to it by its reference values; of them the last 28 are read.</param>
    public static void Append(StringBuilder text, Day day, IReadOnlyList<Day> days, Group group)
    {
        Line(text, $"load ({group.LoadQuantity})", day.Load);
        AppendLoads(text, day.Date, days.ToDictionary(one => one.Date));
        Line(text, "acute = sum of the known loads of 7 days x 7 / known days", day.Acute);
        Line(text, "chronic = mean week of 28 days: sum of their known loads x 7 / known days", day.Chronic);
        Line(text, "mean week of days 8 to 28 back: sum of their known loads x 7 / known days", day.ChronicBefore);
        Line(text, "ratio, coupled = acute / chronic (Lolli et al. 2019, Br J Sports Med 53:921-922)", day.RatioCoupled);
        Line(text, "ratio, uncoupled = acute / mean week of days 8 to 28 back (Windt and Gabbett 2018, Br J Sports Med 53:988-990)", day.RatioUncoupled);
        AppendAverages(text, day);
        Line(text, "ratio of exponential averages, E7 / E28 (Williams et al. 2017, Br J Sports Med 51:209-210)", day.RatioEwma);
        Line(text, "change against the week before, fraction", day.WeeklyChange);
        Line(text, $"monotony = mean / SD ({group.Deviation.Divisor()}) of 7 days (Foster 1998)", day.Monotony);
        Line(text, "strain = week x monotony (Foster 1998)", day.Strain);
        Line(text, "share of 7 days with known load", day.Coverage7);
        Line(text, "share of 28 days with known load", day.Coverage28);
    }

    private static void AppendLoads(StringBuilder text, LocalDate date, Dictionary<LocalDate, Day> days)
    {
        var week = Enumerable.Range(0, WeekDays).Select(at => date.PlusDays(at + 1 - WeekDays));
        text.AppendLine(CultureInfo.InvariantCulture, $"        the 7 days to {Words.Date(date)}: {string.Join(", ", week.Select(one => Number(days.GetValueOrDefault(one)?.Load)))}");
        var weeks = Enumerable.Range(1, WeeksBefore).Select(back =>
        {
            var last = date.PlusDays(-WeekDays * back);
            List<double> known = [.. Enumerable.Range(0, WeekDays).Select(at => days.GetValueOrDefault(last.PlusDays(-at))?.Load).OfType<double>()];
            return $"W{back} to {Words.Date(last)} {(known.Count == 0 ? "unknown" : Number(known.Sum()))}{(known.Count is > 0 and < WeekDays ? $" ({known.Count} days known)" : "")}";
        });
        text.AppendLine(CultureInfo.InvariantCulture, $"        the weeks before: {string.Join(", ", weeks)}");
    }

    private static void AppendAverages(StringBuilder text, Day day)
    {
        Line(text, "exponential average E7 = lambda x load + (1 - lambda) x E7 of the day before, lambda = 2 / (7 + 1) = 0.25, a day", day.EwmaAcute);
        Line(text, "exponential average E28, the same with lambda = 2 / (28 + 1) = 0.069, a day", day.EwmaChronic);
        if (day.DaysSinceFirstCovered is { } ago)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"        both start with the first known load, that of {Words.Date(day.Date.PlusDays(-ago))}, and stay as they were over an unknown day (a choice)");
        }
    }
}
