using CsCheck;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Tests.People;

public sealed class DatePeriodsTests
{
    private static readonly LocalDate First = new(2026, 2, 1);

    [Theory]
    [InlineData("2026-02-01/2026-02-10 2026-02-11/2026-02-20", "2026-02-01/2026-02-20")]
    [InlineData("2026-02-15/2026-02-20 2026-02-01/2026-02-10", "2026-02-01/2026-02-10 2026-02-15/2026-02-20")]
    [InlineData("2026-02-01/2026-02-28 2026-02-05/2026-02-10", "2026-02-01/2026-02-28")]
    [InlineData("2026-02-01 2026-03-01/2026-03-05", "2026-02-01")]
    [InlineData("2026-02-01/9999-12-31", "2026-02-01")]
    [InlineData("", "")]
    public void WhatOverlapsOrAdjoinsIsOne(string told, string kept) => Assert.Equal(kept, DatePeriods.Parse(told).ToString());

    [Fact]
    public void ABoundaryDateIsWithin()
    {
        var periods = DatePeriods.Parse("2026-02-01/2026-02-10");

        Assert.Equal([false, true, true, false], new[] { First.PlusDays(-1), First, First.PlusDays(9), First.PlusDays(10) }.Select(periods.Covers));
        Assert.True(DatePeriods.Always.Covers(new LocalDate(1900, 1, 1)));
        Assert.False(DatePeriods.Never.Covers(First));
    }

    [Fact]
    public void OneThatEndsBeforeItBeginsIsNone() =>
        Assert.Throws<ArgumentException>(() => DatePeriods.Of([new DatePeriod(First, First.PlusDays(-1))]));

    [Theory]
    [InlineData("2026-02-01/2026-02-10", "2026-02-01/2026-02-10", null, null)]
    [InlineData("2026-02-01", "2026-02-01/2026-02-10", "2026-02-11", null)]
    [InlineData("", "2026-02-05/2026-02-10", "2026-02-05", "2026-02-10")]
    [InlineData("2026-02-01/2026-02-10 2026-05-01", "2026-02-03/2026-02-10 2026-05-01", "2026-02-01", "2026-02-02")]
    public void TheDifferenceReachesFromItsFirstToItsLastDate(string one, string other, string? first, string? last)
    {
        var difference = DatePeriods.Parse(one).DifferenceTo(DatePeriods.Parse(other));

        Assert.Equal(first is null ? null : new DatePeriod(DatePeriod.Parse(first).From, last is null ? null : DatePeriod.Parse(last).From), difference is var (from, to) ? new DatePeriod(from, to) : null);
    }

    /// <summary>Asked date by date.</summary>
    [Fact]
    public void TheDifferenceIsThatOfTheDates() => Gen.Select(Periods(), Periods()).Sample((one, other) =>
    {
        var differing = Enumerable.Range(-1, 62).Select(day => First.PlusDays(day)).Where(date => one.Covers(date) != other.Covers(date)).ToList();
        var (first, last) = one.DifferenceTo(other) is var (from, to) ? (from, to) : ((LocalDate?)null, (LocalDate?)null);
        return differing.Count == 0
            ? first is null
            : first == differing[0] && (last == differing[^1] || (last is null && differing[^1] == First.PlusDays(60)));
    });

    private static Gen<DatePeriods> Periods() => Gen.Select(Gen.Int[0, 40], Gen.Int[0, 15], Gen.Int[0, 8])
        .Array[0, 4]
        .Select(all => DatePeriods.Of(all.Select(one => new DatePeriod(First.PlusDays(one.Item1), one.Item3 == 0 ? null : First.PlusDays(one.Item1 + one.Item2)))));
}
