using System.Text;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Which of two numbers of a date is the day.</summary>
internal enum DateOrder
{
    /// <summary>The writing leaves no doubt.</summary>
    Plain,

    /// <summary>31/03.</summary>
    DayFirst,

    /// <summary>03/31.</summary>
    MonthFirst,
}

/// <summary>One way of writing moments, dates or times of day, as a layout names it.</summary>
/// <param name="Read">What a cell says: a count that grows with time, in ms, and whether it is of no stated zone. Null where it is not written so.</param>
internal sealed record Notation(string Format, DateOrder Order, Notation.Reading Read)
{
    public delegate (long Milliseconds, bool IsLocal)? Reading(ReadOnlySpan<byte> cell);

    private const int DigitsAtLeast = 6;
    private const int LongestCell = 40;

    private static readonly (string Pattern, DateOrder Order)[] DatePatterns =
    [
        ("yyyy-MM-dd", DateOrder.Plain), ("yyyy/MM/dd", DateOrder.Plain), ("yyyy.MM.dd", DateOrder.Plain), ("yyyyMMdd", DateOrder.Plain),
        ("dd.MM.yyyy", DateOrder.DayFirst), ("d.M.yyyy", DateOrder.DayFirst), ("dd.MM.yy", DateOrder.DayFirst),
        ("dd/MM/yyyy", DateOrder.DayFirst), ("d/M/yyyy", DateOrder.DayFirst), ("dd-MM-yyyy", DateOrder.DayFirst), ("d-M-yyyy", DateOrder.DayFirst),
        ("MM/dd/yyyy", DateOrder.MonthFirst), ("M/d/yyyy", DateOrder.MonthFirst), ("MM-dd-yyyy", DateOrder.MonthFirst), ("M-d-yyyy", DateOrder.MonthFirst),
    ];

    private static readonly string[] TimePatterns =
    [
        "HH:mm:ss", "HH:mm:ss.f", "HH:mm:ss.ff", "HH:mm:ss.fff", "HH:mm:ss.FFFFFFFFF", "HH:mm:ss;FFFFFFFFF", "H:mm:ss", "HH:mm", "H:mm", "HH.mm.ss", "H.mm.ss", "HH.mm",
        "hh:mm:ss tt", "h:mm:ss tt", "h:mm tt",
    ];

    private static readonly string[] Between = [" ", "'T'", ", "];

    private static readonly DateTimeZone Utc = DateTimeZone.Utc;

    /// <summary>Those of moments that a first cell is written in.</summary>
    public static IReadOnlyList<Notation> MomentsOf(byte[] cell) => Fitting(
        cell,
        [
            OfMoment(CsvTimeColumn.Iso8601, DateOrder.Plain),
            .. from date in DatePatterns
               from between in Between
               from time in TimePatterns
               where MayBe(cell, date.Pattern)
               select OfMoment($"{date.Pattern}{between}{time}", date.Order),
        ]);

    public static IReadOnlyList<Notation> DatesOf(byte[] cell) => Fitting(cell, [.. DatePatterns.Where(date => MayBe(cell, date.Pattern)).Select(date => OfDate(date.Pattern, date.Order))]);

    public static IReadOnlyList<Notation> TimesOf(byte[] cell) => Fitting(cell, [.. TimePatterns.Select(OfTime)]);

    private static IReadOnlyList<Notation> Fitting(byte[] cell, IEnumerable<Notation> all) => [.. all.Where(notation => notation.Read(cell) is not null)];

    /// <summary>Spares making hundreds of patterns for cells that are no dates at all.</summary>
    private static bool MayBe(byte[] cell, string pattern) => cell.Count(c => char.IsAsciiDigit((char)c)) >= DigitsAtLeast
        && cell.Length <= LongestCell && pattern.FirstOrDefault(c => !char.IsLetter(c)) is var mark && (mark == '\0' || cell.AsSpan().Contains((byte)mark));

    private static Notation OfMoment(string format, DateOrder order)
    {
        var notation = TimeNotation.Of(format, '.');
        return new Notation(format, order, cell => notation.TryRead(cell, out var time)
            ? ((time.Instant ?? time.Local.InZoneStrictly(Utc).ToInstant()).ToUnixTimeMilliseconds(), time.Instant is null)
            : null);
    }

    private static Notation OfDate(string format, DateOrder order)
    {
        var pattern = LocalDatePattern.CreateWithInvariantCulture(format);
        return new Notation(format == "yyyy-MM-dd" ? CsvTimeColumn.Iso8601 : format, order, cell => pattern.Parse(Text(cell)).TryGetValue(default, out var date) && date.Year is >= 2000 and <= 2100
            ? (date.AtStartOfDayInZone(Utc).ToInstant().ToUnixTimeMilliseconds(), true)
            : null);
    }

    private static Notation OfTime(string format)
    {
        var pattern = LocalTimePattern.CreateWithInvariantCulture(format);
        return new Notation(format, DateOrder.Plain, cell => pattern.Parse(Text(cell)).TryGetValue(default, out var time) ? (time.TickOfDay / NodaConstants.TicksPerMillisecond, true) : null);
    }

    private static string Text(ReadOnlySpan<byte> cell) => cell.Length > 64 ? "" : Encoding.UTF8.GetString(cell);
}
