using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>A part with the numbers drawn for it.</summary>
/// <param name="Anchors">As <c>anchors.csv</c> will say, already rounded.</param>
/// <param name="Maxima">What the person can lift once, kilograms by exercise; not all of it was tested.</param>
public sealed record DemoPerson(DemoPart Part, Person Person, Device Device, IReadOnlyList<Anchor> Anchors, IReadOnlyDictionary<string, double> Maxima)
{
    /// <summary>A member whose heart rate says nothing about effort; the roster says so and not why.</summary>
    private const string WithoutHeartRate = "hilkka";

    private static readonly string[] ShortNames = ["aune", "hilkka", "reino", "toivo"];

    /// <summary>People's zone in the demo.</summary>
    public static DateTimeZone Zone { get; } = DateTimeZoneProviders.Tzdb["Europe/Helsinki"];

    public double HeartRateRestBpm => Value(AnchorKind.HeartRateRest);

    public double HeartRateMaxBpm => Value(AnchorKind.HeartRateMax);

    public double CriticalPowerWatts => Value(AnchorKind.CriticalPower);

    public double OneRepetitionMaxKilograms(string exercise) => Maxima[exercise];

    /// <summary>The name under which the tables of the clinic know the person: the short one, where the roster has it.</summary>
    public string NameInTables => Person.Aliases is [var alias, ..] ? alias : Person.Name;

    /// <param name="until">The morning of the brief; birth years and dates of tests follow from it.</param>
    public static DemoPerson Draw(DemoPart part, int seed, LocalDate until)
    {
        var random = DemoRandom.For(seed, "person", part.Id);
        var device = new Device(Decoding.Fit.FitActivity.Development, Product(part), random.Whole(100_000, 999_999));
        var person = new Person(part.Id, part.Name, part.Group, until.Year - part.Age, part.Sex, Zone)
        {
            Aliases = ShortNames.Contains(part.Id) ? [Shortened(part.Name)] : [],
            HeartRateInvalid = part.Id == WithoutHeartRate ? DatePeriods.Always : DatePeriods.Never,
        };
        var first = until.PlusDays(-DemoTimeline.Days);
        var anchors = DemoAnchors.Of(part, random, first).ToList();
        var maxima = DemoAnchors.Maxima(part, random);
        return new DemoPerson(part, person, device, [.. anchors, .. DemoAnchors.Tested(part, maxima, first)], maxima);
    }

    /// <summary>Surname and first letter.</summary>
    private static string Shortened(string name) => $"{name[(name.IndexOf(' ', StringComparison.Ordinal) + 1)..]} {name[0]}";

    private static int Product(DemoPart part) => part.Group switch
    {
        DemoCast.Boat => 11,
        DemoCast.Class => 12,
        _ => 13,
    };

    private double Value(AnchorKind kind) => Anchors.First(anchor => anchor.Kind == kind).Value;
}
