using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Findings;

public class PlannedSilenceTests
{
    private static readonly SilenceRule Rule = new();

    [Fact]
    public void TwoPlannedSessionsWithoutARecordingAreToldOnceTheyHadTimeToComeIn()
    {
        var findings = Rule.Of(Weeks(3, recorded: day => day < 14));

        Assert.Equal(On(19), findings[0].Date);
        Assert.Equal("No recording of the last 2 planned sessions, the first on 20 January.", findings[0].Text);
        Assert.Equal((2, 2, "sessions"), (findings[0].Value, findings[0].Limit, findings[0].Unit));
    }

    [Fact]
    public void OneMissedSessionRaisesNothing() => Assert.Empty(Rule.Of(Weeks(12, recorded: day => day != 29)));

    [Fact]
    public void TheNextRecordingEndsIt() => Assert.Equal(On(21), Rule.Of(Weeks(4, recorded: day => day < 14 || day >= 22))[^1].Date);

    [Fact]
    public void AnAbsenceMutesIt()
    {
        var days = Weeks(4, recorded: day => day < 14)
            .Select(day => day.Date >= On(15) ? day with { Plan = day.Plan with { Absence = AbsenceWord.Away, Expected = 0 } } : day)
            .ToList();

        Assert.Empty(Rule.Of(days));
    }

    [Fact]
    public void DaysOfAbsenceAndOfStatedRestAreNoSilence()
    {
        var days = Enumerable.Range(0, 40).Select(day => Of(day, recorded: day < 20, expected: false)).ToList();
        var told = Rule.Of(days).Count;
        var away = days.Select(day => day.Date >= On(20) ? day with { Plan = DayPlan.None with { Absence = AbsenceWord.Away } } : day).ToList();
        var resting = days.Select(day => day.Date >= On(20) ? day with { Plan = DayPlan.None with { RestStatedBy = "plan" } } : day).ToList();

        Assert.True(told > 0);
        Assert.Empty(Rule.Of([.. away.Take(38), days[38], days[39]]));
        Assert.Empty(Rule.Of([.. resting.Take(38), days[38], days[39]]));
    }

    /// <summary>Recorded daily, so at most three days without; eight silent days, ten away, then silent again.</summary>
    [Fact]
    public void FromTheEndOfAnAbsenceItCountsAnew()
    {
        var days = Enumerable.Range(0, 45)
            .Select(day => Of(day, recorded: day < 20, expected: false))
            .Select(day => day.Date >= On(28) && day.Date < On(38) ? day with { Plan = DayPlan.None with { Absence = AbsenceWord.Ill } } : day);

        var told = Rule.Of([.. days]);

        Assert.Equal([23, 24, 25, 26, 27, 41, 42, 43, 44], told.Select(finding => NodaTime.Period.DaysBetween(On(0), finding.Date)));
        Assert.Equal(On(41), told[^1].Since);
    }

    [Fact]
    public void WhoWasThereAndLoggedNothingIsSaidToHaveBeenThere()
    {
        var plan = new PersonPlan { Entries = [], Attendance = new Dictionary<NodaTime.LocalDate, bool> { [On(16)] = true, [On(18)] = false } };
        var subject = new RuleSubject(Anna, Weeks(3, recorded: day => day < 14), Watched.Stated) { Plan = plan };

        Assert.EndsWith(" Last there on 21 January, by the list of attendance.", Rule.Evaluate(subject).First().Text, StringComparison.Ordinal);
    }

    [Fact]
    public void APlanThatBeginsDoesNotHideASilenceThatStands()
    {
        var days = Enumerable.Range(0, 40).Select(day => Of(day, recorded: day < 20, expected: day is 35 or 38)).ToList();

        Assert.Contains(Rule.Of(days), finding => finding.Date == On(36));
    }

    /// <summary>Recorded daily for 20 days, so at most three without; one session is planned after them, which alone is no silence.</summary>
    [Fact]
    public void WhereAPlanExpectsRecordingsTheOwnRhythmIsNotAsked() =>
        Assert.Empty(Rule.Of(Enumerable.Range(0, 40).Select(day => Of(day, recorded: day < 20, expected: day is < 20 or 21)).ToList()));

    /// <summary>14 of 20 sessions are 70 %, 13 are less.</summary>
    [Theory]
    [InlineData(14, false)]
    [InlineData(13, true)]
    public void APlanThatToldFewOfTheSessionsLeavesTheOwnRhythmInForce(int told, bool asked) =>
        Assert.Equal(asked, Rule.Of(Enumerable.Range(0, 26).Select(day => Of(day, recorded: day < 20, expected: day < told)).ToList()).Exists(finding => finding.Unit == "days"));

    /// <summary>Sessions on Tuesdays and Thursdays, each with a recording expected.</summary>
    private static List<Day> Weeks(int weeks, Func<int, bool> recorded) => Enumerable.Range(0, weeks * 7)
        .Select(day => Of(day, day % 7 is 1 or 3 && recorded(day), expected: day % 7 is 1 or 3))
        .ToList();

    private static Day Of(int day, bool recorded, bool expected) => new()
    {
        Person = "anna",
        Date = On(day),
        State = recorded ? DayState.Recorded : DayState.Unknown,
        DaysSinceRecorded = recorded ? 0 : 5,
        Plan = expected ? DayPlan.None with { Expected = 1 } : DayPlan.None,
    };
}
