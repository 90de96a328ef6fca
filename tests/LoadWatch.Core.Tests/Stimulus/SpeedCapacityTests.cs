using LoadWatch.People;

namespace LoadWatch.Stimulus;

public class SpeedCapacityTests
{
    [Fact]
    public void MeasuredSpeedsAreTested()
    {
        var capacity = On(Given.Runner);

        Assert.True(capacity.IsTested);
        Assert.Empty(capacity.NotSeen);
        Assert.Equal(62.5, capacity.Limits.WattsPerUnit);
    }

    [Fact]
    public void AnObservedSpeedIsNot() => Assert.False(On(With(AnchorKind.SpeedMax, one => one with { Source = AnchorSource.Observed })).IsTested);

    [Theory]
    [InlineData(-183, true)]
    [InlineData(-184, false)]
    public void ATrueMaximumIsAtMostSixMonthsOld(int days, bool counts) =>
        Assert.Equal(counts, On(With(AnchorKind.SpeedMax, one => one with { Date = Given.Date.PlusDays(days) })).Maximum is not null);

    [Fact]
    public void AnUndatedMaximumIsOfUnknownAge() => Assert.Null(On(With(AnchorKind.SpeedMax, one => one with { Date = null })).Maximum);

    /// <summary>By hand: 1.3 times 4 m/s.</summary>
    [Theory]
    [InlineData(5.2, true)]
    [InlineData(5.19, false)]
    public void ATrueMaximumIsWellAboveCriticalSpeed(double metresPerSecond, bool counts)
    {
        var capacity = On(With(AnchorKind.SpeedMax, one => one with { Value = metresPerSecond }));

        Assert.Equal(counts, capacity.Maximum is not null);
        Assert.Equal(counts, capacity.NotSeen.Count == 0);
    }

    [Fact]
    public void WithoutDPrimeFatigueIsNotSeen()
    {
        var capacity = On([.. Given.Runner.Where(one => one.Kind != AnchorKind.DPrime)]);

        Assert.False(capacity.IsTested);
        Assert.Contains("d_prime", Assert.Single(capacity.NotSeen), StringComparison.Ordinal);
    }

    [Fact]
    public void WithoutCriticalSpeedThereIsNone() => Assert.Null(SpeedCapacity.On(Given.Date, "p1", AnchorBook.Empty));

    private static SpeedCapacity On(Anchor[] anchors) => SpeedCapacity.On(Given.Date, "p1", Given.Anchors(anchors))!;

    private static Anchor[] With(AnchorKind kind, Func<Anchor, Anchor> change) =>
        [.. Given.Runner.Select(one => one.Kind == kind ? change(one) : one)];
}
