using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Days;

/// <summary>Weeks of sessions as the rule of the weekly jump reads them: 100 on Monday, Tuesday, Thursday, Friday and Saturday is a week of 500.</summary>
public class TrainingWeekTests
{
    private static readonly WeeklyJumpRule Rule = new();
    private static readonly int[] TrainingDays = [0, 1, 3, 4, 5];

    /// <summary>Of five sessions of 150 two left no recording, as the plan tells: 450 of three are 750 of five, half more than 500. By its five known days it would be 630.</summary>
    [Fact]
    public void APlannedSessionWithoutARecordingCountsAsTheOthersDid()
    {
        var found = Rule.Of(Days(8, week => week < 7 ? 100 : 150, missing: (week, day) => week == 7 && (day is 1 or 3), planned: true));

        Assert.Equal(0.5, found[^1].Value);
        Assert.Equal(750, found[^1].Evidence.Inputs.Single(input => input.Name == "acute").Value);
    }

    /// <summary>The plan told Saturday, Sunday it was: five sessions, not six.</summary>
    [Fact]
    public void AMatchPlayedADayLaterIsOneSession()
    {
        var days = Days(8, week => week < 7 ? 100 : 150, missing: (week, day) => week == 7 && day == 5, planned: true);
        days[^1] = days[^1] with { State = DayState.Recorded, Load = 150 };

        Assert.Equal(750, Rule.Of(days)[^1].Evidence.Inputs.Single(input => input.Name == "acute").Value);
    }

    /// <summary>Without a plan two of three weeks lack a recording, so 400 is in the middle; five sessions of 130, 650, are 1.63 of that and 1.3 of weeks that are as full.</summary>
    [Fact]
    public void WithoutAPlanAFullWeekIsComparedWithFullWeeks()
    {
        var limits = Stated with { WeeklyJump = Stated.WeeklyJump with { UnplannedFactor = 1.6, OnDays = 1 } };
        List<Day> Of(double load) => Days(16, week => week < 15 ? 100 : load, missing: (week, day) => week < 15 && week % 3 != 0 && day == 1, planned: false);

        Assert.Empty(Rule.Of(Of(130), limits: limits));
        Assert.Equal(500, Rule.Of(Of(161), limits: limits)[^1].Evidence.Inputs.Single(input => input.Name == "usual").Value);
    }

    /// <summary>Three sessions a week, then six: no week before is as full, so the fullest there are say what is usual.</summary>
    [Fact]
    public void MoreSessionsThanEverAreAJumpToo()
    {
        var limits = Stated with { WeeklyJump = Stated.WeeklyJump with { UnplannedFactor = 1.6, OnDays = 1 } };
        var loads = Enumerable.Range(0, 8 * 7).Select(day => (double?)(day % 7 is 0 or 2 or 4 || (day >= 49 && day % 7 < 6) ? 100 : 0));

        Assert.Equal(1, Rule.Of(Findings.Planned.DaysOf(loads), limits: limits)[^1].Value);
    }

    private static List<Day> Days(int weeks, Func<int, double> load, Func<int, int, bool> missing, bool planned) => [.. Enumerable.Range(0, weeks * 7).Select(index =>
    {
        var (week, day) = (index / 7, index % 7);
        var trains = TrainingDays.Contains(day);
        var lost = trains && missing(week, day);
        return new Day
        {
            Person = "anna",
            Date = On(index),
            State = lost && planned ? DayState.Unknown : trains && !lost ? DayState.Recorded : DayState.Rest,
            Load = lost ? planned ? null : 0 : trains ? load(week) : 0,
            Plan = DayPlan.None with { Expected = planned && trains ? 1 : 0 },
        };
    })];
}
