using LoadWatch.Days;
using LoadWatch.Plans;
using NodaTime;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Plans;

public class PersonPlanTests
{
    [Fact]
    public void WithoutAnythingSaidNothingHolds() => Assert.Same(DayPlan.None, PersonPlan.None.On(On(3)));

    /// <summary>Else a stored day would tell of whatever else was read with it.</summary>
    [Fact]
    public void ADateThatNothingSpeaksForIsAsIfNothingWereSaidAtAll() => Assert.Equal(DayPlan.None, Plan(Entry(PlanWord.LightWeek, 7, 13)).On(On(6)));

    [Fact]
    public void APhaseHoldsOnItsDatesOnly()
    {
        var plan = Plan(Entry(PlanWord.LightWeek, 7, 13));

        Assert.Equal([false, true, true, false], new[] { 6, 7, 13, 14 }.Select(day => plan.On(On(day)).IsIn(PlanWord.LightWeek)));
    }

    [Fact]
    public void SessionsWithARecordingAreExpectedUnlessThePersonIsAbsent()
    {
        var plan = new PersonPlan
        {
            Entries = [Entry(PlanWord.TeamSession, 0, 0, expected: true), Entry(PlanWord.Match, 0, 0, expected: true), Entry(PlanWord.Match, 1, 1, expected: true)],
            Absences = [new Absence(AbsenceWord.Ill, On(1), null)],
        };

        Assert.Equal((2, true), (plan.On(On(0)).Expected, plan.On(On(0)).IsMatch));
        Assert.Equal((0, AbsenceWord.Ill), (plan.On(On(1)).Expected, plan.On(On(1)).Absence));
    }

    [Fact]
    public void ReturnFromSevenDaysCountsFourteenDays()
    {
        var plan = new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Away, On(0), On(6))] };

        Assert.Equal([null, 1, 14, null], new[] { 6, 7, 20, 21 }.Select(day => plan.On(On(day)).ReturnDay));
    }

    [Fact]
    public void IllAndThenInjuredIsOneBreak()
    {
        var plan = new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Ill, On(0), On(3)), new Absence(AbsenceWord.Injured, On(4), On(9))] };

        Assert.Equal([null, 1], new[] { 9, 10 }.Select(day => plan.On(On(day)).ReturnDay));
    }

    [Fact]
    public void SixDaysAwayAreNoBreak() =>
        Assert.Null(new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Away, On(0), On(5))] }.On(On(6)).ReturnDay);

    [Fact]
    public void AReturnAsToldCountsWhateverTheAbsence() =>
        Assert.Equal(3, new PersonPlan { Entries = [], Returns = [On(4)] }.On(On(6)).ReturnDay);

    [Fact]
    public void RestOfThePlanMakesAnEmptyDayRest()
    {
        var days = LoadCalendar.Build("anna", [Activity(0, 100)], On(2), Plan(Entry(PlanWord.Rest, 1, 1)));

        Assert.Equal(
            [(DayState.Recorded, "activities"), (DayState.Rest, "stated by plan"), (DayState.Unknown, null)],
            days.Select(day => (day.State, day.StateSource)));
        Assert.Equal(0, days[1].Load);
    }

    [Fact]
    public void WhoTrainsOnADayOffHasTrained()
    {
        var days = LoadCalendar.Build("anna", [Activity(0, 100), Activity(1, 50)], On(1), Plan(Entry(PlanWord.Rest, 1, 1)));

        Assert.Equal((DayState.Recorded, 50), (days[1].State, days[1].Load));
    }

    [Fact]
    public void AnAbsenceAloneStatesNoRest() => Assert.Equal(
        DayState.Unknown,
        LoadCalendar.Build("anna", [Activity(0, 100)], On(1), new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Ill, On(1), null)] })[1].State);

    private static PersonPlan Plan(params PlanEntry[] entries) => new() { Entries = entries };

    private static PlanEntry Entry(PlanWord word, int from, int until, bool expected = false) =>
        new(word, On(from), On(until), null, null, expected, null);
}
