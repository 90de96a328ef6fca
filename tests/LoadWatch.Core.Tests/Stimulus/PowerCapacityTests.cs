using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

public class PowerCapacityTests
{
    private static readonly Sport Cycling = new("cycling");

    [Fact]
    public void EverythingMeasuredIsGradeA()
    {
        var capacity = On(Given.Cyclist);

        Assert.Equal(Grade.A, capacity.Grade);
        Assert.Empty(capacity.NotSeen);
    }

    [Fact]
    public void AnObservedAnchorIsGradeB() => Assert.Equal(Grade.B, On(With(AnchorKind.CriticalPower, one => one with { Source = AnchorSource.Observed })).Grade);

    [Theory]
    [InlineData(-183, true)]
    [InlineData(-184, false)]
    public void ATrueMaximumIsAtMostSixMonthsOld(int days, bool counts) =>
        Assert.Equal(counts, On(With(AnchorKind.PowerMax, one => one with { Date = Given.Date.PlusDays(days) })).Maximum is not null);

    [Fact]
    public void AnUndatedMaximumIsOfUnknownAge() => Assert.Null(On(With(AnchorKind.PowerMax, one => one with { Date = null })).Maximum);

    [Theory]
    [InlineData(625, true)]
    [InlineData(624, false)]
    public void ATrueMaximumIsFarAboveCriticalPower(double watts, bool counts)
    {
        var capacity = On(With(AnchorKind.PowerMax, one => one with { Value = watts }));

        Assert.Equal(counts, capacity.Maximum is not null);
        Assert.Equal(counts, capacity.NotSeen.Count == 0);
    }

    /// <summary>2.5 x 100.04 is a little more than 250.1 in binary numbers.</summary>
    [Fact]
    public void TheRatioIsComparedInRoundedNumbers()
    {
        Anchor[] anchors = [.. With(AnchorKind.CriticalPower, one => one with { Value = 100.04 }).Select(one => one.Kind == AnchorKind.PowerMax ? one with { Value = 250.1 } : one)];

        Assert.True(250.1 < 2.5 * 100.04);
        Assert.NotNull(On(anchors).Maximum);
    }

    [Fact]
    public void WithoutWPrimeItIsALowerBound() =>
        Assert.Equal(Grade.D, On([.. Given.Cyclist.Where(one => one.Kind != AnchorKind.WPrime)]).Grade);

    [Fact]
    public void WithoutCriticalPowerThereIsNone() => Assert.Null(PowerCapacity.On(Given.Date, "p1", AnchorBook.Empty, Cycling));

    [Fact]
    public void ACapacityOfNothingIsNotKnown()
    {
        Assert.Null(On(With(AnchorKind.WPrime, one => one with { Value = 0 })).WPrime);
        Assert.Null(PowerCapacity.On(Given.Date, "p1", Given.Anchors(With(AnchorKind.CriticalPower, one => one with { Value = 0 })), Cycling));
    }

    private static PowerCapacity On(Anchor[] anchors) => PowerCapacity.On(Given.Date, "p1", Given.Anchors(anchors), Cycling)!;

    private static Anchor[] With(AnchorKind kind, Func<Anchor, Anchor> change) =>
        [.. Given.Cyclist.Select(one => one.Kind == kind ? change(one) : one)];
}
