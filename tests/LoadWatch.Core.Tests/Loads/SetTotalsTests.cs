using LoadWatch.Recordings;

namespace LoadWatch.Loads;

public class SetTotalsTests
{
    /// <summary>By hand: 2 sets, 8 + 5 repetitions, 8 x 100 + 5 x 60 kg.</summary>
    [Fact]
    public void RestBetweenSetsIsNoWork()
    {
        var (quantities, remark) = SetTotals.Of([Given.Set("squat", 8, 100), Given.Set(null, 50, 50, active: false), Given.Set("row", 5, 60)], default);

        Assert.Equal([("sets", 2.0), ("repetitions", 13.0), ("kilograms", 1100.0)], quantities.Select(one => (one.Name, one.Value)));
        Assert.Null(remark);
    }

    [Fact]
    public void WhatNoSetStatesIsAbsentAndNamed()
    {
        var (quantities, remark) = SetTotals.Of([Given.Set("plank", null, null), Given.Set("push_up", 12, null)], default);

        Assert.Equal(["sets", "repetitions"], quantities.Select(one => one.Name));
        Assert.Equal("of 2 working sets 1 without repetitions, 1 without kilograms: the totals are of the others", remark);
    }

    [Fact]
    public void AHoldAndBodyWeightLackNothing()
    {
        var hold = Given.Set("plank", null, null) with { IsHold = true };
        var body = Given.Set("chair_stand", 12, null) with { Load = SetLoad.BodyWeight };

        var (quantities, remark) = SetTotals.Of([hold, body, Given.Set("squat", 5, 20)], default);

        Assert.Equal([("sets", 3.0), ("repetitions", 17.0), ("kilograms", 100.0)], quantities.Select(one => (one.Name, one.Value)));
        Assert.Null(remark);
    }

    [Fact]
    public void AHoldBesideASetWithoutRepetitionsDoesNotHideIt()
    {
        var hold = Given.Set("plank", null, null) with { IsHold = true };

        var (_, remark) = SetTotals.Of([hold, Given.Set("squat", null, 20), Given.Set("row", 5, null) with { Load = SetLoad.Band }], default);

        Assert.Equal("of 3 working sets 1 without repetitions, 1 without kilograms: the totals are of the others", remark);
    }

    [Fact]
    public void ASessionOfRestsAloneHasNoTotals() => Assert.Empty(SetTotals.Of([Given.Set(null, null, null, active: false)], default).Quantities);

    [Theory]
    [InlineData(double.MaxValue)]
    [InlineData(double.NaN)]
    [InlineData(-5)]
    public void AnImpossibleLoadIsNoLoad(double kilograms) =>
        Assert.Equal(["sets", "repetitions"], SetTotals.Of([Given.Set("squat", 8, kilograms)], default).Quantities.Select(one => one.Name));
}
