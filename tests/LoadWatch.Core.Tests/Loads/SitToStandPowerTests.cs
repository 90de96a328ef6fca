using LoadWatch.People;
using LoadWatch.Rows;

namespace LoadWatch.Loads;

public class SitToStandPowerTests
{
    /// <summary>By hand from the equations of Alcazar et al. 2018 and 2020, as Baltasar-Fernandez et al. 2021 print them (Exp Gerontol 145:111213).</summary>
    [Theory]
    [InlineData("chair_stands_5", 12.0, 70, 1.65, 0.43, 203.4349, 2.906212)]
    [InlineData("chair_stands_5", 15.0, 80, 1.75, 0.45, 200.1240, 2.501550)]
    [InlineData("chair_stands_5", 16.0, 60, 1.58, 0.45, 112.5698, 1.876162)]
    [InlineData("chair_stands_30_s", 15, 70, 1.65, 0.43, 244.1219, 3.487455)]
    [InlineData("chair_stands_30_s", 10, 60, 1.58, 0.45, 120.0744, 2.001240)]
    public void RisingFasterFromALowerSeatTakesMorePower(string test, double value, double kilograms, double height, double chair, double watts, double perKilogram)
    {
        var row = Row(test, value, chair);

        Assert.Equal(watts, SitToStandPower.Watts(row, kilograms, height)!.Value, 5.1e-5);
        Assert.Equal(perKilogram, SitToStandPower.WattsPerKilogram(row, height)!.Value, 5.1e-7);
    }

    [Fact]
    public void WhatIsNotKnownOrCannotBeGivesNoPower()
    {
        Assert.Null(SitToStandPower.Watts(Row("chair_stands_5", 12, null), 70, 1.65));
        Assert.Null(SitToStandPower.Watts(Row("chair_stands_5", null, 0.43), 70, 1.65));
        Assert.Null(SitToStandPower.Watts(Row("chair_stands_5", 12, 0.825), 70, 1.65));
        Assert.Null(SitToStandPower.Watts(Row("chair_stands_30_s", 0, 0.43), 70, 1.65));
        Assert.Null(SitToStandPower.Watts(Row("gait_speed", 1, 0.43), 70, 1.65));
        Assert.Null(SitToStandPower.Watts(Row("chair_stands_5", 12, 0.43) with { Outcome = TestOutcome.UsedArms }, 70, 1.65));
    }

    [Fact]
    public void ThePowerIsToldWithWhatItRestsOn()
    {
        var power = StandingUp.Of(Row("chair_stands_30_s", 15, 0.43), new BodySize(70, 1.65))!;

        Assert.Equal(244.1219, power.Watts!.Value, 5.1e-5);
        Assert.Equal(3.487455, power.WattsPerKilogram!.Value, 5.1e-7);
        Assert.Null(power.Missing);
        Assert.Equal("there was no rise", StandingUp.Of(Row("chair_stands_30_s", 0, 0.43), new BodySize(70, 1.65))!.Missing);
        Assert.Null(StandingUp.Of(Row("gait_speed", 1, 0.43), new BodySize(70, 1.65)));
        Assert.Null(StandingUp.Of(Row("chair_stands_5", 12, 0.43) with { Outcome = TestOutcome.UsedArms }, new BodySize(70, 1.65)));
    }

    [Fact]
    public void TheBodyIsThatOfTheDate()
    {
        var (monday, anchors) = (new NodaTime.LocalDate(2026, 1, 5), new AnchorBook(
        [
            new Anchor("anna", null, AnchorKind.Height, 1.65, AnchorSource.Measured),
            new Anchor("anna", new NodaTime.LocalDate(2026, 1, 5), AnchorKind.BodyMass, 70, AnchorSource.Measured),
            new Anchor("anna", new NodaTime.LocalDate(2026, 2, 5), AnchorKind.BodyMass, 68, AnchorSource.Measured),
        ]));

        Assert.Equal(new BodySize(null, 1.65), BodySize.On(anchors, monday.PlusDays(-1), "anna"));
        Assert.Equal(new BodySize(70, 1.65), BodySize.On(anchors, monday, "anna"));
        Assert.Equal(new BodySize(68, 1.65), BodySize.On(anchors, monday.PlusDays(60), "anna"));
        Assert.Equal(BodySize.Unknown, BodySize.On(anchors, monday, "bo"));
    }

    private static TestRow Row(string test, double? value, double? chair) => new(test, value, null, null, null, null, null, null, chair);
}
