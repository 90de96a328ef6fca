using CsCheck;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

public class LoadOrderTests
{
    private static readonly LocalDate Date = new(2026, 3, 10);

    /// <summary>Twelve sessions in February on two lines: impulse = 2 x minutes, impulse = 10 + foster / 4.</summary>
    private static readonly SessionLoads[] February =
    [
        .. Enumerable.Range(1, 12).Select(day => Session(
            new LocalDate(2026, 2, day), ("banister_trimp", 20.0 * day), ("minutes", 10.0 * day), ("foster_load", (80.0 * day) - 40))),
    ];

    [Fact]
    public void TheLoadItselfComesFirst() =>
        Assert.Equal(
            new ChosenLoad(77, Estimated: false, "banister_trimp", Line: null),
            Choose(["foster_load", "minutes"], ("minutes", 60), ("foster_load", 300), ("banister_trimp", 77)));

    [Fact]
    public void ALoadOfAnEstimatedAnchorStaysEstimated() =>
        Assert.True(Order([]).Choose(new SessionLoads(Date, [new Quantity("banister_trimp", 77, "AU", Estimated: true)]))!.Estimated);

    /// <summary>By hand: 10 + 300 / 4 = 85 and 2 x 60 = 120.</summary>
    [Fact]
    public void WithoutItTheFirstFallbackIsConvertedAndMarked()
    {
        var ofRating = Choose(["foster_load", "minutes"], ("minutes", 60), ("foster_load", 300))!;
        var ofMinutes = Choose(["minutes", "foster_load"], ("minutes", 60), ("foster_load", 300))!;

        Assert.Equal((85, true, "foster_load", 12), (ofRating.Value, ofRating.Estimated, ofRating.From, ofRating.Line!.Pairs));
        Assert.Equal((120, true, "minutes"), (ofMinutes.Value, ofMinutes.Estimated, ofMinutes.From));
    }

    /// <summary>The pairs lie on a line, so its error is 0; a load of its own method has none that is known.</summary>
    [Fact]
    public void AConvertedLoadCarriesTheErrorOfItsLine()
    {
        Assert.Equal(0, Choose(["foster_load"], ("foster_load", 300))!.StandardError!.Value, 6);
        Assert.Null(Choose(["foster_load"], ("banister_trimp", 77))!.StandardError);
    }

    /// <summary>While it was not valid no pairs came; behind it the line is that of the 12 months before, as ever.</summary>
    [Fact]
    public void BehindTheTimeWithoutHeartRateItCountsAgain()
    {
        var order = Order([], date => !DatePeriods.Parse("2026-03-01/2026-03-31").Covers(date));

        Assert.Equal(85, order.Choose(Session(new LocalDate(2026, 3, 10), ("foster_load", 300), ("banister_trimp", 99)))!.Value);
        Assert.Equal(99, order.Choose(Session(new LocalDate(2026, 4, 1), ("foster_load", 300), ("banister_trimp", 99)))!.Value);
    }

    [Fact]
    public void WhoNeverHadALoadOfHeartRateHasASeriesOfRatings()
    {
        var ratings = February.Select(session => session with { Quantities = [.. session.Quantities.Where(quantity => quantity.Name == "foster_load")] }).ToArray();

        Assert.Equal(
            new ChosenLoad(40, Estimated: true, "foster_load", Line: null),
            new LoadOrder("banister_trimp", [], ratings, _ => false).Choose(ratings[0]));
        Assert.Null(new LoadOrder("kilograms", [], ratings, _ => false).Choose(ratings[0]));
        Assert.Null(new LoadOrder("banister_trimp", [], ratings, _ => true).Choose(ratings[0]));
    }

    [Fact]
    public void TheLastLineGoesOnWhenHeartRateIsNoLongerValid()
    {
        var late = Session(new LocalDate(2027, 9, 10), ("foster_load", 300));

        Assert.Equal(85, Order([], date => date < new LocalDate(2026, 3, 1)).Choose(late)!.Value);
    }

    [Fact]
    public void AFallbackThatTheSessionLacksOrThatCannotBeConvertedIsPassedOver() =>
        Assert.Equal("minutes", Choose(["foster_load", "work", "minutes"], ("work", 700), ("minutes", 60))!.From);

    [Fact]
    public void WithNeitherTheLoadIsUnknown()
    {
        Assert.Null(Choose(["foster_load"], ("minutes", 60)));
        Assert.Null(Choose([], ("minutes", 60), ("foster_load", 300)));
        Assert.Null(Order(["minutes"]).Choose(Session(new LocalDate(2026, 2, 28), ("minutes", 60))));
    }

