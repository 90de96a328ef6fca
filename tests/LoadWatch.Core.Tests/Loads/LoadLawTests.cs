using CsCheck;
using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Loads;

/// <summary>Laws that hold for every load.</summary>
public class LoadLawTests
{
    private static readonly Gen<Sex?> Sexes = Gen.Int[0, 2].Select(sex => sex switch { 0 => Sex.Male, 1 => Sex.Female, _ => (Sex?)null });

    private static readonly Gen<(int Bin, double Minutes)[]> Bins = Gen.Select(Gen.Int[25, 250], Gen.Double[0.1, 300]).Array[1, 6];

    private static readonly Gen<Anchor[]> Anchors = Gen.Select(Gen.Int[30, 90], Gen.Int[100, 240], Gen.Int[90, 200], Gen.Int[1, 40], Gen.Double[0.01, 5], Gen.Double[0.1, 8])
        .Select((rest, max, first, more, a, b) => new[]
        {
            Given.Anchor(AnchorKind.HeartRateRest, rest), Given.Anchor(AnchorKind.HeartRateMax, max), Given.Anchor(AnchorKind.HeartRateVt1, first),
            Given.Anchor(AnchorKind.HeartRateVt2, first + more), Given.Anchor(AnchorKind.TrimpWeight, a, Given.Date), Given.Anchor(AnchorKind.TrimpExponent, b, Given.Date),
        });

    [Fact]
    public void MoreHeartbeatsNeverLowerALoad() =>
        Gen.Select(Anchors, Sexes, Bins, Bins).Sample((anchors, sex, some, more) =>
        {
            var (less, all) = (OfHeart(anchors, sex, some), OfHeart(anchors, sex, [.. some, .. more]));
            return less.Count == 5 && less.All(load => all[load.Key] >= load.Value);
        });

    /// <summary>The same time at a higher rate; with weights that rise, as all defaults do.</summary>
    [Fact]
    public void AHigherRateNeverLowersALoad() =>
        Gen.Select(Anchors, Sexes, Gen.Int[25, 249], Gen.Double[0.1, 300]).Sample((anchors, sex, bpm, minutes) =>
        {
            var (lower, higher) = (OfHeart(anchors, sex, [(bpm, minutes)]), OfHeart(anchors, sex, [(bpm + 1, minutes)]));
            return lower.All(load => higher[load.Key] >= load.Value);
        });

    [Fact]
    public void MoreTimeAtASpeedNeverLowersADistance() =>
        Gen.Select(Gen.Select(Gen.Int[0, 120], Gen.Double[0.1, 100]).Array[1, 6], Gen.Select(Gen.Int[0, 120], Gen.Double[0.1, 100]).Array[1, 6]).Sample((some, more) =>
        {
            var (less, all) = (OfSpeed(some), OfSpeed([.. some, .. more]));
            return less.Count > 0 && less.All(distance => all[distance.Key] >= distance.Value);
        });

    [Fact]
    public void OneMoreSetNeverLowersATotal() =>
        Gen.Select(Gen.Select(Gen.Int[1, 30], Gen.Double[0, 300], Gen.Int[0, 5]).Array[1, 12], Gen.Int[1, 30], Gen.Double[0, 300]).Sample((sets, repetitions, kilograms) =>
        {
            StrengthSet[] some = [.. sets.Select(set => Given.Set("squat", set.Item1, set.Item2, set.Item3))];
            var (less, all) = (OfSets(some), OfSets([.. some, Given.Set("squat", repetitions, kilograms, 1)]));
            return less.All(total => all[total.Key] >= total.Value);
        });

    [Fact]
    public void ALongerOrHarderSessionNeverLowersARatedLoad() =>
        Gen.Select(Gen.Double[0, 10], Gen.Double[0, 10], Gen.Double[0.1, 600], Gen.Double[0.1, 600]).Sample((rating, otherRating, minutes, otherMinutes) =>
            FosterLoad.Of(Math.Max(rating, otherRating), Math.Max(minutes, otherMinutes)) >= FosterLoad.Of(Math.Min(rating, otherRating), Math.Min(minutes, otherMinutes)));

    /// <summary>Twice the seconds of everything are twice the load.</summary>
    [Fact]
    public void AUnitOfTimeTwiceAsLongDoublesEveryLoad() =>
        Gen.Select(Anchors, Bins).Sample((anchors, bins) =>
        {
            var (once, twice) = (OfHeart(anchors, Sex.Female, bins), OfHeart(anchors, Sex.Female, [.. bins, .. bins]));
            return once.All(load => Math.Abs(twice[load.Key] - (2 * load.Value)) <= 1e-6 * twice[load.Key]);
        });

    private static Dictionary<string, double> OfHeart(Anchor[] anchors, Sex? sex, (int Bin, double Minutes)[] bins) =>
        ByName(HeartRateLoads.Of(Given.Histogram(bins), Given.Date, Given.Person(sex), Given.Anchors(anchors), new()).Quantities);

    private static Dictionary<string, double> OfSpeed((int Bin, double Minutes)[] bins) =>
        ByName(SpeedLoads.OfHistogram(Given.Histogram(bins), new Sport("running"), 9, Given.Anchor(AnchorKind.SpeedMax, 9), new())
            .Where(one => one.Name.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal)));

    private static Dictionary<string, double> OfSets(StrengthSet[] sets) => ByName(SetTotals.Of(sets, OneRepetitionMaxEquation.LoadChart).Quantities);

    private static Dictionary<string, double> ByName(IEnumerable<Quantity> quantities) => quantities.ToDictionary(one => one.Name, one => one.Value, StringComparer.Ordinal);
}
