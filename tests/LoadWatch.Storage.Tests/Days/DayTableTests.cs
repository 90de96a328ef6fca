using LoadWatch.Days;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using NodaTime;

namespace LoadWatch.Storage.Tests.Days;

public sealed class DayTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly IReadOnlyDictionary<BodyRegion, RegionDay> None = new Dictionary<BodyRegion, RegionDay>();

    [Fact]
    public void ADayOfWhichNothingIsKnownIsReadAsItWasWritten() => AssertReadAsWritten(Some.Day(Some.Date));

    [Fact]
    public void ADayOfWhichAllIsKnownIsReadAsItWasWritten() => AssertReadAsWritten(new Day
    {
        Person = "anna",
        Date = Some.Date,
        State = DayState.Rest,
        StateSource = "inferred from device 255/7/1234",
        Load = 0,
        Acute = 1.5,
        Chronic = 2.5,
        ChronicBefore = 3.5,
        RatioCoupled = 4.5,
        RatioUncoupled = 5.5,
        RatioEwma = 6.5,
        EwmaAcute = 7.5,
        EwmaChronic = 8.5,
        WeeklyChange = -0.123456789,
        Monotony = 10.5,
        Strain = 11.5,
        ChronicMedian = 0.1 + 0.2,
        Coverage7 = 1.0 / 7,
        Coverage28 = 1,
        DaysSinceFirstCovered = 0,
        DaysSinceRecorded = 3,
        Regions = new Dictionary<BodyRegion, RegionDay>
        {
            [BodyRegion.Arms] = new(null, null, null, null, 0, null),
            [BodyRegion.Legs] = new(HeavyOrFast: false, Days7: 0, Days28: 5, DaysSince: 9, KnownDaysSince: 8, UsualGapDays: 3.5),
        },
    });

    [Fact]
    public void DaysFromADateOnAreReplacedAndThoseBeforeStay()
    {
        Replace(0, DayState.Unknown, 0, 1, 2, 3);

        Replace(2, DayState.Rest, 2);

        var days = Store.Read(session => session.Days.OfPerson("anna"));
        Assert.Equal([DayState.Unknown, DayState.Unknown, DayState.Rest], days.Select(day => day.State));
        Assert.Equal([0, 1, 2], days.Select(day => (day.Date - Some.Date).Days));
    }

    [Fact]
    public void DaysOfOthersStay()
    {
        Replace(0, DayState.Unknown, 0);

        Store.Write(session => session.Days.Replace("bo", Some.Date, []));

        Assert.Single(Store.Read(session => session.Days.OfPerson("anna")));
    }

    [Fact]
    public void BothEndsOfARangeCount()
    {
        Replace(0, DayState.Unknown, 0, 1, 2, 3);

        var days = Store.Read(session => session.Days.OfPerson("anna", Some.Date.PlusDays(1), Some.Date.PlusDays(2)));

        Assert.Equal([1, 2], days.Select(day => (day.Date - Some.Date).Days));
    }

    [Fact]
    public void ADayOfSomebodyElseOrBeforeTheDateIsRefused()
    {
        Assert.Throws<ArgumentException>(() => Store.Write(session => session.Days.Replace("bo", Some.Date, [Some.Day(Some.Date)])));
        Assert.Throws<ArgumentException>(() => Store.Write(session => session.Days.Replace("anna", Some.Date.PlusDays(1), [Some.Day(Some.Date)])));
    }

    /// <summary>Of a brief they hold neither sessions nor what is carried; of a look-back the last holds all.</summary>
    [Fact]
    public void ALookBackReadsTheSessionsAndWhatTheLastDayCarries()
    {
        var day = Some.Day(Some.Date) with
        {
            Sessions = [new DaySession("a/1", "running", 80.123456789, new Dictionary<string, double> { ["distance"] = 1.0 / 3 }, new Dictionary<Channel, double> { [Channel.HeartRate] = 0.5 }, AddsLoad: true)],
            Carried = new Carried { Sources = new Dictionary<string, LocalDate> { ["watch"] = Some.Date } },
        };
        Store.Write(session => session.Days.Replace("anna", Some.Date, [day, day with { Date = Some.Date.PlusDays(1) }]));

        var days = Store.Read(session => session.Days.Before("anna", Some.Date.PlusDays(2)));

        Assert.Equal([Some.Date, Some.Date.PlusDays(1)], days.Select(one => one.Date));
        Assert.All(days, one => Assert.Equivalent(day.Sessions, one.Sessions));
        Assert.Equal([Carried.Write(Carried.Nothing), Carried.Write(day.Carried)], days.Select(one => Carried.Write(one.Carried)));
        Assert.All(Store.Read(session => session.Days.OfPerson("anna")), one => Assert.Empty(one.Sessions));
        Assert.Empty(Store.Read(session => session.Days.Before("anna", Some.Date)));
    }

    [Fact]
    public void AStretchIsReplacedWithoutTheDaysBehindIt()
    {
        Replace(0, DayState.Unknown, 0, 1, 2, 3);
        Store.Write(session => session.Days.Replace("anna", Some.Date.PlusDays(1), [Some.Day(Some.Date.PlusDays(2)) with { State = DayState.Rest }], Some.Date.PlusDays(2)));

        Assert.Equal(
            [(Some.Date, DayState.Unknown), (Some.Date.PlusDays(2), DayState.Rest), (Some.Date.PlusDays(3), DayState.Unknown)],
            Store.Read(session => session.Days.OfPerson("anna")).Select(day => (day.Date, day.State)));
        Assert.Throws<ArgumentException>(() => Store.Write(session => session.Days.Replace("anna", Some.Date, [Some.Day(Some.Date.PlusDays(2))], Some.Date.PlusDays(1))));
    }

    private void Replace(int from, DayState state, params int[] offsets) => Store.Write(session => session.Days.Replace(
        "anna", Some.Date.PlusDays(from), [.. offsets.Select(offset => Some.Day(Some.Date.PlusDays(offset)) with { State = state })]));

    private void AssertReadAsWritten(Day written)
    {
        Store.Write(session => session.Days.Replace("anna", written.Date, [written]));

        var read = Assert.Single(Store.Read(session => session.Days.OfPerson("anna")));

        Assert.Equal(written with { Regions = None }, read with { Regions = None });
        Assert.Equal(written.Regions, read.Regions);
    }
}
