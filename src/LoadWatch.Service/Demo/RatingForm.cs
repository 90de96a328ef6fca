using System.Globalization;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>
/// The squad's form of ratings, which grows every night: how hard each session was. Two lines leave a question: one of a day with two sessions that does not
/// say which, and one of a day without a recording that says no minutes.
/// </summary>
internal sealed class RatingForm(IReadOnlyList<DemoPerson> people, int seed, LocalDate until)
{
    public const string Path = "inbox/boat/ratings.csv";

    /// <summary>Rates a day with two sessions without saying which; on Wednesdays five-row weeks have two.</summary>
    private const string OneForTwo = "eero";

    /// <summary>Rates a day without a recording; on Tuesdays three-day weeks have none.</summary>
    private const string OneForNone = "helmi";

    private readonly List<(LocalDate Date, string Line)> lines =
    [
        .. people
            .Where(person => person.Part.Group == DemoCast.Boat)
            .SelectMany(person => Of(person, seed, until))
            .OrderBy(line => line.Date),
    ];

    public DemoFile Version(LocalDate morning) => DemoTable.File(
        Path, "person,date,session,rating,minutes", lines.Where(line => line.Date < morning).Select(line => line.Line), morning);

    private static IEnumerable<(LocalDate Date, string Line)> Of(DemoPerson person, int seed, LocalDate until)
    {
        var unclear = DemoCalendar.LatestBefore(until, 1, IsoDayOfWeek.Wednesday);
        var unrecorded = DemoCalendar.LatestBefore(until, 1, IsoDayOfWeek.Tuesday);
        foreach (var day in DemoTimeline.Of(person.Part, seed, until).GroupBy(planned => planned.Date))
        {
            if (person.Part.Id == OneForTwo && day.Key == unclear)
                yield return (day.Key, $"{person.Part.Id},{DemoCalendar.Iso(day.Key)},,6,");
            else
                foreach (var (planned, order) in day.OrderBy(planned => planned.Slot.At).Select((planned, at) => (planned, at + 1)))
                    yield return (day.Key, Line(person, planned, order, seed));
        }

        if (person.Part.Id == OneForNone)
            yield return (unrecorded, $"{person.Part.Id},{DemoCalendar.Iso(unrecorded)},1,4,");
    }

    private static string Line(DemoPerson person, PlannedSession planned, int order, int seed)
    {
        var random = DemoRandom.For(seed, "rating " + person.Part.Id, planned.Start);
        var rating = Usual(planned.Slot.Kind) + (0.5 * random.Whole(-1, 1));
        var minutes = Math.Round(DemoSessions.Minutes(person, planned, seed));
        return string.Create(CultureInfo.InvariantCulture, $"{person.Part.Id},{DemoCalendar.Iso(planned.Date)},{order},{rating},{minutes}");
    }

    private static double Usual(SessionKind kind) => kind switch
    {
        SessionKind.RowIntervals => 7.5,
        SessionKind.Gym => 6.5,
        _ => 4,
    };
}
