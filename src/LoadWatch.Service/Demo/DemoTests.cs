using System.Globalization;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Function tests of some members, ten weeks and two weeks before the brief: usual values for all but one.</summary>
internal static class DemoTests
{
    public const string Path = "inbox/class/tests.csv";

    private const int FirstBack = 70;
    private const int SecondBack = 14;

    private static readonly string[] Tested = ["aune", "elvi", "esko", "irja", "onni", "reino"];

    public static DemoFile Of(IReadOnlyList<DemoPerson> people, int seed, LocalDate until) => DemoTable.File(
        Path,
        "person,date,test,value,unit,hand,device",
        people.SelectMany(person => Lines(person.Part, DemoRandom.For(seed, "tests", person.Part.Id), until)),
        DemoCalendar.Mornings(until)[0]);

    private static IEnumerable<string> Lines(DemoPart part, DemoRandom random, LocalDate until)
    {
        if (part.Plot == DemoPlot.WeakGrip)
        {
            yield return Line(part, until, FirstBack, $"grip_strength,{Number(random.Between(17, 18))},kg,right,dynamometer 2");
            yield return Line(part, until, SecondBack, $"grip_strength,{Number(random.Between(14.2, 15.4))},kg,right,dynamometer 2");
        }
        else if (Tested.Contains(part.Id))
        {
            var grip = part.Sex == People.Sex.Male ? random.Between(32, 40) : random.Between(20, 26);
            var gait = random.Between(1.0, 1.25);
            foreach (var back in new[] { FirstBack, SecondBack })
            {
                yield return Line(part, until, back, $"grip_strength,{Number(grip + random.Between(-1, 1))},kg,right,dynamometer 2");
                yield return Line(part, until, back, $"gait_speed,{(gait + random.Between(-0.03, 0.03)).ToString("0.00", CultureInfo.InvariantCulture)},m/s,,corridor of 4 m");
            }
        }
    }

    private static string Line(DemoPart part, LocalDate until, int back, string rest) => $"{part.Id},{DemoCalendar.Iso(until.PlusDays(-back))},{rest}";

    private static string Number(double value) => value.ToString("0.0", CultureInfo.InvariantCulture);
}
