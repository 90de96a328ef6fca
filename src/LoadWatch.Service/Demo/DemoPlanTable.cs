using NodaTime;
using static NodaTime.IsoDayOfWeek;

namespace LoadWatch.Service.Demo;

/// <summary>What the staff planned: the squad's common rows, a day off, one rower's days off around a long row, a regatta, the camp before the season; the clinic's classes.</summary>
internal static class DemoPlanTable
{
    public const string Path = "inbox/plan.csv";

    private const int DaysAhead = 14;

    public static DemoFile Of(LocalDate until) => DemoTable.File(
        Path, "group,person,from,until,plan,start,end,recording,sport", Phases(until).Concat(Dates(until).SelectMany(date => Sessions(date, until))), DemoCalendar.Mornings(until)[0]);

    private static IEnumerable<string> Phases(LocalDate until)
    {
        var (camp, regatta) = (DemoCalendar.Camp(until), DemoCalendar.Regatta(until));
        yield return $"boat,,{DemoCalendar.Iso(camp)},{DemoCalendar.Iso(camp.PlusDays(6))},camp,,,,";
        yield return $"boat,,{DemoCalendar.Iso(DemoCalendar.DayOff(until))},,rest,,,,";
        foreach (var part in DemoCast.All.Where(part => part.Plot == DemoPlot.LongRow))
        {
            foreach (var back in DemoTimeline.OffAroundTheLongRow)
                yield return $",{part.Id},{DemoCalendar.Iso(until.PlusDays(-back))},,rest,,,,";
        }

        yield return $"boat,,{DemoCalendar.Iso(regatta)},,match,,,no,rowing";
        yield return $"boat,,{DemoCalendar.Iso(regatta.PlusDays(1))},,match,,,no,rowing";
    }

    private static IEnumerable<LocalDate> Dates(LocalDate until) => Enumerable.Range(-DemoTimeline.Days, DemoTimeline.Days + DaysAhead).Select(until.PlusDays);

    private static IEnumerable<string> Sessions(LocalDate date, LocalDate until) => date.DayOfWeek switch
    {
        Wednesday => [$"boat,,{DemoCalendar.Iso(date)},,team_session,06:40,08:00,yes,rowing"],
        Saturday when date != DemoCalendar.Regatta(until) => [$"boat,,{DemoCalendar.Iso(date)},,team_session,10:00,11:30,yes,rowing"],
        Tuesday or Thursday => [$"class,,{DemoCalendar.Iso(date)},,class,10:00,11:00,yes,"],
        _ => [],
    };
}
