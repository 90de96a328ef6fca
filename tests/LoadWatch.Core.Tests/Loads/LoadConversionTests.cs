using CsCheck;
using NodaTime;

namespace LoadWatch.Loads;

public class LoadConversionTests
{
    private static readonly LocalDate Date = new(2026, 3, 10);

    private static readonly double[] Ratings = [10, 20, 30, 40, 50, 60, 70, 80, 90, 100];

    private static readonly double[] Impulses = [30, 44, 70, 82, 108, 122, 136, 164, 180, 204];

    /// <summary>
    /// By hand: x' = 55, y' = 1140 / 10 = 114; Sxx = 8250; Sxy = 10 x (-135 - 154 - 175 - 123 - 54 + 61 + 204 + 410 + 630 + 918) = 15820;
    /// b = 15820 / 8250 = 1.91757576; a = 114 - 55 x 1.91757576 = 8.53333333; Syy = 30456; the squares left are 30456 - 15820^2 / 8250 = 119.951515,
    /// over 10 - 2 14.9939394, and the root of it 3.87220085. At 50: 8.53333333 + 95.878788 = 104.412121.
    /// </summary>
    [Fact]
    public void TenPairsGiveTheLineOfLeastSquares()
    {
        var line = LineOf(Pairs(Ratings, Impulses))!;

        Assert.Equal(
            new ConversionLine("banister_trimp", "foster_load", 8.53333333, 1.91757576, 3.87220085, 10, new LocalDate(2025, 3, 1), new LocalDate(2026, 3, 1)),
            line);
        Assert.Equal(104.412121, line.Apply(50));
    }

    [Fact]
    public void NineAreTooFew() => Assert.Null(LineOf(Pairs(Ratings[1..], Impulses[1..])));

    [Fact]
    public void ASessionWithOneOfTheTwoIsNoPair()
    {
        var without = Pairs(Ratings[1..], Impulses[1..]).Append(Session(Date.PlusMonths(-2), ("foster_load", 10), ("minutes", 30)));

        Assert.Null(LineOf(without));
    }

    /// <summary>Nine pairs inside and one on either edge of the twelve months before March 2026.</summary>
    [Theory]
    [InlineData(2025, 2, 28, false)]
    [InlineData(2025, 3, 1, true)]
    [InlineData(2026, 2, 28, true)]
    [InlineData(2026, 3, 1, false)]
    [InlineData(2026, 3, 10, false)]
    public void TheTwelveMonthsBeforeTheMonthCount(int year, int month, int day, bool counts)
    {
        var sessions = Pairs(Ratings[1..], Impulses[1..]).Append(Pair(new LocalDate(year, month, day), 10, 30));

        Assert.Equal(counts, LineOf(sessions) is not null);
    }

    [Fact]
    public void ALineIsFixedForItsMonth()
    {
        var sessions = Pairs(Ratings, Impulses).ToList();
        var later = sessions.Append(Pair(new LocalDate(2026, 3, 1), 10, 500)).ToList();

        Assert.Equal(For(later, new LocalDate(2026, 3, 1)), For(sessions, new LocalDate(2026, 3, 31)));
        Assert.NotEqual(For(later, new LocalDate(2026, 4, 1)), For(sessions, new LocalDate(2026, 4, 1)));
    }

    [Fact]
    public void AWholeYearOnThereIsNoLineLeft() => Assert.Null(For([.. Pairs(Ratings, Impulses)], Date.PlusYears(1)));

    /// <summary>A tenth is no binary fraction: the mean of ten of them is not quite one of them.</summary>
    [Theory]
    [InlineData(0)]
    [InlineData(0.1)]
    [InlineData(300)]
    public void AFallbackThatNeverVariesConvertsNothing(double value) => Assert.Null(LineOf(Pairs([.. Ratings.Select(_ => value)], Impulses)));

    [Fact]
    public void ALoadThatDoesNotRiseWithTheFallbackIsNotConverted()
    {
        Assert.Null(LineOf(Pairs(Ratings, [.. Ratings.Select(_ => 80.0)])));
        Assert.Null(LineOf(Pairs(Ratings, [.. Impulses.Reverse()])));
    }

    [Fact]
    public void NumbersTooLargeToSquareGiveNoLineAndNoFault() => Assert.Null(LineOf(Pairs([.. Ratings.Select(one => one * 1e200)], Impulses)));

    /// <summary>By hand: y = 2 x - 100, at 20 it would be -60.</summary>
    [Fact]
    public void AConvertedLoadIsNeverBelowZero()
    {
        var line = LineOf(Pairs([.. Ratings.Select(x => x + 100)], [.. Ratings.Select(x => (2 * (x + 100)) - 100)]))!;

        Assert.Equal((100, 0), (line.Apply(100), line.Apply(20)));
    }

    [Fact]
    public void PointsOnALineConvertExactly() =>
        Gen.Select(Gen.Int[0, 5_000], Gen.Int[1, 5_000], Gen.Int[0, 1000].Array[10, 60].Where(xs => xs.Distinct().Count() > 1))
            .Sample((intercept, slope, xs) =>
            {
                var ys = xs.Select(x => Significant.Round((intercept + (slope * x)) / 100.0)).ToArray();
                var line = LineOf(Pairs([.. xs.Select(x => (double)x)], ys))!;
                return xs.Zip(ys).All(point => line.Apply(point.First) == point.Second) && line.StandardError < 1e-6;
            });

    [Fact]
    public void TheOrderOfTheSessionsDoesNotMatter() =>
        Gen.Select(Gen.Double[0, 500], Gen.Double[0, 500], Gen.Int[0, 200]).Array[10, 40]
            .SelectMany(pairs => Gen.Select(Gen.Const(pairs), Gen.Shuffle(pairs)))
            .Sample((pairs, shuffled) => LineOf(Dated(pairs)) == LineOf(Dated(shuffled)));

    private static IEnumerable<SessionLoads> Dated((double X, double Y, int DaysBack)[] pairs) =>
        pairs.Select(pair => Pair(Date.PlusDays(-20 - pair.DaysBack), Significant.Round(pair.X), Significant.Round(pair.Y)));

    private static ConversionLine? LineOf(IEnumerable<SessionLoads> sessions) => For([.. sessions], Date);

    private static ConversionLine? For(IReadOnlyList<SessionLoads> sessions, LocalDate date) =>
        LoadConversion.For(sessions, date, "banister_trimp", "foster_load");

    /// <summary>One a day up to the end of February.</summary>
    private static IEnumerable<SessionLoads> Pairs(double[] ratings, double[] impulses) =>
        ratings.Zip(impulses, (rating, impulse) => (rating, impulse)).Select((pair, i) => Pair(new LocalDate(2026, 2, 28).PlusDays(-i), pair.rating, pair.impulse));

    private static SessionLoads Pair(LocalDate date, double rating, double impulse) =>
        Session(date, ("foster_load", rating), ("banister_trimp", impulse), ("minutes", 60));

    private static SessionLoads Session(LocalDate date, params (string Name, double Value)[] quantities) =>
        new(date, [.. quantities.Select(quantity => new Quantity(quantity.Name, quantity.Value, "AU", Estimated: false))]);
}
