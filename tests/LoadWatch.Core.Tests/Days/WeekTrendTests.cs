using LoadWatch.Days;
using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

public sealed class WeekTrendTests
{
    /// <summary>Weeks of 7 times 10, 20, ... 80: the median of eight is 315, of the last eight of nine 385.</summary>
    [Fact]
    public void TheUsualWeekIsTheMedianOfTheEightBefore()
    {
        var days = Daily([.. Enumerable.Range(0, 10 * 7).Select(day => 10.0 * ((day / 7) + 1))]);

        Assert.Equal(315, days[(9 * 7) - 1].UsualWeek);
        Assert.Equal(385, days[(10 * 7) - 1].UsualWeek);
        Assert.Equal(245, days[(7 * 7) - 1].UsualWeek);
        Assert.Null(days[(6 * 7) - 1].UsualWeek);
    }

    /// <summary>The week before is a light one: 700 stands against 350 of the week before it, and is no change against an ordinary week of 700.</summary>
    [Fact]
    public void ALightWeekIsNoUsualWeekAndNothingIsComparedWithIt()
    {
        var light = new PersonPlan { Entries = [new PlanEntry(PlanWord.LightWeek, On(63), On(69), null, null, false, null)] };
        var activities = Enumerable.Range(0, 77).Select(day => Activity(day, day is >= 63 and < 70 ? 50 : 100)).ToList();
        var day = LoadCalendar.Build("anna", activities, On(76), light)[76];

        Assert.Equal((700, 0, 1), (day.UsualWeek, day.WeeklyChangeOrdinary, day.WeeklyChange));
        Assert.Equal(1, LoadCalendar.Build("anna", activities, On(76))[76].WeeklyChangeOrdinary);
    }

    [Fact]
    public void AWeekThatIsNotKnownIsNotComparedWith()
    {
        var days = Daily(Enumerable.Range(0, 70).Select(day => day is >= 56 and < 60 ? (double?)null : 100));

        Assert.Null(days[69].WeeklyChangeOrdinary);
        Assert.Equal(700, days[69].UsualWeek);
    }

    [Fact]
    public void TheLargestSessionsOfThirtyDaysAreTold()
    {
        var days = Build(
            31,
            Sized(0, 90, "running", 12_000),
            Sized(1, 300, "cycling", 90_000),
            Sized(3, 80, "running", 9_000),
            Sized(4, 500, "rowing", 5_000, addsLoad: false),
            Sized(31, 70, "running", 8_000));

        Assert.Equal((300, 12_000), (days[29].LargestSession30!.Value, days[29].LongestRunMetres30!.Value));
        Assert.Equal((300, 9_000), (days[30].LargestSession30!.Value, days[30].LongestRunMetres30!.Value));
        Assert.Equal((80, 9_000), (days[31].LargestSession30!.Value, days[31].LongestRunMetres30!.Value));
        Assert.Null(Build(0, Activity(0))[0].LongestRunMetres30);
    }

    /// <summary>Two converted sessions with errors of 3 and 4, and one that has the load itself.</summary>
    [Fact]
    public void TheErrorOfADayIsTheRootOfTheSumOfSquares()
    {
        var days = Build(3, Sized(0, 10, error: 3), Sized(0, 10, error: 4, key: "b"), Sized(0, 10, key: "c"), Sized(1, 10), Sized(3, null, error: 3));

        Assert.Equal([5.0, null, null, null], days.Select(day => day.LoadError));
    }

    private static ActivityOnDay Sized(int day, double? load, string sport = "cycling", double? metres = null, double? error = null, string key = "a", bool addsLoad = true) =>
        new($"{key}{day}", On(day), ["watch"], load, [], addsLoad)
        {
            Session = new DaySession(
                $"{key}{day}", sport, load, metres is { } known ? new Dictionary<string, double> { [QuantityNames.Distance] = known } : [], new Dictionary<Channel, double>(), addsLoad) { LoadError = error },
        };
}
