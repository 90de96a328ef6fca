using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>A part with the numbers drawn for it.</summary>
/// <param name="Anchors">As <c>anchors.csv</c> will say, already rounded.</param>
public sealed record DemoPerson(DemoPart Part, Person Person, Device Device, IReadOnlyList<Anchor> Anchors)
{
    /// <summary>People's zone in the demo.</summary>
    public static DateTimeZone Zone { get; } = DateTimeZoneProviders.Tzdb["Europe/Helsinki"];

    public double HeartRateRestBpm => Value(AnchorKind.HeartRateRest);

    public double HeartRateMaxBpm => Value(AnchorKind.HeartRateMax);

    public double CriticalPowerWatts => Value(AnchorKind.CriticalPower);

    public double OneRepetitionMaxKilograms(string exercise) => Value(AnchorKind.OneRepetitionMax, exercise);

    /// <param name="until">The morning of the brief; birth years and dates of tests follow from it.</param>
    public static DemoPerson Draw(DemoPart part, int seed, LocalDate until)
    {
        var random = DemoRandom.For(seed, "person", part.Id);
        var device = new Device(Decoding.Fit.FitActivity.Development, Product(part), random.Whole(100_000, 999_999));
        var person = new Person(part.Id, part.Name, part.Group, until.Year - part.Age, part.Sex, Zone);
        return new DemoPerson(part, person, device, [.. DemoAnchors.Of(part, random, until.PlusDays(-DemoTimeline.Days))]);
    }

    private static int Product(DemoPart part) => part.Group switch
    {
        DemoCast.Boat => 11,
        DemoCast.Class => 12,
        _ => 13,
    };

    private double Value(AnchorKind kind, string? exercise = null) =>
        Anchors.First(anchor => anchor.Kind == kind && anchor.Exercise == exercise).Value;
}
