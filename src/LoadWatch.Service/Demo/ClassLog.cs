using System.Globalization;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>
/// The clinic's set log: one table, exported whole every night. The gym writes names as it knows them. Now and then a line is wrong until somebody sees it:
/// two are corrected and one is taken out, on the nights before the brief.
/// </summary>
internal sealed class ClassLog(IReadOnlyList<DemoPerson> people, int seed, LocalDate until)
{
    public const string Path = "inbox/class/sets.csv";

    /// <summary>Slips are in classes at least so many days before the brief.</summary>
    private const int SlipsBack = 5;

    private const int PlatesSlippedBy = 10;

    private static readonly string[] Slipped = ["martta", "onni", "esko"];

    private readonly List<(DemoPerson Person, LoggedSet Set)> lines =
    [
        .. people
            .Where(person => person.Part.Group == DemoCast.Class)
            .SelectMany(person => DemoTimeline.Of(person.Part, seed, until)
                .SelectMany(planned => ClassSession.Sets(person, planned, DemoRandom.For(seed, person.Part.Id, planned.Start)))
                .Select(set => (person, set)))
            .OrderBy(line => line.set.Date)
            .ThenBy(line => line.set.Time)
            .ThenBy(line => line.person.Part.Id, StringComparer.Ordinal),
    ];

    /// <summary>As exported in the night before a morning.</summary>
    public DemoFile Version(LocalDate morning)
    {
        var exported = lines.Where(line => line.Set.Date < morning).SelectMany(line => AsOf(line.Person, line.Set, Period.DaysBetween(morning, until)).Select(set => Line(line.Person, set)));
        return DemoTable.File(Path, "person,date,time,exercise,machine,set,repetitions,kilograms,hardness,seconds,load,hold", exported, morning);
    }

    /// <param name="back">Nights to come until the brief.</param>
    private IEnumerable<LoggedSet> AsOf(DemoPerson person, LoggedSet set, int back)
    {
        if (set is not { Exercise: "leg_press", Set: 1 } || !Slipped.Contains(person.Part.Id) || set.Date != LastBefore(person))
            return [set];

        return person.Part.Id switch
        {
            "martta" when back >= 3 => [set with { Kilograms = set.Kilograms * PlatesSlippedBy }],
            "onni" when back >= 2 => [set with { Hardness = 1 }],
            "esko" when back >= 2 => [set, set with { Set = 4, Time = set.Time.PlusMinutes(7) }],
            _ => [set],
        };
    }

    private LocalDate LastBefore(DemoPerson person) =>
        DemoTimeline.Of(person.Part, seed, until).Last(planned => planned.Date <= until.PlusDays(-SlipsBack)).Date;

    private static string Line(DemoPerson person, LoggedSet set) => string.Create(
        CultureInfo.InvariantCulture,
        $"{person.NameInTables},{DemoCalendar.Iso(set.Date)},{set.Time:HH:mm},{set.Exercise},{set.Machine},{set.Set},{set.Repetitions},{set.Kilograms},{set.Hardness},{set.Seconds},{set.Load},{(set.IsHold ? "yes" : "")}");
}
