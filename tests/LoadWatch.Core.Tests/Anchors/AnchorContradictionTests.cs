using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Anchors;

public class AnchorContradictionTests
{
    private static readonly LocalDate Tested = new(2026, 1, 12);

    [Fact]
    public void AMeasuredValueIsUsedAndTheOtherIsShown()
    {
        var measured = Given.Anchor(AnchorKind.CriticalPower, 240, Tested);
        var observed = Observed(AnchorKind.CriticalPower, 262, 5) with { Sport = "cycling" };

        Assert.Equal(
            "critical power (cycling): 240 W measured on 12 January 2026, own sessions up to 17 February 2026 show 262 W (within 5 W): the measured one is used; measure again?",
            Assert.Single(On(observed, measured)).Words);
        Assert.Equal(240, Given.Anchors(measured, observed.ToAnchor()).On(Given.Date, "p1", AnchorKind.CriticalPower, new("cycling"))!.Value);
    }

    [Theory]
    [InlineData(AnchorKind.CriticalPower, 246, 240, false)]
    [InlineData(AnchorKind.CriticalPower, 230, 240, true)]
    [InlineData(AnchorKind.WPrime, 30_000, 12_000, false)]
    [InlineData(AnchorKind.HeartRateMax, 196, 190, true)]
    [InlineData(AnchorKind.HeartRateMax, 180, 190, false)]
    public void ABestContradictsOnlyByBeingHigher(AnchorKind kind, double shown, double measured, bool contradicts) =>
        Assert.Equal(contradicts, On(Observed(kind, shown, kind == AnchorKind.CriticalPower ? 6 : 3), Given.Anchor(kind, measured)).Count == 1);

    [Fact]
    public void WithoutAMeasuredValueNothingIsContradicted() =>
        Assert.Empty(On(Observed(AnchorKind.HeartRateMax, 196, 3), Given.Anchor(AnchorKind.HeartRateMax, 180, source: AnchorSource.Estimated)));

    /// <summary>A maximum without a machine says little of one that is of a machine.</summary>
    [Fact]
    public void AMaximumOfAMachineIsContradictedByItsOwnAlone()
    {
        var observed = Observed(AnchorKind.OneRepetitionMax, 130, 13) with { Exercise = "leg_press", Machine = "press_2" };

        Assert.Empty(On(observed, Given.Anchor(AnchorKind.OneRepetitionMax, 90, exercise: "leg_press")));
        Assert.Equal(
            "one repetition max of leg press on press 2: 90 kg measured, own sessions up to 17 February 2026 show 130 kg (within 13 kg): the measured one is used; measure again?",
            Assert.Single(On(observed, Given.Anchor(AnchorKind.OneRepetitionMax, 90, exercise: "leg_press") with { Machine = "Press 2" })).Words);
    }

    /// <summary>Who rides at less than four fifths of what was measured has not gone to the limit; there is nothing to measure again for that.</summary>
    [Theory]
    [InlineData(191, false)]
    [InlineData(192, true)]
    [InlineData(300, true)]
    public void ALineFarBelowTheMeasuredOneAsksNothing(double shown, bool asked) =>
        Assert.Equal(asked, On(Observed(AnchorKind.CriticalPower, shown, 5), Given.Anchor(AnchorKind.CriticalPower, 240)).Count == 1);

    /// <summary>By hand: measured 240 W and 18 kJ are 390 W over 120 s; 180 W and 15.84 kJ are 312 W, 80 % of it; with 15.6 kJ 310 W are not.</summary>
    [Theory]
    [InlineData(15_840, true)]
    [InlineData(15_600, false)]
    public void WithBothReservesTheNearestThatTheLinesComeCounts(double reserve, bool asked) => Assert.Equal(
        asked,
        AnchorContradiction.On(
            Given.Date,
            [Observed(AnchorKind.CriticalPower, 180, 5), Observed(AnchorKind.WPrime, reserve, 1000)],
            Given.Anchors(Given.Anchor(AnchorKind.CriticalPower, 240), Given.Anchor(AnchorKind.WPrime, 18_000))).Count == 1);

    [Fact]
    public void TheLatestAdoptedValueSpeaks()
    {
        var later = Observed(AnchorKind.HeartRateMax, 191, 3) with { From = new LocalDate(2026, 3, 1) };

        Assert.Empty(AnchorContradiction.On(Given.Date, [later, Observed(AnchorKind.HeartRateMax, 196, 3) with { From = new LocalDate(2026, 2, 1) }], Given.Anchors(Given.Anchor(AnchorKind.HeartRateMax, 190))));
    }

    private static IReadOnlyList<AnchorContradiction> On(ObservedAnchor observed, Anchor measured) => AnchorContradiction.On(Given.Date, [observed], Given.Anchors(measured));

    private static ObservedAnchor Observed(AnchorKind kind, double value, double error) => new("p1", kind, new LocalDate(2026, 3, 1), value, error, new LocalDate(2026, 2, 17), "basis");
}
