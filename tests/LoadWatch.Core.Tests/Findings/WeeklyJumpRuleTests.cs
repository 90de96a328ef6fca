using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Plans;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;
using static LoadWatch.Tests.Findings.Watched;

namespace LoadWatch.Tests.Findings;

/// <summary>
/// Eight weeks of 50 a day (350 a week), then 80 a day. By hand the change on the days 59 to 66 is (350 + 30 k) / 350 - 1 for k = 4 to 7, then 560 / (350 + 30 j) - 1
/// for j = 1 to 4: 0.343, 0.429, 0.514, 0.6, 0.474, 0.366, 0.273, 0.191.
/// </summary>
public class WeeklyJumpRuleTests
{
    private static readonly WeeklyJumpRule Rule = new();
    private static readonly double[] Steady = [.. Same(50, 56)];
    private static readonly RuleLimits AtOnce = Stated with { WeeklyJump = Stated.WeeklyJump with { OnDays = 1 } };

    [Fact]
    public void IsRaisedOnTheSecondDayAndHoldsUntilBelowTheReturnValue()
    {
        var found = Rule.Of(DaysOf([.. Steady, .. Same(80, 14)]));

        Assert.Equal([On(61), On(62), On(63), On(64), On(65)], found.Select(finding => finding.Date));
        Assert.All(found, finding => Assert.Equal((Severity.Notice, On(61), 0.4, "fraction"), (finding.Severity, finding.Since, finding.Limit, finding.Unit)));
        Near(530.0 / 350 - 1, found[0].Value);
        Near(560.0 / 440 - 1, found[^1].Value);
        Assert.Equal(
            "Load of the last 7 days is 51 % more than the week before (530 against 350 AU, usually 350); the limit is 40 %, passed since 7 March.", found[0].Text);
        Assert.Equal(
            "Load of the last 7 days is 27 % more than the week before (560 against 440 AU, usually 350); it passed the limit of 40 % on 7 March and returns below 25 %.",
            found[^1].Text);
    }

    /// <summary>70 a day for a week is 490 against 350: 40 % more, on one day.</summary>
    [Theory]
    [InlineData(70, 1)]
    [InlineData(69.9999, 0)]
    public void IsRaisedAtTheLimit(double load, int count) =>
        Assert.Equal(count, Rule.Of(DaysOf([.. Steady, .. Same(load, 7)]), limits: AtOnce).Count);

    [Fact]
    public void OneDayAloneRaisesNothing() => Assert.Empty(Rule.Of(DaysOf([.. Steady, .. Same(70, 14)])));

    [Fact]
    public void AUsualWeekAfterALightOneIsNone() => Assert.Empty(Rule.Of(DaysOf([.. Steady, .. Same(20, 7), .. Same(50, 14)])));

    /// <summary>A little above 1.2 usual weeks: 420.7 against 140 and usually 350.</summary>
    [Theory]
    [InlineData(60, 0)]
    [InlineData(60.1, 1)]
    public void TheUsualMustBeExceededToo(double load, int count) =>
        Assert.Equal(count, Rule.Of(DaysOf([.. Steady, .. Same(20, 7), .. Same(load, 7)]), limits: AtOnce).Count);

    [Theory]
    [InlineData(PlanWord.LightWeek)]
    [InlineData(PlanWord.OffSeason)]
    [InlineData(PlanWord.Travel)]
    public void AWeekThatIsSetAsideIsSteppedOver(PlanWord word)
    {
        var found = Rule.Of(DaysOf([.. Steady, .. Same(20, 7), .. Same(75, 9)], Phase(word, 56, 62)));

        Assert.Equal([On(70), On(71)], found.Select(finding => finding.Date));
        Assert.Equal(0.5, found[0].Value); // 525 against 350, not against 140.
        Assert.Contains("50 % more than the last ordinary week, up to 23 February (525 against 350 AU", found[0].Text, StringComparison.Ordinal);
    }

    [Fact]
    public void AWeekWithoutLoadIsSteppedOver() =>
        Assert.Equal(0.5, Rule.Of(DaysOf([.. Steady, .. Same(0, 7), .. Same(75, 8)]))[0].Value);

    [Fact]
    public void ACampIsAWeekLikeAnyOther() => Assert.NotEmpty(Rule.Of(DaysOf([.. Steady, .. Same(80, 14)], Phase(PlanWord.Camp, 56, 69))));

    [Fact]
    public void AnUnknownWeekBeforeIsNotSteppedOver() =>
        Assert.Empty(Rule.Of(DaysOf([.. Steady.Select(load => (double?)load), .. Repeat(null, 7), .. Repeat(100, 14)])));

    [Fact]
    public void AnUnknownTailNeitherRaisesNorClears()
    {
        Assert.Empty(Rule.Of(DaysOf([.. Steady, .. Same(80, 5)], unknownTail: 20)));
        var found = Rule.Of(DaysOf([.. Steady, .. Same(80, 7)], unknownTail: 20));

        Assert.Equal(Enumerable.Range(61, 22).Select(On), found.Select(finding => finding.Date));
        Assert.Equal(
            "Load of the last 7 days was 60 % more than the week before (560 against 350 AU, usually 350) on 8 March, not known since; the limit is 40 %, passed since 7 March.",
            found[^1].Text);
    }

