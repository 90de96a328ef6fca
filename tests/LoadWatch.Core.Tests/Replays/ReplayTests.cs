using LoadWatch.Alerts;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Replays;
using NodaTime;

namespace LoadWatch.Tests.Replays;

public class ReplayTests
{
    private static readonly LocalDate First = new(2026, 1, 1);

    private static readonly Person Anna = new("anna", "Anna", "squad", 2000, null, DateTimeZone.Utc);

    private static readonly RuleLimits Ratio = new()
    {
        LoadRatio = new() { Raise = 1.8, Return = 1.6, OnDays = 1, OffDays = 1 },
        WeeklyJump = new() { Enabled = false },
        Monotony = new() { Enabled = false },
        HardDays = new() { Enabled = false },
        FallingLoad = new() { Enabled = false },
    };

    /// <summary>
    /// 100 a day for 40 days, then 200 a day for 7, then 100 again. By hand: n days into the double week the ratio is (700 + 100 n) / 700 over the 21 days before while
    /// those hold none of it, so 1.8 is passed with n = 6 (1.857), on the date 45 (counted from 0), and 2.0 is reached with n = 7. A day later the 7 days hold 6 and the 21 before them 1 double one:
    /// 1300 / (2200 / 3) = 1.773, two days later 1200 / (2300 / 3) = 1.565: below 1.6 on the date 48.
    /// </summary>
    private static readonly ReplayedPerson Doubled = Past(index => index is >= 40 and < 47 ? 200 : 100);

    [Fact]
    public void AnAlertOfThePastIsRaisedAndOverWhereTheLimitsSaySo()
    {
        var replay = PersonReplay.Of(Doubled, Ratio);

        Assert.Equal(
            [(First.PlusDays(45), AlertChangeReason.Raised), (First.PlusDays(45), AlertChangeReason.Acknowledged), (First.PlusDays(48), AlertChangeReason.ReturnedToNormal)],
            replay.Changes.Select(change => (change.Date, change.Reason)));
        Assert.Empty(replay.Standing);
    }

    [Fact]
    public void OtherLimitsTellOtherwise()
    {
        Assert.Equal(First.PlusDays(46), PersonReplay.Of(Doubled, Ratio with { LoadRatio = Ratio.LoadRatio with { Raise = 2 } }).Changes[0].Date);
        Assert.Empty(PersonReplay.Of(Doubled, Ratio with { LoadRatio = Ratio.LoadRatio with { Raise = 2.1 } }).Changes);
        Assert.Empty(PersonReplay.Of(Doubled, Ratio with { LoadRatio = Ratio.LoadRatio with { Enabled = false } }).Changes);
    }

    [Fact]
    public void FiguresCountByContactRuleAndSeverityWithTheLeadBeforeMarks()
    {
        var calm = Past(_ => 100) with { Person = Anna with { Id = "ben" } };
        var coach = new Contact("coach", "Coach", ContactRole.Coach, ["squad"], [], DateTimeZone.Utc, new LocalTime(6, 30), new HashSet<IsoDayOfWeek>());

        var figures = ReplayFigures.Of(
            [PersonReplay.Of(Doubled, Ratio), PersonReplay.Of(calm, Ratio)],
            [(coach, new HashSet<string> { "anna", "ben" }), (coach with { Id = "bens" }, new HashSet<string> { "ben" })],
            [new Mark("ANNA", First.PlusDays(50)), new Mark("anna", First.PlusDays(45)), new Mark("ben", First.PlusDays(50))],
            First.PlusDays(30),
            First.PlusDays(59));

        Assert.Equal(30, figures.Days);
        Assert.Equal([new RaisedByRule("load_ratio", Severity.Warning, 1)], figures.Raised);
        Assert.Equal([new RaisedForContact("coach", 2, 1, 1.0 / 30, 1), new RaisedForContact("bens", 1, 0, 0, 0)], figures.Contacts);
        Assert.Equal([(5, "load_ratio"), (null, null), (null, null)], figures.Leads.Select(lead => (lead.Days, lead.Rule)));
        Assert.Equal((0, 0, 0), (figures.Wavering, figures.Standing, figures.StandingLong));
    }

