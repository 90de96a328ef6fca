using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Reference values of a part: plausible, not taken from anybody.</summary>
internal static class DemoAnchors
{
    private static readonly (string Exercise, double OfSquat)[] RowersLifts = [("squat", 1), ("deadlift", 1.15), ("row", 0.62), ("bench_press", 0.6)];

    private static readonly (string Exercise, double OfSquat)[] MembersLifts =
    [
        ("leg_press", 1.4), ("leg_curl", 0.45), ("leg_extension", 0.6), ("calf_raise", 1.1), ("chest_press", 0.42), ("seated_row", 0.48), ("shoulder_press", 0.28),
    ];

    /// <summary>The clinic tests two maxima, each on its machine, and only of those who come often.</summary>
    private static readonly (string Exercise, string Machine)[] TestedOnMachines = [("leg_press", "press 1"), ("chest_press", "chest 1")];

    /// <param name="first">First date of the demo; tests were done a few days before.</param>
    public static IEnumerable<Anchor> Of(DemoPart part, DemoRandom random, LocalDate first) =>
        HeartRates(part, random).Concat(part.Group == DemoCast.Class ? [] : Powers(part, random, first.PlusDays(-3)));

    /// <summary>What the person can lift once, in half kilograms.</summary>
    public static IReadOnlyDictionary<string, double> Maxima(DemoPart part, DemoRandom random) => part.Group switch
    {
        DemoCast.Boat => Lifts(RowersLifts, part.Sex == Sex.Male ? random.Between(105, 150) : random.Between(75, 110)),
        DemoCast.Class => Lifts(MembersLifts, part.Sex == Sex.Male ? random.Between(60, 95) : random.Between(40, 65)),
        _ => new Dictionary<string, double>(),
    };

    /// <summary>Those that somebody tested.</summary>
    public static IEnumerable<Anchor> Tested(DemoPart part, IReadOnlyDictionary<string, double> maxima, LocalDate first) => part.Group switch
    {
        DemoCast.Boat => RowersLifts.Select(lift => Maximum(part, first, lift.Exercise, machine: null, maxima)),
        DemoCast.Class when part.Week == WeekPlan.ThreeClasses => TestedOnMachines.Select(lift => Maximum(part, first, lift.Exercise, lift.Machine, maxima)),
        _ => [],
    };

    private static IEnumerable<Anchor> HeartRates(DemoPart part, DemoRandom random)
    {
        var rest = part.Group == DemoCast.Class ? random.Whole(60, 72) : random.Whole(44, 58);
        yield return new(part.Id, null, AnchorKind.HeartRateRest, rest, AnchorSource.Measured);
        yield return new(part.Id, null, AnchorKind.HeartRateMax, Math.Round(208 - (0.7 * part.Age)) + random.Whole(-6, 6), AnchorSource.Measured);
    }

    private static IEnumerable<Anchor> Powers(DemoPart part, DemoRandom random, LocalDate tested)
    {
        var critical = Math.Round(part.Sex == Sex.Male ? random.Between(230, 285) : random.Between(165, 210));
        yield return new(part.Id, tested, AnchorKind.CriticalPower, critical, AnchorSource.Measured);
        yield return new(part.Id, tested, AnchorKind.WPrime, random.Whole(130, 190) * 100, AnchorSource.Measured);
        yield return new(part.Id, tested, AnchorKind.PowerMax, Math.Round(critical * random.Between(2.9, 3.2)), AnchorSource.Measured);
    }

    private static Dictionary<string, double> Lifts((string Exercise, double OfSquat)[] lifts, double squat) =>
        lifts.ToDictionary(lift => lift.Exercise, lift => Math.Round(2 * squat * lift.OfSquat) / 2, StringComparer.Ordinal);

    private static Anchor Maximum(DemoPart part, LocalDate first, string exercise, string? machine, IReadOnlyDictionary<string, double> maxima) =>
        new(part.Id, first.PlusDays(-5), AnchorKind.OneRepetitionMax, maxima[exercise], AnchorSource.Measured, exercise, Machine: machine);
}
