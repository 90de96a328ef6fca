using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Reference values of a part: plausible, not taken from anybody.</summary>
internal static class DemoAnchors
{
    private static readonly (string Exercise, double OfSquat)[] RowersLifts = [("squat", 1), ("deadlift", 1.15), ("row", 0.62), ("bench_press", 0.6)];

    private static readonly (string Exercise, double OfSquat)[] MembersLifts =
        [("squat", 1), ("lunge", 0.4), ("leg_curl", 0.45), ("calf_raise", 0.9), ("bench_press", 0.4), ("row", 0.45), ("shoulder_press", 0.28)];

    /// <param name="first">First date of the demo; tests were done a few days before.</param>
    public static IEnumerable<Anchor> Of(DemoPart part, DemoRandom random, LocalDate first) =>
        HeartRates(part, random)
            .Concat(part.Group == DemoCast.Class ? [] : Powers(part, random, first.PlusDays(-3)))
            .Concat(part.Group switch
            {
                DemoCast.Boat => Lifts(part, RowersLifts, part.Sex == Sex.Male ? random.Between(105, 150) : random.Between(75, 110), first.PlusDays(-5)),
                DemoCast.Class => Lifts(part, MembersLifts, part.Sex == Sex.Male ? random.Between(60, 95) : random.Between(40, 65), first.PlusDays(-5)),
                _ => [],
            });

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

    private static IEnumerable<Anchor> Lifts(DemoPart part, (string Exercise, double OfSquat)[] lifts, double squat, LocalDate tested) =>
        lifts.Select(lift => new Anchor(
            part.Id, tested, AnchorKind.OneRepetitionMax, Math.Round(2 * squat * lift.OfSquat) / 2, AnchorSource.Measured, lift.Exercise));
}
