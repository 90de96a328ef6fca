using System.Text;
using LoadWatch.Recordings;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv;

/// <summary>Puts together times of day and a column of dates.</summary>
internal sealed class DayClock
{
    private const string IsoTime = "HH':'mm':'ss;FFFFFFFFF";
    private const string IsoDate = "uuuu'-'MM'-'dd";

    // A choice: a row that lies further back than this belongs to the next day, one that lies less far back ran backwards.
    private const long NextDayFromTicks = 12 * NodaConstants.TicksPerHour;

    private readonly CsvTable table;
    private readonly int timeColumn;
    private readonly int dateColumn;
    private readonly LocalTimePattern times;
    private readonly LocalDatePattern dates;
    private LocalDateTime? firstOfFile;

    public DayClock(CsvTable table, CsvTimeColumn time)
    {
        this.table = table;
        timeColumn = table.Find(time.Column)!.Value;
        dateColumn = table.Find(time.DateColumn)!.Value;
        times = Times(time.Format);
        dates = Dates(time.DateFormat);
    }

    public static IEnumerable<string> Complaints(CsvTimeColumn time)
    {
        if (time.StartColumn is not null)
        {
            yield return "time.start_column and time.date_column exclude each other";
        }

        if (Complaint(time.Format, () => Times(time.Format), new LocalTime(15, 42), "time of day") is { } wrongTime)
        {
            yield return $"time.format {wrongTime}";
        }

        if (Complaint(time.DateFormat, () => Dates(time.DateFormat), new LocalDate(2026, 10, 17), "full date") is { } wrongDate)
        {
            yield return $"time.date_format {wrongDate}";
        }
    }

    /// <param name="rows">The row.</param>
    /// <param name="above">The moment of the row before it of the same person, or null; then the first of the file stands for it.</param>
    /// <param name="problem">Why the row cannot be dated.</param>
    public LocalDateTime? Read(CsvRows rows, LocalDateTime? above, out Problem? problem)
    {
        var date = DateOf(rows, out problem);
        var time = problem is null ? TimeOf(rows, out problem) : null;
        if (date is { } filled)
        {
            firstOfFile ??= filled + (time ?? LocalTime.Midnight);
        }

        if (problem is null && date is null && (above ?? firstOfFile) is null)
        {
            problem = table.Wrong(rows, dateColumn, "no date yet");
        }

        return problem is not null ? null : date is { } stated ? stated + time!.Value : GoingOn((above ?? firstOfFile)!.Value, time!.Value);
    }

    private static LocalDateTime GoingOn(LocalDateTime before, LocalTime time)
    {
        var sameDay = before.Date + time;
        return before.TimeOfDay.TickOfDay - time.TickOfDay > NextDayFromTicks ? sameDay.PlusDays(1) : sameDay;
    }

    private LocalDate? DateOf(CsvRows rows, out Problem? problem)
    {
        problem = null;
        if (rows[dateColumn].IsEmpty)
        {
            return null;
        }

        // Only the years 1 to 9998, so that a zone or the next day never leads out of the calendar.
        if (dates.Parse(Text(rows[dateColumn])).TryGetValue(default, out var date) && date.Year is >= 1 and <= 9998)
        {
            return date;
        }

        problem = table.Wrong(rows, dateColumn, "not a date as the layout writes it");
        return null;
    }

    private LocalTime? TimeOf(CsvRows rows, out Problem? problem)
    {
        problem = null;
        if (times.Parse(Text(rows[timeColumn])).TryGetValue(default, out var time))
        {
            return time;
        }

        problem = table.Wrong(rows, timeColumn, rows[timeColumn].IsEmpty ? "no time" : "not a time of day as the layout writes it");
        return null;
    }

    private static string Text(ReadOnlySpan<byte> cell) => cell.Length > 64 ? "" : Encoding.UTF8.GetString(cell);

    private static LocalTimePattern Times(string format) =>
        LocalTimePattern.CreateWithInvariantCulture(format == CsvTimeColumn.Iso8601 ? IsoTime : format);

    private static LocalDatePattern Dates(string format) =>
        LocalDatePattern.CreateWithInvariantCulture(format == CsvTimeColumn.Iso8601 ? IsoDate : format);

    /// <summary>A pattern that loses the year or the half of the day does not give the probe back.</summary>
    private static string? Complaint<T>(string format, Func<IPattern<T>> pattern, T probe, string what)
        where T : struct, IEquatable<T>
    {
        try
        {
            var made = pattern();
            return made.Parse(made.Format(probe)).TryGetValue(default, out var back) && back.Equals(probe)
                ? null
                : $"'{format}' does not hold a {what}";
        }
        catch (InvalidPatternException wrong)
        {
            return $"'{format}' is not a pattern of a {what}: {wrong.Message}";
        }
    }
}
