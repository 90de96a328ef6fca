using System.Globalization;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Activities;

/// <summary>
/// Puts session rows together: rows of one table and date with the same number, else the same start, are one session, its drills among them. A row with
/// neither is the first one; further ones of the kind, without a drill, are sessions of their own in the order of their keys. What the row without a drill
/// says counts for the session; drills tell the rest.
/// </summary>
internal static class StatedSessions
{
    public static IEnumerable<StatedSession> Of(IEnumerable<OwnedRow> rows) => rows
        .OrderBy(row => row.Key.Length)
        .ThenBy(row => row.Key, StringComparer.Ordinal)
        .Where(row => row.Content is SessionRow)
        .Select(row => (row.Layout, row.Date, Row: (SessionRow)row.Content))
        .GroupBy(row => (row.Layout, row.Date, Mark: Mark(row.Row.Order, row.Row.Start)), row => row.Row)
        .SelectMany(group => Parted([.. group]).Select((rows, at) =>
            OfSession(group.Key.Layout, group.Key.Date, at == 0 ? group.Key.Mark : $"{group.Key.Mark}-{at + 1}", rows)));

    public static string Mark(int? order, LocalTime? start) => (order, start) switch
    {
        ({ } number, _) => number.ToString(CultureInfo.InvariantCulture),
        (null, { } time) => LocalTimePattern.ExtendedIso.Format(time),
        _ => "1",
    };

    private static IEnumerable<List<SessionRow>> Parted(List<SessionRow> rows)
    {
        var whole = rows.FindAll(row => row.Drill is null).OrderBy(row => row.Order is null).ToList();
        return [[.. whole.Take(1), .. rows.Where(row => row.Drill is not null)], .. whole.Skip(1).Select(row => new List<SessionRow> { row })];
    }

    private static StatedSession OfSession(string layout, LocalDate date, string mark, List<SessionRow> rows)
    {
        var whole = rows.FindAll(row => row.Drill is null);
        var drills = rows.FindAll(row => row.Drill is not null);
        return new StatedSession
        {
            Layout = layout,
            Date = date,
            Mark = mark,
            Order = rows.Min(row => row.Order),
            Start = whole.Min(row => row.Start) ?? drills.Min(row => row.Start),
            Sport = whole.Concat(drills).Select(SportOf).FirstOrDefault(sport => sport is not null),
            Quantities = StatedQuantities.Of(whole, drills),
            Content = whole.Find(row => row.Content is not null)?.Content ?? drills.Min(row => row.Content),
        };
    }

    private static Sport? SportOf(SessionRow row) => string.IsNullOrWhiteSpace(row.Sport) ? null : Sport.Parse(row.Sport);
}
