using LoadWatch.Activities;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;
using static LoadWatch.Tests.Findings.Planned;

namespace LoadWatch.Tests.Findings;

public class RuleMutesTests
{
    private static readonly Dictionary<PlannedState, DayPlan> Plans = new()
    {
        [PlannedState.Absent] = DayPlan.None with { Absence = AbsenceWord.Injured },
        [PlannedState.Returning] = DayPlan.None with { ReturnDay = 3 },
        [PlannedState.LightWeek] = DayPlan.None with { Phases = [PlanWord.LightWeek] },
        [PlannedState.OffSeason] = DayPlan.None with { Phases = [PlanWord.OffSeason] },
    };

    [Fact]
    public void TheTableIsTheAcceptedOne() => Assert.Equal(
        [
            "away: load_ratio, weekly_jump, falling_load, stimulus_gap, stimulus_low, falling_capacity, silence, test_overdue",
            "returning: load_ratio, weekly_jump, falling_load, stimulus_gap, stimulus_low, falling_capacity",
            "light week: falling_load, stimulus_low",
            "off-season: falling_load, stimulus_low, falling_capacity",
            "too few known days: load_ratio, weekly_jump, monotony, hard_days, falling_load, stimulus_gap, stimulus_low, falling_capacity",
            "not_usable: session_spike, monotony, hard_days, falling_capacity",
            "stimulus_gap: stimulus_low",
            "many of a group silent at once, or an inbox that is away: silence",
            "a match by plan or answers: session_spike",
            "rest by plan, answers or day table: silence",
            "a changed reference value: load_ratio, weekly_jump, session_spike, monotony, hard_days, falling_load",
            "another hand, device or chair height: function_test",
        ],
        RuleMutes.All.Select(mute => $"{mute.By}: {string.Join(", ", mute.Rules)}"));

    [Fact]
    public void EveryNameInTheTableIsARules() =>
        Assert.All(RuleMutes.All.SelectMany(mute => mute.Rules), name => Assert.NotNull(RuleBook.Of(name)));

    /// <summary>People for whom most rules hold, with a plan laid over their last three days: what holds is told if and only if the table leaves its rule on.</summary>
    [Theory]
    [InlineData(PlannedState.Absent)]
    [InlineData(PlannedState.Returning)]
    [InlineData(PlannedState.LightWeek)]
    [InlineData(PlannedState.OffSeason)]
    public void EveryRuleGoesByTheTable(PlannedState state)
    {
        string[] wanted = ["load_ratio", "weekly_jump", "hard_days", "falling_load", "stimulus_gap", "stimulus_low", "falling_capacity", "not_usable", "function_test"];
        var watched = Held(DayPlan.None);
        var planned = Held(Plans[state]);

        Assert.Subset(watched.Keys.ToHashSet(), wanted.ToHashSet());
        Assert.DoesNotContain(watched.Values, finding => finding.Severity == Severity.Suppressed);
        Assert.Equal(watched.Keys.Order(StringComparer.Ordinal), planned.Keys.Order(StringComparer.Ordinal));
        Assert.All(planned.Values, finding => Assert.Equal((finding.Rule, PlanMutes.Of(finding.Rule).Contains(state)), (finding.Rule, finding.Severity == Severity.Suppressed)));
        Assert.All(planned.Values.Where(finding => finding.Severity == Severity.Suppressed), finding =>
            Assert.EndsWith($" Not watched: {PlanMutes.Word(state)} since 22 May.", finding.Text, StringComparison.Ordinal));
    }

    /// <summary>I-12: the reason of an absence is not told.</summary>
    [Fact]
    public void NoSuppressedFindingTellsWhySomebodyIsAway() =>
        Assert.DoesNotContain(Held(Plans[PlannedState.Absent]).Values, finding => finding.Text.Contains("injured", StringComparison.Ordinal));

    [Fact]
    public void WhatIsSuppressedIsToldWithItsDays()
    {
        var found = new LoadRatioRule().Suppressed([.. Watched.Ratios(1.9, 2).Select((day, at) => at == 1 ? day with { Plan = Plans[PlannedState.Absent] } : day)]);

        var finding = Assert.Single(found);
        Assert.Equal("Load of the last 7 days is 2.0 times the usual week (400 against 200 AU), above the limit of 1.8 since 5 January. Not watched: away since 6 January.", finding.Text);
        Assert.Equal(("not_watched", 1.0, "away since 2026-01-06"), finding.Evidence.Inputs[^1] is var item ? (item.Name, item.Value, item.Note) : default);
    }

    [Fact]
    public void APersonsLastDayTellsWhatIsNotWatchedAndSinceWhen()
    {
        Day[] days = [.. Enumerable.Range(0, 10).Select(day => new Day { Person = "anna", Date = On(day), State = DayState.Unknown, Plan = day < 6 ? DayPlan.None : Plans[PlannedState.OffSeason] })];

        var quiet = Assert.Single(NotWatched.Of(days, Watched.Stated with { FallingLoad = Watched.Stated.FallingLoad with { Enabled = false } }));
        Assert.Equal((PlannedState.OffSeason, On(6)), (quiet.State, quiet.Since));
        Assert.Equal("not watched (off-season since 11 January): stimulus low, falling capacity", quiet.Sentence(On(9)));
        Assert.Empty(NotWatched.Of([.. days.Take(6)], Watched.Stated));
        Assert.Empty(NotWatched.Of([], Watched.Stated));
    }

