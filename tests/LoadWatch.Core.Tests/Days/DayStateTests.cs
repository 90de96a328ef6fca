using LoadWatch.Days;
using LoadWatch.Plans;
using NodaTime;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Days;

/// <summary>I-6: the state of every date.</summary>
public class DayStateTests
{
    [Fact]
    public void ThreeDaysAWeekNeedNoConfirmedRest()
    {
        int[] trained = [0, 2, 4, 7, 9, 11, 14, 16, 18];
        var days = Build(18, [.. trained.Select(day => Activity(day))]);

        Assert.All(days, (day, index) => Assert.Equal(trained.Contains(index) ? DayState.Recorded : DayState.Rest, day.State));
        Assert.Equal("activities", days[0].StateSource);
        Assert.Equal("inferred from watch", days[1].StateSource);
        Assert.Equal(0, days[1].Load);
        Assert.Equal(300, days[18].Acute);
    }

    [Fact]
    public void TheOpenTailIsUnknown()
    {
        var days = Build(5, Activity(0), Activity(2));

        Assert.Equal([DayState.Recorded, DayState.Rest, DayState.Recorded], days.Take(3).Select(day => day.State));
        Assert.All(days.Skip(3), day => Assert.Equal((DayState.Unknown, null, null), (day.State, day.StateSource, day.Load)));
        Assert.Equal([0, 1, 0, 1, 2, 3], days.Select(day => day.DaysSinceRecorded));
    }

    [Fact]
    public void OfAHoleOfTenDaysTheLastSevenAreRest()
    {
        var days = Build(11, Activity(0), Activity(11));

        Assert.All(days.Skip(1).Take(3), day => Assert.Equal(DayState.Unknown, day.State));
        Assert.All(days.Skip(4).Take(7), day => Assert.Equal(DayState.Rest, day.State));
    }

    [Fact]
    public void AHoleOfSevenDaysIsRestAndOneOfEightBeginsUnknown()
    {
        Assert.DoesNotContain(Build(8, Activity(0), Activity(8)), day => day.State == DayState.Unknown);
        Assert.Equal(Monday.PlusDays(1), Assert.Single(Build(9, Activity(0), Activity(9)), day => day.State == DayState.Unknown).Date);
    }

    [Fact]
    public void ADayThatTheOtherDeviceRecordedIsNoRest()
    {
        var days = Build(4, Activity(0, source: "watch"), Activity(2, 60, "bike"), Activity(4, source: "watch"));

        Assert.Equal(DayState.Recorded, days[2].State);
        Assert.Equal(60, days[2].Load);
    }

    [Fact]
    public void TheOrdinallySmallestSourceIsNamed()
    {
        var days = Build(6, Activity(0, source: "watch"), Activity(1, source: "bike"), Activity(4, source: "watch"), Activity(6, source: "bike"));

        Assert.Equal("inferred from bike", days[2].StateSource);
        Assert.Equal("inferred from bike", days[5].StateSource);
        Assert.Equal("inferred from watch", Build(5, Activity(0, source: "watch"), Activity(4, source: "watch"))[2].StateSource);
    }

    [Fact]
    public void EachDeviceSpeaksForSevenDaysOnly()
    {
        var days = Build(12, Activity(0, source: "bike"), Activity(0, source: "watch"), Activity(3, source: "watch"), Activity(12, source: "bike"));

        Assert.Equal("inferred from watch", days[2].StateSource);
        Assert.Equal(DayState.Unknown, days[4].State);
        Assert.Equal("inferred from bike", days[5].StateSource);
    }

    [Fact]
    public void ANewDeviceSaysNothingAboutTheTimeBeforeItsFirstRecording()
    {
        var days = Build(9, Activity(0, source: "old watch"), Activity(6, source: "new watch"), Activity(9, source: "new watch"));

        Assert.All(days.Skip(1).Take(5), day => Assert.Equal(DayState.Unknown, day.State));
        Assert.Equal("inferred from new watch", days[7].StateSource);
    }

    /// <summary>Sessions were planned on day 1 and 2, and day 2 was stated as rest later; the plan expects no recording on day 3.</summary>
    [Fact]
    public void APlannedSessionWithoutARecordingIsNoRest()
    {
        var plan = new PersonPlan
        {
            Entries = [new PlanEntry(PlanWord.TeamSession, On(1), On(2), null, null, true, null), new PlanEntry(PlanWord.TeamSession, On(3), On(3), null, null, false, null)],
            Rests = new Dictionary<LocalDate, string> { [On(2)] = "answers" },
        };

        var days = LoadCalendar.Build("anna", [Activity(0), Activity(4)], On(4), plan);

        Assert.Equal([DayState.Recorded, DayState.Unknown, DayState.Rest, DayState.Rest, DayState.Recorded], days.Select(day => day.State));
        Assert.Null(days[1].Load);
        Assert.Equal("inferred from watch", days[3].StateSource);
    }
}
