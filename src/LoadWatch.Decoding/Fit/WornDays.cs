using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Dates on which a watch was worn and no walk and no run began: a day of rest, unless another recording tells of training. A date counts when something was
/// written in half of its hours (a choice), by the local time that the watch states; without one nothing is said.
/// </summary>
internal static class WornDays
{
    private const string Layout = "monitoring";
    private const int LeastHours = 12;
    private const int MinutesPerHour = 60;

    /// <param name="bouts">The walks and runs of the same log.</param>
    public static IReadOnlyList<LocalDate> Of(PartContent content, IEnumerable<Recording> bouts) => content.LocalOffsetSeconds is not { } offset ? [] :
    [
        .. content.Monitoring.Minutes.Keys
            .Select(minute => Local(content, minute, offset))
            .GroupBy(time => time.Date)
            .Where(date => date.Select(time => time.Hour).Distinct().Count() >= LeastHours)
            .Select(date => date.Key)
            .Except(bouts.Select(bout => bout.Start).OfType<Instant>().Select(start => start.WithOffset(Offset.FromSeconds(offset)).Date)),
    ];

    public static DecodedTable Table(IEnumerable<LocalDate> dates) => new(
        RowKind.Days,
        Layout,
        [.. dates.Distinct().Order().Select((date, i) => new TableRow(null, date, LocalDatePattern.Iso.Format(date), new DayRow(DayWord.Rest), i + 1))]);

    /// <summary>What tells whose device it was: its numbers and a moment at noon of each date.</summary>
    public static IEnumerable<Recording> Witnesses(PartContent content, IReadOnlyList<LocalDate> dates) => dates.Select((date, i) => new Recording
    {
        Part = i + 1,
        Sport = Sport.Generic,
        Start = (date + new LocalTime(12, 0)).WithOffset(Offset.FromSeconds(content.LocalOffsetSeconds ?? 0)).ToInstant(),
        Device = content.Device,
    });

    private static LocalDateTime Local(PartContent content, long minute, int offset) =>
        Instant.FromUnixTimeMilliseconds(content.Clock.UnixMilliseconds(minute * MinutesPerHour * 1000)).WithOffset(Offset.FromSeconds(offset)).LocalDateTime;
}
