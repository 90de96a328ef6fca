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
}
