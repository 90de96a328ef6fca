using CsCheck;
using LoadWatch.Loads;

namespace LoadWatch.People;

public class HeartRateMaxEquationsTests
{
    private static readonly Gen<Sex?> Sexes = Gen.Int[0, 2].Select(sex => sex switch { 0 => Sex.Male, 1 => Sex.Female, _ => (Sex?)null });

    private static readonly int[] Ages = [20, 40, 60, 70, 80];

    /// <summary>By hand from the printed lines; that of Gellish from memory.</summary>
    [Theory]
    [InlineData(HeartRateMaxEquation.Tanaka, null, 194.0, 180.0, 166.0, 159.0, 152.0)]
    [InlineData(HeartRateMaxEquation.Gellish, null, 193.0, 179.0, 165.0, 158.0, 151.0)]
    [InlineData(HeartRateMaxEquation.Nes, null, 198.2, 185.4, 172.6, 166.2, 159.8)]
    [InlineData(HeartRateMaxEquation.Gulati, Sex.Female, 188.4, 170.8, 153.2, 144.4, 135.6)]
    [InlineData(HeartRateMaxEquation.Gulati, Sex.Male, 194.0, 180.0, 166.0, 159.0, 152.0)]
    [InlineData(HeartRateMaxEquation.Sydo, Sex.Male, 201.0, 182.0, 163.0, 153.5, 144.0)]
    [InlineData(HeartRateMaxEquation.Sydo, Sex.Female, 194.2, 178.4, 162.6, 154.7, 146.8)]
    [InlineData(HeartRateMaxEquation.Sydo, null, 197.6, 180.2, 162.8, 154.1, 145.4)]
    public void FollowsThePrintedLine(HeartRateMaxEquation equation, Sex? sex, params double[] bpm) =>
        Assert.All(Ages.Zip(bpm), row => Assert.Equal(row.Second, equation.BpmAt(row.First, sex)!.Value, 1e-9));

    [Theory]
    [InlineData(-1)]
    [InlineData(121)]
    public void AnImpossibleAgeGivesNothing(int age) => Assert.All(Enum.GetValues<HeartRateMaxEquation>(), equation => Assert.Null(equation.BpmAt(age, sex: null)));

    /// <summary>Of heart rate nothing that is read by age asks more of the older: maximum, bounds of zones, and the rate at which a share of the reserve is reached.</summary>
    [Fact]
    public void AnOlderPersonsLineIsNoHigherThanAYoungerOnes() =>
        Gen.Select(Gen.Enum<HeartRateMaxEquation>(), Gen.Int[1916, 2010], Gen.Int[1916, 2010], Sexes, Gen.Double[0, 1])
            .Sample((equation, year, other, sex, share) =>
            {
                var older = Reserve(equation, Math.Min(year, other), sex);
                var younger = Reserve(equation, Math.Max(year, other), sex);
                return older is null || older.BpmAt(share) <= younger!.BpmAt(share);
            });

    [Fact]
    public void AnAnchoredMaximumGoesBeforeEveryEquation()
    {
        var anchored = new AnchorBook([Given.Anchor(AnchorKind.HeartRateMax, 171)]) { HeartRateMaxEquation = HeartRateMaxEquation.Nes };

        Assert.Equal(new HeartRateMaximum(171, Estimated: false), HeartRateMaximum.On(Given.Date, Given.Person(birthYear: 1966), anchored));
        Assert.Equal(new HeartRateMaximum(172.6, Estimated: true), HeartRateMaximum.On(Given.Date, Given.Person(birthYear: 1966), Book(HeartRateMaxEquation.Nes)));
        Assert.Equal(172.6, HeartRateMaximum.On(Given.Date, Given.Person(birthYear: 1966), Book(HeartRateMaxEquation.Nes).OfPerson("p1").With([]))!.Bpm);
    }

    private static HeartRateReserve? Reserve(HeartRateMaxEquation equation, int birthYear, Sex? sex) =>
        HeartRateReserve.On(Given.Date, Given.Person(sex, birthYear), Book(equation)).Reserve;

    private static AnchorBook Book(HeartRateMaxEquation equation) => new([Given.Anchor(AnchorKind.HeartRateRest, 60)]) { HeartRateMaxEquation = equation };
}
