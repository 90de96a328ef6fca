using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Demo;

/// <summary>Dates of the demo that everybody of a group shares, counted from the morning of the brief.</summary>
internal static class DemoCalendar
{
    /// <summary>Nights that come one after the other at the end: a table that grows has a version for each.</summary>
    public const int Nights = 4;

    /// <summary>Exports and uploads are through by then, local time.</summary>
    private static readonly LocalTime UploadedBy = new(4, 30);

    /// <summary>The morning on which folders and tables were set up, then the mornings after the nights, the last that of the brief.</summary>
    public static IReadOnlyList<LocalDate> Mornings(LocalDate until) => [.. Enumerable.Range(0, Nights + 1).Select(night => until.PlusDays(night - Nights))];

    /// <summary>When what came in the night before a morning was written.</summary>
    public static Instant Written(LocalDate morning) => (morning + UploadedBy).InZoneLeniently(DemoPerson.Zone).ToInstant();

    /// <summary>The squad's day off.</summary>
    public static LocalDate DayOff(LocalDate until) => LatestBefore(until, 54, IsoDayOfWeek.Thursday);

    /// <summary>A regatta on a Saturday and the Sunday after it.</summary>
    public static LocalDate Regatta(LocalDate until) => LatestBefore(until, 44, IsoDayOfWeek.Saturday);

    /// <summary>First date of the week of camp before the season, a Monday.</summary>
    public static LocalDate Camp(LocalDate until) => LatestBefore(until, 68, IsoDayOfWeek.Monday);

    public static bool IsInCamp(LocalDate date, LocalDate until) => Period.DaysBetween(Camp(until), date) is >= 0 and < 7;

    public static string Iso(LocalDate date) => LocalDatePattern.Iso.Format(date);

    /// <summary>The latest such day at least so many days before the brief.</summary>
    public static LocalDate LatestBefore(LocalDate until, int back, IsoDayOfWeek day) =>
        Enumerable.Range(back, 7).Select(days => until.PlusDays(-days)).First(date => date.DayOfWeek == day);
}
