using LoadWatch.Recordings;
namespace LoadWatch.People;

public class AnchorBookTests
{
    [Fact]
    public void AnAnchorHoldsFromItsDateOn()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.PowerMax, 900, Given.Date));

        Assert.Null(book.On(Given.Date.PlusDays(-1), "p1", AnchorKind.PowerMax));
        Assert.Equal(900, book.On(Given.Date, "p1", AnchorKind.PowerMax)!.Value);
    }

    [Fact]
    public void AMeasuredAnchorWinsOverALaterObservedOne()
    {
        var book = Given.Anchors(
            Given.Anchor(AnchorKind.PowerMax, 950, Given.Date, AnchorSource.Observed),
            Given.Anchor(AnchorKind.PowerMax, 900, Given.Date.PlusDays(-400)));

        Assert.Equal(900, book.On(Given.Date, "p1", AnchorKind.PowerMax)!.Value);
    }

    [Fact]
    public void SinceADateOlderAndUndatedAnchorsDoNotCount()
    {
        var book = Given.Anchors(
            Given.Anchor(AnchorKind.PowerMax, 950, Given.Date.PlusDays(-10), AnchorSource.Observed),
            Given.Anchor(AnchorKind.PowerMax, 900, Given.Date.PlusDays(-184)),
            Given.Anchor(AnchorKind.PowerMax, 800));

        Assert.Equal(950, book.Since(Given.Date.PlusDays(-183), Given.Date, "p1", AnchorKind.PowerMax)!.Value);
        Assert.Null(book.Since(Given.Date.PlusDays(-5), Given.Date, "p1", AnchorKind.PowerMax));
    }

    [Fact]
    public void TheMaximumOfAMachineGoesBeforeThatOfTheExercise()
    {
        var free = Given.Anchor(AnchorKind.OneRepetitionMax, 90, Given.Date, exercise: "leg_press");
        var book = Given.Anchors(free, free with { Value = 140, Machine = "Press 2", Source = AnchorSource.Estimated });

        Assert.Equal(140, Maximum(book, "press-2"));
        Assert.Equal(90, Maximum(book, "press 3"));
        Assert.Equal(90, Maximum(book, null));
    }

    [Fact]
    public void TheMaximumOfAnotherMachineNeverCounts()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.OneRepetitionMax, 140, Given.Date, exercise: "leg_press") with { Machine = "Press 2" });

        Assert.Null(Maximum(book, "press 3"));
        Assert.Null(Maximum(book, null));
    }

    [Fact]
    public void BeforeTheMachinesOwnMaximumHoldsThatOfTheExercise()
    {
        var free = Given.Anchor(AnchorKind.OneRepetitionMax, 90, exercise: "leg_press");

        Assert.Equal(90, Maximum(Given.Anchors(free, free with { Value = 140, Machine = "Press 2", Date = Given.Date.PlusDays(1) }), "press 2"));
    }

    private static double? Maximum(AnchorBook book, string? machine) =>
        book.On(Given.Date, "p1", AnchorKind.OneRepetitionMax, "Leg Press", machine)?.Value;

    [Fact]
    public void ASportsOwnCapacityGoesBeforeOneOfNoSport()
    {
        var book = Given.Anchors(
            Given.Anchor(AnchorKind.CriticalPower, 250),
            Given.Anchor(AnchorKind.CriticalPower, 210) with { Sport = "rowing" },
            Given.Anchor(AnchorKind.CriticalPower, 260, source: AnchorSource.Observed) with { Sport = "cycling" });

        Assert.Equal(210, book.On(Given.Date, "p1", AnchorKind.CriticalPower, new Sport("fitness_equipment", "indoor_rowing"))!.Value);
        Assert.Equal(250, book.On(Given.Date, "p1", AnchorKind.CriticalPower, new Sport("cycling"))!.Value);
        Assert.Equal(250, book.On(Given.Date, "p1", AnchorKind.CriticalPower, new Sport("kayaking"))!.Value);
    }

    [Fact]
    public void WhatWasShownBeforeItHoldsIsAsOldAsThat()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.PowerMax, 900, Given.Date.PlusDays(-9)) with { Sport = "cycling", ShownOn = Given.Date.PlusDays(-30) });

        Assert.NotNull(book.Since(Given.Date.PlusDays(-30), Given.Date, "p1", AnchorKind.PowerMax, new Sport("cycling")));
        Assert.Null(book.Since(Given.Date.PlusDays(-29), Given.Date, "p1", AnchorKind.PowerMax, new Sport("cycling")));
    }
}