    [Fact]
    public void FewerThanSixOrdinaryWeeksSayNothing() => Assert.Empty(Rule.Of(DaysOf([.. Same(50, 35), .. Same(80, 7)])));

    [Fact]
    public void ItIsOffInAnAbsenceAndAfterTheReturn()
    {
        double[] loads = [.. Steady, .. Same(80, 14)];

        Assert.DoesNotContain(Rule.Of(DaysOf(loads, Absent(62, 63))), finding => finding.Date == On(62) || finding.Date == On(63));
        Assert.Empty(Rule.Of(DaysOf(loads, new PersonPlan { Entries = [], Returns = [On(58)] })));
    }

    [Fact]
    public void AQuantityHasFindingsOfItsOwnInItsOwnUnit()
    {
        var limits = Stated with { WeeklyJump = Stated.WeeklyJump with { Quantities = ["distance", "never_computed"] } };
        var days = DaysOf([.. Steady, .. Same(50, 14)]);
        var series = new QuantitySeries("distance", "m", DaysOf([.. Same(5000, 56), .. Same(8000, 14)]));
        var found = Rule.Evaluate(new RuleSubject(Anna, days, limits) { Series = new Dictionary<string, QuantitySeries> { ["distance"] = series } }).ToList();

        Assert.Equal(5, found.Count);
        Assert.All(found, finding => Assert.Equal(new FindingKey("anna", "weekly_jump", null, "distance"), finding.Key));
        Assert.StartsWith("Distance of the last 7 days is 51 % more than the week before (53000 against 35000 m", found[0].Text, StringComparison.Ordinal);
    }

    /// <summary>Five sessions of 100 a week, of the last week the plan expects five and three of 140 came: 420, and 700 for all five, against 500. The two that did not come are unknown.</summary>
    [Fact]
    public void AWeekScaledToItsSessionsIsToldAsScaledWithItsKnownLoad()
    {
        var finding = Rule.Of(PlannedWeeks(missing: [56, 57]), limits: AtOnce).First(one => one.Date == On(60));

        Assert.Equal(
            "Load of the last 7 days, as 3 of 5 sessions tell, is 40 % more than the week before (700, 420 of it known, against 500 AU, usually 500); the limit is 40 %, passed since 6 March.",
            finding.Text);
        Assert.Equal((700, 420, 5, 3, 5), Known(finding, "acute"));
        Assert.Equal("load of the last 7 days, as 3 of 5 sessions tell", Item(finding, "acute").Note);
        Assert.Equal((500, 500, 7, 5, 5), Known(finding, "before"));
    }

    /// <summary>One of the five sessions of the week before is unknown: 400, and 500 for all five.</summary>
    [Fact]
    public void SoIsTheWeekBefore()
    {
        var finding = Rule.Of(PlannedWeeks(missing: [50]), limits: AtOnce).First(one => one.Date == On(60));

        Assert.Contains("40 % more than the week before, as 4 of 5 sessions tell (700 against 500 AU, 400 of it known, usually 500)", finding.Text, StringComparison.Ordinal);
        Assert.Equal((500, 400, 6, 4, 5), Known(finding, "before"));
        Assert.Equal((700, 700, 7, 5, 5), Known(finding, "acute"));
    }

    /// <summary>Without a plan a day of which nothing is known counts as the others do: 6 of 80 are 480, and 560 for seven.</summary>
    [Fact]
    public void AWeekScaledToItsDaysIsToldAsScaled()
    {
        var days = LoadCalendar.Build("anna", [.. Enumerable.Range(0, 70).Where(day => day != 58).Select(day => Activity(day, day < 56 ? 50 : 80))], On(69))
            .Select(day => day.Date == On(58) ? day with { State = DayState.Unknown, Load = null } : day)
            .ToList();
        var finding = Rule.Of(days).First(one => one.Date == On(62));

        Assert.Contains(
            "Load of the last 7 days, as 6 of 7 days tell, is 60 % more than the week before (560, 480 of it known, against 350 AU, usually 350)", finding.Text, StringComparison.Ordinal);
        Assert.Equal((560, 480, 6, 6, 6), Known(finding, "acute"));
    }

    private static (double?, double?, double?, double?, double?) Known(Finding finding, string week) => (
        Item(finding, week).Value,
        Item(finding, $"{week}_known").Value,
        Item(finding, $"{week}_known_days").Value,
        Item(finding, $"{week}_known_sessions").Value,
        Item(finding, $"{week}_sessions").Value);

    private static EvidenceItem Item(Finding finding, string name) => finding.Evidence.Inputs.Single(item => item.Name == name);

    /// <summary>Sessions expected on five days of every week, 100 each, and 140 in the week from day 56 on; those missing are unknown.</summary>
    internal static List<Day> PlannedWeeks(int[] missing) => Enumerable.Range(0, 63)
        .Select(day => (Day: day, Expected: day % 7 < 5, Missing: missing.Contains(day)))
        .Select(one => new Day
        {
            Person = "anna",
            Date = On(one.Day),
            State = one.Missing ? DayState.Unknown : one.Expected ? DayState.Recorded : DayState.Rest,
            Load = one.Missing ? null : !one.Expected ? 0 : one.Day < 56 ? 100 : 140,
            Plan = DayPlan.None with { Expected = one.Expected ? 1 : 0 },
        })
        .ToList();
}