    [Fact]
    public void WhileHeartRateIsNotValidTheRatingComesFirstNamedOrNot()
    {
        var order = Order(["edwards_load", "minutes"], date => date != Date);

        Assert.Equal("foster_load", order.Choose(Session(Date, ("banister_trimp", 77), ("minutes", 60), ("foster_load", 300)))!.From);
        Assert.Equal("minutes", order.Choose(Session(Date, ("banister_trimp", 77), ("minutes", 60)))!.From);
        Assert.Equal("banister_trimp", order.Choose(Session(Date.PlusDays(1), ("banister_trimp", 77), ("minutes", 60)))!.From);
    }

    [Fact]
    public void WhileHeartRateIsNotValidNoLoadFromItCounts()
    {
        string[] ofHeartRate = ["banister_trimp", "edwards_load", "lucia_load", "stagno_load", "individual_trimp"];
        var february = February.Select(session => session with
        {
            Quantities = [.. session.Quantities, .. ofHeartRate[1..].Select(name => new Quantity(name, session["minutes"]!.Value, "AU", Estimated: false))],
        }).ToList();

        foreach (var from in ofHeartRate)
        {
            var session = Session(Date, (from, 60));
            Assert.NotNull(new LoadOrder("banister_trimp", ofHeartRate[1..], february, _ => true).Choose(session));
            Assert.Null(new LoadOrder("banister_trimp", ofHeartRate[1..], february, date => date != Date).Choose(session));
        }
    }

    /// <summary>Three of the twelve days leave nine pairs.</summary>
    [Fact]
    public void PairsOfDatesOnWhichHeartRateIsNotValidDoNotCount()
    {
        Assert.Equal(10, Order(["minutes"], date => date.Month != 2 || date.Day > 2).Choose(Session(Date, ("minutes", 60)))!.Line!.Pairs);
        Assert.Null(Order(["minutes"], date => date.Month != 2 || date.Day > 3).Choose(Session(Date, ("minutes", 60))));
    }

    [Fact]
    public void APairWithoutHeartRateCountsOnEveryDate() =>
        Assert.Equal("foster_load", new LoadOrder("minutes", ["foster_load"], February, _ => false).Choose(Session(Date, ("foster_load", 300)))!.From);

    [Fact]
    public void ALoadThatIsTheRatingItselfNeedsNoLine() =>
        Assert.Equal(
            new ChosenLoad(300, Estimated: false, "foster_load", Line: null),
            new LoadOrder("foster_load", ["minutes"], February, _ => false).Choose(Session(Date, ("foster_load", 300), ("minutes", 60))));

    [Fact]
    public void ALineOfAMonthIsMadeOnceAndIsTheOneOfItsMonth()
    {
        var order = Order(["minutes"]);
        var first = order.Choose(Session(new LocalDate(2026, 3, 1), ("minutes", 60)))!.Line;
        var last = order.Choose(Session(new LocalDate(2026, 3, 31), ("minutes", 30)))!.Line;
        var next = order.Choose(Session(new LocalDate(2026, 4, 1), ("minutes", 30)))!.Line;

        Assert.Same(first, last);
        Assert.Equal((new LocalDate(2026, 3, 1), new LocalDate(2026, 4, 1)), (first!.Before, next!.Before));
    }

    [Fact]
    public void WhatWasAskedBeforeChangesNothing() =>
        Gen.Shuffle(Enumerable.Range(0, 14).ToArray()).Sample(months =>
        {
            var order = Order(["foster_load", "minutes"]);
            return months.All(month =>
            {
                var session = Session(new LocalDate(2026, 1, 15).PlusMonths(month), ("minutes", 60));
                return order.Choose(session) == Order(["foster_load", "minutes"]).Choose(session);
            });
        });

    private static ChosenLoad? Choose(string[] fallbacks, params (string Name, double Value)[] quantities) =>
        Order(fallbacks).Choose(Session(Date, quantities));

    private static LoadOrder Order(string[] fallbacks, Func<LocalDate, bool>? heartRateValid = null) =>
        new("banister_trimp", fallbacks, February, heartRateValid ?? (_ => true));

    private static SessionLoads Session(LocalDate date, params (string Name, double Value)[] quantities) =>
        new(date, [.. quantities.Select(quantity => new Quantity(quantity.Name, quantity.Value, "AU", Estimated: false))]);
}
