using System.Globalization;
using System.Text;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Page;

/// <summary>
/// A person's last days as shapes for one small drawing: a bar for a day's load on the person's own scale, a hollow box where nothing is known, a hollow bar
/// with a cross-stroke where a session's load could not be computed; below, a filled diamond for a heavy-or-fast leg day, a hollow one where that is unknown.
/// </summary>
/// <param name="Width">Of the drawing; its height is 36.</param>
/// <param name="UsualY">Height of the line of a usual day, or null.</param>
/// <param name="Words">What it shows, for a reader who hears the page.</param>
public sealed record Strip(
    int Width,
    string Bars,
    string Rests,
    string Unknowns,
    string Uncomputed,
    string Heavy,
    string HeavyUnknown,
    string? UsualY,
    string Words)
{
    private const int Pitch = 6;
    private const int BarWidth = 4;
    private const int Baseline = 25;
    private const double Tallest = 23;
    private const int DiamondY = 31;

    public static Strip Of(BriefRow row, string unit)
    {
        var days = row.Recent;
        var usualDay = row.UsualWeekLoad / 7;
        var top = Math.Max(days.Max(day => day.Load) ?? 0, usualDay ?? 0);
        return new Strip(
            Math.Max(1, days.Count) * Pitch,
            Draw(days, day => day.Load is > 0, (day, x) => Bar(x, Height(day.Load!.Value, top))),
            Draw(days, day => day.Load is 0, (_, x) => $"M{x} {Baseline - 1}h{BarWidth}v1h-{BarWidth}z"),
            Draw(days, day => !day.Known, (_, x) => Box(x, 4)),
            Draw(days, day => day.Known && day.Load is null, (_, x) => Box(x, 10) + $"M{x}.5 {Baseline - 2}l3 -6"),
            Draw(days, day => day.HeavyLegs == true, (_, x) => Diamond(x, 3)),
            Draw(days, day => day.HeavyLegs is null, (_, x) => Diamond(x, 2)),
            usualDay is { } usual && top > 0 ? Number(Baseline - Height(usual, top)) : null,
            InWords(days, unit));
    }

    private static string Draw(IReadOnlyList<BriefDay> days, Func<BriefDay, bool> belongs, Func<BriefDay, int, string> shape)
    {
        var path = new StringBuilder();
        for (var place = 0; place < days.Count; place++)
        {
            if (belongs(days[place]))
            {
                path.Append(shape(days[place], (place * Pitch) + 1));
            }
        }

        return path.ToString();
    }

    /// <summary>A small load stays visible.</summary>
    private static double Height(double load, double top) => Math.Max(1.5, load / top * Tallest);

    private static string Bar(int x, double height) => $"M{x} {Baseline}v-{Number(height)}h{BarWidth}v{Number(height)}z";

    private static string Box(int x, int height) => $"M{x}.5 {Baseline - height}.5h3v{height - 1}h-3z";

    private static string Diamond(int x, int radius) => $"M{x + 2} {DiamondY - radius}l{radius} {radius}l-{radius} {radius}l-{radius} -{radius}z";

    private static string Number(double value) => value.ToString("0.#", CultureInfo.InvariantCulture);

    private static string InWords(IReadOnlyList<BriefDay> days, string unit)
    {
        if (days.Count == 0)
        {
            return "No days yet.";
        }

        var uncomputed = days.Count(day => day.Known && day.Load is null);
        var parts = new[]
        {
            $"{(days.Count == 1 ? "1 day" : $"{days.Count} days")} to {BriefNumbers.Day(days[^1].Date)}: load on {days.Count(day => day.Load is > 0)}",
            Highest(days, unit),
            $"none on {days.Count(day => day.Load is 0)}",
            $"unknown on {days.Count(day => !day.Known)}",
            uncomputed == 0 ? null : $"recorded without a load on {uncomputed}",
        };
        return $"{string.Join(", ", parts.Where(part => part is not null))}. {Legs(days)}";
    }

    private static string? Highest(IReadOnlyList<BriefDay> days, string unit) => days.Where(day => day.Load is > 0).MaxBy(day => day.Load) is { } day
        ? $"the highest {BriefNumbers.Load(day.Load)} {OneLine.Of(unit)} on {BriefNumbers.Day(day.Date)}"
        : null;

    private static string Legs(IReadOnlyList<BriefDay> days)
    {
        var heavy = days.Count(day => day.HeavyLegs == true);
        var last = days.LastOrDefault(day => day.HeavyLegs == true);
        var when = last is null ? "" : $", the last on {BriefNumbers.Day(last.Date)}";
        return $"Heavy or fast leg work on {heavy}{when}, unknown on {days.Count(day => day.HeavyLegs is null)}.";
    }
}
