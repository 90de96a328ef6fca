using LoadWatch.Delivery.Page;
using LoadWatch.Notices;
using NodaTime;

namespace LoadWatch.Delivery.Tests.Page;

public sealed class StripTests
{
    private static readonly LocalDate First = new(2026, 2, 25);

    [Fact]
    public void ABarIsAsTallAsItsShareOfTheHighest()
    {
        // The highest bar is 23 high on a baseline at 25; half the load is half of it, 11.5. Days lie 6 apart, bars begin 1 in and are 4 wide.
        var strip = Strip.Of(Row(Day(0, 50), Day(1, 100)), "AU");
        Assert.Equal("M1 25v-11.5h4v11.5zM7 25v-23h4v23z", strip.Bars);
        Assert.Equal(12, strip.Width);
    }

    [Fact]
    public void AnUnknownDayIsAHollowBoxAndNeitherBarNorRest()
    {
        var strip = Strip.Of(Row(new BriefDay(First, false, null, null)), "AU");
        Assert.Equal(("", "", ""), (strip.Bars, strip.Rests, strip.Uncomputed));
        Assert.NotEqual("", strip.Unknowns);
        Assert.Equal("1 day to 25 Feb: load on 0, none on 0, unknown on 1. Heavy or fast leg work on 0, unknown on 1.", strip.Words);
    }

    [Fact]
    public void ARestDayAnUnknownDayAndADayWithoutALoadLookDifferent()
    {
        var strip = Strip.Of(Row(Day(0, 0), new BriefDay(First.PlusDays(1), false, null, null), new BriefDay(First.PlusDays(2), true, null, false)), "AU");
        Assert.StartsWith("M1 ", strip.Rests, StringComparison.Ordinal);
        Assert.StartsWith("M7.5 ", strip.Unknowns, StringComparison.Ordinal);
        Assert.StartsWith("M13.5 ", strip.Uncomputed, StringComparison.Ordinal);
        Assert.Contains("recorded without a load on 1", strip.Words, StringComparison.Ordinal);
    }

    [Fact]
    public void HeavyLegDaysAreFilledDiamondsAndUnknownOnesHollow()
    {
        var strip = Strip.Of(Row(Day(0, 10) with { HeavyLegs = true }, Day(1, 10) with { HeavyLegs = null }, Day(2, 10)), "AU");
        Assert.Equal("M3 28l3 3l-3 3l-3 -3z", strip.Heavy);
        Assert.Equal("M9 29l2 2l-2 2l-2 -2z", strip.HeavyUnknown);
    }

    [Fact]
    public void TheWordsTellWhatTheDrawingShows()
    {
        var strip = Strip.Of(Row(Day(0, 50) with { HeavyLegs = true }, Day(1, 0), Day(2, 120)), "AU");
        Assert.Equal(
            "3 days to 27 Feb: load on 2, the highest 120 AU on 27 Feb, none on 1, unknown on 0. Heavy or fast leg work on 1, the last on 25 Feb, unknown on 0.",
            strip.Words);
    }

    [Fact]
    public void TheUsualDayIsALineOnTheSameScale()
    {
        // A usual week of 350 is 50 a day: half of the highest day of 100, so 11.5 above the baseline at 25.
        Assert.Equal("13.5", Strip.Of(Row(Day(0, 100)) with { UsualWeekLoad = 350 }, "AU").UsualY);
        Assert.Null(Strip.Of(Row(Day(0, 100)), "AU").UsualY);
        Assert.Null(Strip.Of(Row(Day(0, 0)) with { UsualWeekLoad = 0 }, "AU").UsualY);
    }

    [Fact]
    public void NoDaysGiveAnEmptyDrawing() => Assert.Equal("No days yet.", Strip.Of(Row(), "AU").Words);

    private static BriefDay Day(int offset, double load) => new(First.PlusDays(offset), true, load, false);

    private static BriefRow Row(params BriefDay[] days) => new("a", "Ann", false, null, null, null, null, 0, null, null, days, null);
}