    [Fact]
    public void ASessionOfAFailingStrapIsPassedOver()
    {
        var sessions = Enumerable.Range(0, 20).Select(day => Ride(day, 100)).Append(Ride(20, 200)).ToList();
        Assert.NotEmpty(new SessionSpikeRule().Evaluate(Subject(20, sessions)));

        sessions[^1] = sessions[^1] with { UsableShare = new Dictionary<Channel, double> { [Channel.HeartRate] = 0.6 } };
        var strict = Watched.Stated with { NotUsable = Watched.Stated.NotUsable with { UsableShare = 0.7 } };
        Assert.Empty(new SessionSpikeRule().Evaluate(Subject(20, sessions) with { Limits = strict }));
        Assert.NotEmpty(new SessionSpikeRule().Evaluate(Subject(20, sessions) with { Limits = strict with { NotUsable = strict.NotUsable with { Enabled = false } } }));
    }

    [Fact]
    public void DaysOfAFailingStrapCompleteNoRowOfHardDays()
    {
        var sessions = Enumerable.Range(0, 24).Select(day => Ride(day, day < 20 ? 100 : 150)).ToList();
        Assert.NotEmpty(new HardDaysRule().Evaluate(Subject(23, sessions)));

        sessions[^1] = sessions[^1] with { UsableShare = new Dictionary<Channel, double> { [Channel.HeartRate] = 0.4 } };
        Assert.Empty(new HardDaysRule().Evaluate(Subject(23, sessions)));
        sessions[^1] = sessions[^1] with { UsableShare = new Dictionary<Channel, double> { [Channel.Power] = 0.4 } };
        Assert.NotEmpty(new HardDaysRule().Evaluate(Subject(23, sessions)));
    }

    [Fact]
    public void ABestOfAFailingSensorIsNone()
    {
        var subject = Falling();
        Assert.NotEmpty(new FallingCapacityRule().Evaluate(subject));

        // Without the failing sensor's early best nothing has fallen.
        var failing = subject.Activities.Select((activity, at) => at == 0 ? activity with { UsableShare = new Dictionary<Channel, double> { [Channel.Power] = 0.4 } } : activity);
        Assert.Empty(new FallingCapacityRule().Evaluate(subject with { Activities = [.. failing] }));
    }

    /// <summary>One best of 900 W among sessions of 700 W.</summary>
    private static RuleSubject Falling() => new(
        Anna,
        [.. Enumerable.Range(0, 112).Select(day => new Day { Person = "anna", Date = On(day), State = DayState.Recorded })],
        Watched.Stated)
    {
        Activities =
        [
            .. Enumerable.Range(0, 16).Select(at => new JoinedActivity
            {
                Key = $"a{at}",
                Date = On((7 * at) + 6),
                Sport = new Sport("cycling"),
                Sources = ["watch"],
                Quantities = [new Quantity(QuantityNames.PowerTop, at == 0 ? 900 : 700, "W", false)],
            }),
        ],
    };

    /// <summary>What holds on the last day, by rule, of somebody who does too much and of somebody who does too little.</summary>
    private static Dictionary<string, Finding> Held(DayPlan plan) =>
        Held(plan, Busy, day => day < 100 && day % 3 == 0).Concat(Held(plan, Fading, day => day % (day < 100 ? 3 : 9) == 0))
            .DistinctBy(finding => finding.Rule)
            .ToDictionary(finding => finding.Rule);

    private static IEnumerable<Finding> Held(DayPlan plan, Func<int, double> load, Func<int, bool> heavy)
    {
        List<JoinedActivity> sessions =
        [
            .. Enumerable.Range(0, 140).Select(day => Ride(day, load(day)) with
            {
                UsableShare = day >= 138 ? new Dictionary<Channel, double> { [Channel.Power] = 0.1 } : new Dictionary<Channel, double>(),
                Quantities =
                [
                    new Quantity(QuantityNames.BanisterTrimp, load(day), "AU", false),
                    new Quantity(QuantityNames.SpeedTop, day < 84 ? 15 : 10, "m/s", false),
                ],
            }),
        ];
        var days = LoadCalendar.Build(
            "anna",
            [.. sessions.Select((session, day) => new ActivityOnDay($"{day}", session.Date, ["watch"], load(day), [Bouts(heavy(day) ? 5 : 0)]))],
            On(139)).Select(day => day.Date > On(136) ? day with { Plan = plan } : day).ToList();
        return RuleBook.Evaluate(new RuleSubject(Anna, days, Watched.Stated)
        {
            Activities = sessions,
            Tests = [new DatedTest(On(138), new Rows.TestRow("gait_speed", 0.5, null, null, null, null, null, null, null))],
        }).Where(finding => finding.Date == On(139));
    }

    private static double Busy(int day) => day < 132 ? 60 + (day % 7 * 10) : 250 + day;

    private static double Fading(int day) => day < 110 ? 60 + (day % 7 * 10) : 20;
}
