using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Two tracking pods that two rowers hand to each other every Monday. Their recordings lie in one folder and name nobody: serial and date tell.</summary>
internal static class DemoPods
{
    public const string Folder = "pods";

    private const int Product = 14;

    private static readonly long[] Serials = [700_101, 700_102];
    private static readonly string[] People = ["inka", "sanni"];

    /// <summary>Null for everybody else.</summary>
    public static Device? Of(string person, LocalDate date) => Array.IndexOf(People, person) is >= 0 and var place
        ? new Device(Decoding.Fit.FitActivity.Development, Product, Serials[(place + Week(date)) % 2])
        : null;

    /// <summary>Lines of <c>devices.csv</c>, a week and pod each.</summary>
    public static IEnumerable<string> Assignments(LocalDate until)
    {
        var last = until.PlusDays(-1);
        for (var monday = Monday(until.PlusDays(-DemoTimeline.Days)); monday <= last; monday = monday.PlusDays(7))
        {
            foreach (var person in People)
                yield return $"{Of(person, monday)!.Serial},{person},{DemoCalendar.Iso(monday)},{DemoCalendar.Iso(monday.PlusDays(6))},";
        }
    }

    private static LocalDate Monday(LocalDate date) => date.PlusDays(1).Previous(IsoDayOfWeek.Monday);

    private static int Week(LocalDate date) => Period.DaysBetween(new LocalDate(2024, 1, 1), Monday(date)) / 7;
}
