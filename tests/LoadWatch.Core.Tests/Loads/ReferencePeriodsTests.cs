using LoadWatch.Findings;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

public class ReferencePeriodsTests
{
    private static readonly LocalDate Change = new(2026, 3, 10);

    private static readonly Group Squad = new("g1", "Squad", QuantityNames.BanisterTrimp, new RuleLimits());

    [Fact]
    public void APeriodBeginsWithEveryOtherValueAndWithNoEqualOne()
    {
        var periods = Of(Given.Person(), Max(190), Rest(60), Max(190, 10), Max(185, 20), Rest(55, 20), Max(185, 30));

        Assert.Equal([LocalDate.MinIsoValue, Change.PlusDays(20)], periods.All.Select(period => period.From));
        Assert.Equal(
            [new ReferenceChange(AnchorKind.HeartRateRest, 60, 55), new ReferenceChange(AnchorKind.HeartRateMax, 190, 185)], periods.All[1].ChangesSince(periods.All[0]));
        Assert.Equal("maximal heart rate 190 to 185 bpm", ReferenceWords.Of(periods.All[1].ChangesSince(periods.All[0])[1]));
    }

    [Fact]
    public void WhatBearsOnNothingThatTheGroupLooksAtIsNoChange()
    {
        Assert.Single(Of(Given.Person(), Max(190), Given.Anchor(AnchorKind.CriticalPower, 250), Given.Anchor(AnchorKind.CriticalPower, 270, Change), Given.Anchor(AnchorKind.SpeedMax, 9, Change)).All);
        Assert.Single(Of(Given.Person(), Max(190), Max(170, 0) with { Person = "p2" }).All);
        Assert.Single(ReferencePeriods.Of(Given.Person(), Squad with { LoadQuantity = QuantityNames.Minutes }, Given.Anchors(Max(190), Max(170, 0))).All);
    }

    /// <summary>By Tanaka's equation 208 - 0.7 x 30 = 187 in 2026, and 0.7 less in the year after.</summary>
    [Fact]
    public void AMaximumByAgeIsNoChangeUntilOneIsMeasured()
    {
        var periods = Of(Given.Person(birthYear: 1996), Rest(60), Max(192, 0));

        Assert.Equal([new ReferenceChange(AnchorKind.HeartRateMax, 187, 192)], Assert.Single(periods.All.Skip(1)).ChangesSince(periods.All[0]));
    }

    [Fact]
    public void WhereHeartRateIsNotValidNothingChanges()
    {
        Assert.Single(Of(Given.Person() with { HeartRateInvalid = DatePeriods.Since(Change.PlusDays(-3)) }, Max(190), Max(170, 0)).All);
        Assert.Single(Of(Given.Person() with { HeartRateInvalid = DatePeriods.Always }, Max(190), Max(170, 0)).All);
        Assert.Equal(2, Of(Given.Person() with { HeartRateInvalid = DatePeriods.Since(Change.PlusDays(1)) }, Max(190), Max(170, 0)).All.Count);
    }

    [Fact]
    public void WhatChangedWhileHeartRateWasNotValidCountsOnceItIsAgain()
    {
        var until = Change.PlusDays(20);
        var periods = Of(Given.Person() with { HeartRateInvalid = DatePeriods.Of([new DatePeriod(Change.PlusDays(-3), until)]) }, Max(190), Max(170, 0));

        Assert.Equal(until.PlusDays(1), Assert.Single(periods.All.Skip(1)).From);
        Assert.Equal([new ReferenceChange(AnchorKind.HeartRateMax, 190, 170)], periods.All[1].ChangesSince(periods.All[0]));
    }

    [Fact]
    public void TheFormerValuesAreThoseAtTheBeginningOfTheWindow()
    {
        var periods = Of(Given.Person(), Max(190), Rest(60), Max(180, 0), Max(170, 30));

        Assert.Equal(190, Former(83));
        Assert.Equal(180, Former(84));
        Assert.Equal(180, Former(113));
        Assert.Equal(170, Former(114));
        Assert.Equal([Change, Change.PlusDays(30), Change.PlusDays(84), Change.PlusDays(114)], periods.Cuts(Change.PlusDays(-1), Change.PlusDays(400)));
        Assert.Equal((Change, Change.PlusDays(30)), (periods.FirstChange(Change.PlusDays(83)), periods.FirstChange(Change.PlusDays(84))));

        double? Former(int day) => periods.Before(Change.PlusDays(day)).Values.Single(value => value.Kind == AnchorKind.HeartRateMax).Value;
    }

    [Fact]
    public void SessionsAreWantedFromFurtherBackWhileAChangeIsNear()
    {
        var converts = ReferencePeriods.Of(Given.Person(), Squad with { LoadFallbacks = [QuantityNames.FosterLoad] }, Given.Anchors(Max(190), Max(180, 0)));
        var periods = Of(Given.Person(), Max(190), Max(180, 0));

        Assert.Null(periods.Reach(Change.PlusDays(-31)));
        Assert.Equal(Change.PlusDays(-30 - 430), converts.Reach(Change.PlusDays(-30)));
        Assert.Equal(Change.PlusDays(100 - 430), periods.Reach(Change.PlusDays(100)));
        Assert.Equal(Change.PlusDays(-430), converts.Reach(Change.PlusDays(100)));
        Assert.Null(periods.Reach(Change.PlusDays(430)));
    }

    private static ReferencePeriods Of(Person person, params Anchor[] anchors) => ReferencePeriods.Of(person, Squad, Given.Anchors(anchors));

    private static Anchor Max(double bpm, int? day = null) => Given.Anchor(AnchorKind.HeartRateMax, bpm, day is { } from ? Change.PlusDays(from) : null);

    private static Anchor Rest(double bpm, int? day = null) => Max(bpm, day) with { Kind = AnchorKind.HeartRateRest };
}
