using CsCheck;

namespace LoadWatch.Stimulus;

public class RecruitmentTests
{
    private static readonly Variant[] Variants = [Variant.Low, Variant.Mid, Variant.High];

    /// <summary>Computed independently from the stated equations: critical power 250 W, maximum 1000 W, fresh.</summary>
    [Theory]
    [InlineData(150, 0.390, 1, 0.369, 0)]
    [InlineData(200, 0.520, 1, 0.812, 0)]
    [InlineData(240, 0.624, 1, 1, 0.192)]
    [InlineData(250, 0.650, 1, 1, 0.321)]
    [InlineData(350, 0.6967, 1, 1, 0.543)]
    [InlineData(500, 0.7667, 1, 1, 0.858)]
    [InlineData(700, 0.860, 1, 1, 1)]
    public void FreshPowerCallsOnTheClasses(double watts, double drive, double slow, double medium, double large)
    {
        var found = Drive.Of(watts, 250, 1000, 1, 0.65);
        var fractions = Variant.Mid.Recruitment.At(found);

        Assert.Equal(drive, found, 5e-5);
        Assert.Equal(slow, fractions.Slow, 5e-4);
        Assert.Equal(medium, fractions.Medium, 5.1e-4);
        Assert.Equal(large, fractions.Large, 5e-4);
    }

    /// <summary>
    /// Critical power at 80 % of VO2max, fresh and, in the last row, with a quarter of W' left. Computed independently from the estimator's equations.
    /// </summary>
    [Theory]
    [InlineData(43, 1, 0.200, 0)]
    [InlineData(61, 1, 0.737, 0)]
    [InlineData(75, 1, 1.00, 0)]
    [InlineData(91, 1, 1, 0.422)]
    [InlineData(91, 0.25, 1, 0.712)]
    public void SharesOfOxygenUptakeReadLikeGlycogen(double percent, double balance, double medium, double large)
    {
        var fractions = Variant.Mid.Recruitment.At(Drive.Of(percent / 80, 1, 3.3, balance, 0.65));

        Assert.Equal(medium, fractions.Medium, 5.1e-3);
        Assert.Equal(large, fractions.Large, 1e-3);
    }

    /// <summary>Glycogen data of Vollestad and Blom 1985, Acta Physiol Scand 125:395, from memory; compared fresh, within 0.12.</summary>
    [Theory]
    [InlineData(43, 0.2, 0)]
    [InlineData(61, 0.65, 0)]
    [InlineData(75, 1, 0)]
    [InlineData(91, 1, 0.5)]
    public void FreshSharesLieNearWhatGlycogenShows(double percent, double medium, double large)
    {
        var fractions = Variant.Mid.Recruitment.At(Drive.Of(percent / 80, 1, 3.3, 1, 0.65));

        Assert.Equal(medium, fractions.Medium, 0.12);
        Assert.Equal(large, fractions.Large, 0.12);
    }

    /// <summary>The definition, taken literally, at the thresholds themselves too: how many units have joined, and where between two the drive lies.</summary>
    [Fact]
    public void TheFractionsFollowFromTheThresholdsReached() =>
        Gen.OneOf(Gen.Double[0, 1], Gen.Int[0, MotorUnitPool.Units - 1].Select(unit => MotorUnitPool.Usual.ForceFractions[unit])).Sample(drive =>
        {
            var thresholds = MotorUnitPool.Usual.ForceFractions;
            var joined = thresholds.Count(threshold => threshold <= drive);
            var units = joined is 0 or MotorUnitPool.Units
                ? joined
                : joined + ((drive - thresholds[joined - 1]) / (thresholds[joined] - thresholds[joined - 1]));
            var (slow, medium, large) = ClassShares.Usual.Split(MotorUnitPool.Usual);

            Assert.Equal(
                new ClassFractions(Share(units, 0, slow), Share(units, slow, medium), Share(units, slow + medium, large)),
                Variant.Mid.Recruitment.At(drive));

            static double Share(double units, int smaller, int size) => units < smaller + 1 ? 0 : Math.Min(1, (units - smaller) / size);
        });

    [Fact]
    public void NothingIsCalledOnAtRest() => Assert.Equal(default, Variant.Mid.Recruitment.At(0));

    [Fact]
    public void EverythingIsCalledOnAtTheMaximum() => Assert.Equal(new ClassFractions(1, 1, 1), Variant.Low.Recruitment.At(1));

    [Fact]
    public void SmallerClassesAreNeverBehindLargerOnesAndMoreDriveNeverLowersOne() =>
        Gen.Select(Gen.Double[0, 1], Gen.Double[0, 1], Gen.Int[0, 2].Select(one => Variants[one])).Sample((one, other, variant) =>
        {
            var less = variant.Recruitment.At(Math.Min(one, other));
            var more = variant.Recruitment.At(Math.Max(one, other));
            return Ordered(less) && Ordered(more) && less.Slow <= more.Slow && less.Medium <= more.Medium && less.Large <= more.Large;
        });

    private static bool Ordered(ClassFractions of) => of is { Slow: <= 1, Large: >= 0 } && of.Slow >= of.Medium && of.Medium >= of.Large;
}
