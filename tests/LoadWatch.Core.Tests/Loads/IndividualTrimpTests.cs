using CsCheck;
using LoadWatch.People;

namespace LoadWatch.Loads;

public class IndividualTrimpTests
{
    private static readonly HeartRateReserve Reserve = new(50, 190, Estimated: false);

    /// <summary>By hand: 30 minutes at x = 0.5 with a = 0.2, b = 4 are 30 x 0.5 x 0.2 x exp(2) = 3 x 7.3890561 = 22.1671683.</summary>
    [Fact]
    public void UsesThePairOfThePerson() =>
        Assert.Equal(22.1671683, IndividualTrimp.Of(Given.Histogram((120, 30)), Reserve, new TrimpPair(0.2, 4, Estimated: false))!.Value, 5e-8);

    /// <summary>Manzi et al. 2009 change nothing but the pair: with Banister's of men the two are the same.</summary>
    [Fact]
    public void WithThePairOfMenItIsBanisters() =>
        Gen.Select(Gen.Int[25, 250], Gen.Int[1, 600], Gen.Int[25, 250], Gen.Int[1, 600], Gen.Double[30, 90], Gen.Double[100, 220])
            .Sample((bpm, minutes, otherBpm, otherMinutes, rest, max) =>
            {
                var heartRate = Given.Histogram((bpm, minutes), (otherBpm, otherMinutes));
                var reserve = new HeartRateReserve(rest, max, Estimated: false);
                return IndividualTrimp.Of(heartRate, reserve, new TrimpPair(0.64, 1.92, Estimated: false)) == BanisterTrimp.Of(heartRate, reserve, Sex.Male, new());
            });

    /// <summary>The widest anchors that <c>anchors.csv</c> takes.</summary>
    [Fact]
    public void ASteeperExponentNeverLowersItAndItStaysFinite() =>
        Gen.Select(Gen.Int[25, 250], Gen.Double[0.01, 5], Gen.Double[0.1, 8], Gen.Double[0.1, 8]).Sample((bpm, a, b, other) =>
        {
            var heartRate = Given.Histogram((bpm, 60));
            var gentle = IndividualTrimp.Of(heartRate, Reserve, new TrimpPair(a, Math.Min(b, other), Estimated: false))!.Value;
            var steep = IndividualTrimp.Of(heartRate, Reserve, new TrimpPair(a, Math.Max(b, other), Estimated: false))!.Value;
            return double.IsFinite(steep) && steep >= gentle;
        });

    [Fact]
    public void NoTimeIsUnknownNotZero() => Assert.Null(IndividualTrimp.Of(Given.Histogram(), Reserve, new TrimpPair(0.64, 1.92, Estimated: false)));

    [Fact]
    public void APairIsTwoAnchorsOfOneDate()
    {
        var a = Given.Anchor(AnchorKind.TrimpWeight, 0.2, Given.Date);
        var b = Given.Anchor(AnchorKind.TrimpExponent, 4, Given.Date);

        Assert.Equal((new TrimpPair(0.2, 4, Estimated: false), null), On(a, b));
        Assert.Equal((new TrimpPair(0.2, 4, Estimated: true), null), On(a, b with { Source = AnchorSource.Estimated }));
        Assert.Equal((null, null), On());
        Assert.Equal((null, "trimp_weight without trimp_exponent: no individual training impulse"), On(a));
        Assert.Equal((null, "trimp_exponent without trimp_weight: no individual training impulse"), On(b));
        Assert.Equal(
            (null, "trimp_weight and trimp_exponent are of different dates: no individual training impulse"),
            On(a, b with { Date = Given.Date.PlusDays(-1) }));
    }

    private static (TrimpPair? Pair, string? Missing) On(params Anchor[] anchors) => TrimpPair.On(Given.Date, Given.Person(), Given.Anchors(anchors));
}
