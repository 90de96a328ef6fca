using LoadWatch.People;

namespace LoadWatch.Loads;

public class HeartRateReserveTests
{
    /// <summary>Textbook example of the reserve method (from memory, arithmetic by hand): rest 70, maximum 180, 60 to 70 % is 136 to 147
    /// bpm.</summary>
    [Theory]
    [InlineData(0.60, 136)]
    [InlineData(0.70, 147)]
    public void AFractionOfTheReserveIsAHeartRate(double fraction, double bpm) =>
        Assert.Equal(bpm, new HeartRateReserve(70, 180, Estimated: false).BpmAt(fraction), 1e-9);

    [Theory]
    [InlineData(60, 0)]
    [InlineData(70, 0)]
    [InlineData(125, 0.5)]
    [InlineData(180, 1)]
    [InlineData(200, 1)]
    public void FractionsStayWithinZeroAndOne(double bpm, double expected) =>
        Assert.Equal(expected, new HeartRateReserve(70, 180, Estimated: false).Fraction(bpm), 1e-12);

    [Fact]
    public void WithoutAMaximumTheBirthYearGivesAnEstimatedOne()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.HeartRateRest, 50));

        var (reserve, missing) = HeartRateReserve.On(Given.Date, Given.Person(birthYear: 1986), book);

        Assert.Equal(new HeartRateReserve(50, 180, Estimated: true), reserve);
        Assert.Null(missing);
    }

    [Fact]
    public void WhatIsMissingIsNamed()
    {
        var rest = Given.Anchor(AnchorKind.HeartRateRest, 50);
        var max = Given.Anchor(AnchorKind.HeartRateMax, 190);

        Assert.Contains("heart_rate_rest", Missing(max), StringComparison.Ordinal);
        Assert.Contains("heart_rate_max", Missing(rest), StringComparison.Ordinal);
        Assert.Contains("not above", Missing(rest, max with { Value = 50 }), StringComparison.Ordinal);
    }

    private static string Missing(params Anchor[] anchors)
    {
        var (reserve, missing) = HeartRateReserve.On(Given.Date, Given.Person(), Given.Anchors(anchors));
        Assert.Null(reserve);
        return missing!;
    }
}