    [Fact]
    public void WhatIsRaisedAndOverAgainWithinAWeekIsChatter()
    {
        var id = "anna|load_ratio||2026-01-01";
        AlertChange At(int day, AlertState from, AlertState to) => new(id, 1, First.PlusDays(day), from, to, AlertChangeReason.Raised, Severity.Notice, "", null);
        int Chatter(params int[] days) => ReplayFigures.Of(
            [new PersonReplay("anna", [.. days.Select((day, at) => At(day, at % 2 == 0 ? AlertState.Normal : AlertState.Acknowledged, at % 2 == 0 ? AlertState.Unacknowledged : AlertState.Normal))], [], new Dictionary<string, FindingKey> { [id] = new("anna", "load_ratio", null) })],
            [],
            [],
            First,
            First.PlusDays(40)).Wavering;

        Assert.Equal([0, 1, 0, 2], [Chatter(1, 2), Chatter(1, 2, 7), Chatter(1, 2, 8), Chatter(1, 2, 3, 4)]);
    }

    [Theory]
    [InlineData(AlertChangeReason.ReturnedToNormal, 1)]
    [InlineData(AlertChangeReason.Corrected, 1)]
    [InlineData(AlertChangeReason.SuppressedByPlan, 0)]
    [InlineData(AlertChangeReason.LimitsChanged, 0)]
    [InlineData(AlertChangeReason.RuleSwitchedOff, 0)]
    public void WhatSomebodyEndedOtherwiseDidNotWaver(AlertChangeReason end, int count) => Assert.Equal(count, Chatter.Of(
        [
            Change(1, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised),
            Change(2, AlertState.Unacknowledged, AlertState.Returned, end),
            Change(3, AlertState.Returned, AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),
        ],
        _ => new FindingKey("anna", "load_ratio", null)));

    /// <summary>A dead strap before the mark is no lead: it tells nothing of training.</summary>
    [Theory]
    [InlineData("load_ratio", 9)]
    [InlineData("stimulus_gap", 9)]
    [InlineData("silence", null)]
    [InlineData("not_usable", null)]
    [InlineData("function_test", null)]
    [InlineData("test_overdue", null)]
    [InlineData("of_a_former_version", null)]
    public void OnlyRulesOfTrainingAreAheadOfAMark(string rule, int? days)
    {
        var stored = PersonReplay.Stored("anna", [Told(rule)], [Change(1, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised) with { AlertId = Told(rule).Id }], First.PlusDays(20));

        Assert.Equal(days, ReplayFigures.Of([stored], [], [new Mark("anna", First.PlusDays(10))], First, First.PlusDays(20)).Leads[0].Days);
    }

    [Fact]
    public void WhatWasToldIsCountedAsItIsStored()
    {
        var alert = Told("load_ratio");
        AlertChange[] changes =
        [
            Change(1, AlertState.Normal, AlertState.Unacknowledged, AlertChangeReason.Raised),
            Change(5, AlertState.Unacknowledged, AlertState.Returned, AlertChangeReason.Corrected),
            Change(9, AlertState.Returned, AlertState.Unacknowledged, AlertChangeReason.RaisedAgain),
        ];
        ReplayFigures Figures(int last) => ReplayFigures.Of(
            [PersonReplay.Stored("anna", [alert], [.. changes.Select(change => change with { AlertId = alert.Id })], First.PlusDays(last))], [], [], First, First.PlusDays(last));

        Assert.Equal([(1, 0, 1), (1, 1, 0), (2, 1, 1)], new[] { 4, 8, 20 }.Select(last => (Figures(last).Raised.Sum(one => one.Count), Figures(last).Corrected, Figures(last).Standing)));
    }

    [Fact]
    public void WhatStandsForLongIsCounted()
    {
        var fading = Past(index => index < 70 ? 100 : 40, days: 100);

        var figures = ReplayFigures.Of([PersonReplay.Of(fading, Ratio with { FallingLoad = new() { Notice = 0.6, OnDays = 1 } })], [], [], First, First.PlusDays(99));

        Assert.Equal((1, 1), (figures.Standing, figures.StandingLong));
    }

    private static Alert Told(string rule) => new(new FindingKey("anna", rule, null), First.PlusDays(1), First.PlusDays(1), AlertState.Unacknowledged, Severity.Notice, "");

    private static AlertChange Change(int day, AlertState from, AlertState to, AlertChangeReason reason) => new("anna", day, First.PlusDays(day), from, to, reason, Severity.Notice, "", null);

    private static ReplayedPerson Past(Func<int, double> load, int days = 120)
    {
        var activities = Enumerable.Range(0, days).Select(index => new ActivityOnDay($"{index:000}", First.PlusDays(index), ["device"], load(index), [])).ToList();
        return new ReplayedPerson(Anna, new Group("squad", "Squad", "minutes", Ratio), LoadCalendar.Build("anna", activities, First.PlusDays(days - 1)), PersonPlan.None, []);
    }
}
