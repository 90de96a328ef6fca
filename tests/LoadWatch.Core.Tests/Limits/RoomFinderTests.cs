using CsCheck;
using LoadWatch.Days;
using LoadWatch.Findings;
using LoadWatch.Limits;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Stimulus;
using static LoadWatch.Tests.Days.Training;

namespace LoadWatch.Tests.Limits;

/// <summary>The closed forms are worked out beside each: the search over the real rules must come to them.</summary>
public sealed class RoomFinderTests
{
    private static readonly RuleLimits None = new()
    {
        LoadRatio = new() { Enabled = false },
        WeeklyJump = new() { Enabled = false },
        SessionSpike = new() { Enabled = false },
        Monotony = new() { Enabled = false },
        HardDays = new() { Enabled = false },
    };

    private static readonly RuleLimits Ratio = None with { LoadRatio = new() { Raise = 1.8, Return = 1.6, OnDays = 2 } };

    /// <summary>Six days of 200 lie before, the 21 before them hold 20 x 100 + 500: usual (2500 / 3) = 833.33, and 1.8 x 833.33 - 1200 = 300.</summary>
    [Fact]
    public void OfTheRatioItIsTheLimitTimesTheUsualLessTheSixDays() =>
        Is(300, "load_ratio", Of(Ratio, [.. Same(60, 100), 500, .. Same(10, 100), .. Same(6, 200)]));

    /// <summary>The week before held 700: 1.4 x 700 - 720 = 260; the median, too, is 700: 1.2 x 700 - 720 = 120 binds less.</summary>
    [Fact]
    public void OfTheJumpItIsTheLargerOfBothLimitsLessTheSixDays() =>
        Is(260, "weekly_jump", Of(None with { WeeklyJump = new() { Raise = 0.4, Return = 0.25, UsualFactor = 1.2, UnplannedFactor = 1.2 } }, [.. Same(100, 100), 400, .. Same(19, 100), .. Same(6, 120)]));

    /// <summary>The largest session is 100, and one day held two of 90: 1.4 x 100 = 140.</summary>
    [Fact]
    public void OfASpikeItIsTheLimitTimesTheLargestSession()
    {
        var days = Days([.. Same(40, 100)], twice: 35);

        Is(140, "session_spike", RoomFinder.Of(Anna, Squad(None with { SessionSpike = new() { LoadNotice = 0.4 } }), days, PersonPlan.None));
    }

    /// <summary>Three days of 150 in a row, the median training day is 100: 1.3 x 100 = 130. Without the row it is the largest day.</summary>
    [Fact]
    public void OfARowOfHardDaysItIsTheDayThatIsNotHard()
    {
        var hard = None with { HardDays = new() };

        Is(130, "hard_days", Of(hard, [.. Same(60, 100), 150, 150, 150]));
        Is(150, null, Of(hard, [.. Same(60, 100), 150, 100, 150]));
    }

    /// <summary>The figure is where mean over standard deviation (n - 1) of the seven is the limit of 2: the closed form put the other way round.</summary>
    [Fact]
    public void OfMonotonyItIsTheFirstLoadOfTheEvenWeek()
    {
        var even = None with { Monotony = new() { StrainsWanted = 28, StrainQuantile = 0.5 } };
        var room = Of(even, [.. Enumerable.Range(0, 70).Select(day => day % 2 * 120.0), 120, 120, 120, 120, 120, 20]);
        var loads = new double[] { 120, 120, 120, 120, 120, 20, room.Load!.Value };
        var mean = loads.Average();

        Assert.Equal("monotony", room.HeldBy);
        Assert.Equal(2, mean / Math.Sqrt(loads.Sum(load => (load - mean) * (load - mean)) / 6), 2);
    }

    [Fact]
    public void ItIsNeverAboveTheLargestDayOfThirty()
    {
        Is(150, null, Of(None, [.. Same(20, 400), .. Same(10, 100), 150, .. Same(29, 100)]));
        Is(100, null, Of(None, [.. Same(20, 400), .. Same(10, 100), 150, .. Same(30, 100)]));
    }

    /// <summary>Six days of 400 against a usual week of 700: 2400 / 700 is above 1.8 already.</summary>
    [Fact]
    public void WhereRestPassesTheLimitThereIsNone()
    {
        var room = Of(Ratio, [.. Same(60, 100), .. Same(6, 400)]);

        Assert.Equal((0, "load_ratio", true), (room.Load!.Value, room.HeldBy, room.IsPassedAtRest));
        Assert.Equal("the limit of load ratio is passed today even without any load", RoomWords.Of(room));
    }

    [Fact]
    public void WhoIsAwayOrReturningHasNone()
    {
        var days = Days(Same(60, 100));
        var away = new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Ill, On(58), On(60))] };
        var back = new PersonPlan { Entries = [], Returns = [On(55)] };

        Assert.Equal((null, NoRoom.Absent), Told(RoomFinder.Of(Anna, Squad(Ratio), days, away)));
        Assert.Equal((null, NoRoom.Returning), Told(RoomFinder.Of(Anna, Squad(Ratio), days, back)));
        Assert.Equal("no figure for today: away", RoomWords.Of(RoomFinder.Of(Anna, Squad(Ratio), days, away)));
    }

    [Fact]
    public void WhereTooLittleIsKnownThereIsNone()
    {
        Assert.Equal((null, NoRoom.TooLittleKnown), Told(Of(Ratio, Same(20, 100))));
        Assert.Equal((null, NoRoom.TooLittleKnown), Told(RoomFinder.Of(Anna, Squad(Ratio), Days([.. Same(60, 100), null, null, null]), PersonPlan.None)));
        Assert.Equal((null, NoRoom.NoTrainingDay), Told(Of(Ratio, [.. Same(30, 100), .. Same(31, 0)])));
    }

    /// <summary>Every third of 70 days was heavy: usually 4.75 in 14 days, 2.375 a week; the last 7 hold two or three of them.</summary>
    [Theory]
    [InlineData(70, 2, false)]
    [InlineData(72, 3, true)]
    public void WhetherTheUsualHeavyDaysOfTheWeekAreReachedIsTold(int count, int heavy, bool reached)
    {
        var activities = Enumerable.Range(0, count).Select(day => Activity(day, stimulus: Bouts((day + 1) % 3 == 0 ? 3 : 0))).ToArray();
        var week = Assert.Single(RoomFinder.Of(Anna, Squad(Ratio), Build(count - 1, activities), PersonPlan.None).Regions);

        Assert.Equal((BodyRegion.Legs, heavy, 7, reached), (week.Region, week.Days!.Value, week.Known, week.IsReached!.Value));
    }

    /// <summary>Of which nothing heavy is usual, that nothing is done is no usual that was reached.</summary>
    [Fact]
    public void WhereNoneIsUsualNothingIsReached()
    {
        var activities = Enumerable.Range(0, 90).Select(day => Activity(day, stimulus: Bouts(day == 0 ? 3 : 0))).ToArray();
        var week = Assert.Single(RoomFinder.Of(Anna, Squad(Ratio), Build(89, activities), PersonPlan.None).Regions);

        Assert.Null(week.IsReached);
        Assert.Equal("heavy or fast work of the legs on 0 of the last 7 days (7 known), usually 0", RoomWords.Of(week));
    }

    [Fact]
    public void OnlyAFigureIsSaidToBeOneToPlanWith()
    {
        var days = Days([.. Same(60, 100)]);
        var away = new PersonPlan { Entries = [], Absences = [new Absence(AbsenceWord.Away, On(58), On(60))] };

        Assert.Equal(
            "inside the limits today: up to 100 AU, the largest day of the last 30: a figure to plan with, not a target and not a debt",
            RoomWords.WithMeaning(RoomFinder.Of(Anna, Squad(None), days, PersonPlan.None)));
        Assert.Equal("no figure for today: away", RoomWords.WithMeaning(RoomFinder.Of(Anna, Squad(None), days, away)));
    }

    /// <summary>
    /// Read by the rules on a whole series with one more session: at the figure none raises, a little above it the named one does, and else the largest day is the bound.
    /// Hard days have neither deadband nor off-delay here, as a row that stands would be found at loads that do not raise it.
    /// </summary>
    [Fact]
    public void AtTheFigureNoRuleRaisesAndALittleAboveTheNamedOneDoes() =>
        Gen.Select(Gen.Int[0, 8].Array[75, 160], Gen.Int[0, 3], Gen.Bool).Sample((steps, kind, strict) =>
        {
            var loads = steps.Select((step, day) => (double?)(kind switch { 0 => step * 20, 1 => 80 + step, 2 => (day % 7 < 3 ? 60 : 110) + (step * 3), _ => step < 2 ? 0 : 70 + (step * step) })).ToArray();
            var limits = strict ? Strict : new RuleLimits { HardDays = new() { ReturnFactor = new HardDaysLimits().MedianFactor, OffDays = 1 } };
            var days = Days(loads, limits: limits);
            var room = RoomFinder.Of(Anna, Squad(limits), days, PersonPlan.None);
            if (room.Load is not { } load)
            {
                return room.Reason is not null;
            }

            var nearness = 0.0002 * room.LargestDay!.Value;
            return room switch
            {
                { IsPassedAtRest: true } => load == 0 && Raising(loads, 0, limits).Contains(room.HeldBy),
                { HeldBy: { } rule } => Raising(loads, load, limits).Count == 0 && Raising(loads, load + nearness, limits).Contains(rule) && load < room.LargestDay,
                _ => load == room.LargestDay && Raising(loads, load, limits).Count == 0,
            };
        }, iter: 60);

    private static readonly RuleLimits Strict = new()
    {
        LoadRatio = new() { Raise = 1.2, Return = 1.1 },
        WeeklyJump = new() { Raise = 0.1, Return = 0.05, UsualFactor = 1 },
        SessionSpike = new() { LoadNotice = 0.05, LoadWarning = 0.3 },
        Monotony = new() { Raise = 1.3, Return = 1.2, StrainQuantile = 0.5, StrainsWanted = 28 },
        HardDays = new() { MedianFactor = 1, ReturnFactor = 1, OffDays = 1, Days = 2 },
    };

    /// <summary>Rules of rising load that find something on the date behind some days; nothing stands from before but a row of hard days.</summary>
    private static IReadOnlyList<string> Raising(double?[] loads, double load, RuleLimits limits)
    {
        var (days, date) = (Days([.. loads, load]), On(loads.Length));
        var afresh = limits with { LoadRatio = limits.LoadRatio with { OnDays = 1 }, WeeklyJump = limits.WeeklyJump with { OnDays = 1 } };
        return
        [
            .. RuleBook.Evaluate(Subject(days, afresh) with { From = date }, [new LoadRatioRule(), new WeeklyJumpRule(), new SessionSpikeRule(), new MonotonyRule()])
                .Concat(RuleBook.Evaluate(Subject(days, limits), [new HardDaysRule()]))
                .Where(finding => finding.Date == date)
                .Select(finding => finding.Rule),
        ];
    }

    private static void Is(double load, string? heldBy, TodaysRoom room)
    {
        Assert.Equal(heldBy, room.HeldBy);
        Assert.Equal(load, room.Load!.Value, heldBy is null ? 0 : room.LargestDay!.Value * 0.0002);
    }

    private static (double?, NoRoom?) Told(TodaysRoom room) => (room.Load, room.Reason);

    private static TodaysRoom Of(RuleLimits limits, double?[] loads) => RoomFinder.Of(Anna, Squad(limits), Days(loads), PersonPlan.None);

    private static double?[] Same(int days, double load) => [.. Enumerable.Repeat((double?)load, days)];

    private static Group Squad(RuleLimits limits) => new("squad", "Squad", QuantityNames.BanisterTrimp, limits);

    /// <summary>A session a day; the last day carries what the rule of hard days kept.</summary>
    /// <param name="twice">A day that holds two sessions of 90.</param>
    private static IReadOnlyList<Day> Days(double?[] loads, int? twice = null, RuleLimits? limits = null)
    {
        var days = LoadCalendar.Build("anna", [.. loads.SelectMany((load, day) => day == twice ? [Session(day, 90, "a"), Session(day, 90, "b")] : new[] { Session(day, load, "a") })], On(loads.Length - 1));
        var memory = new RuleMemory(Carried.Nothing);
        _ = RuleBook.Evaluate(Subject(days, limits ?? new RuleLimits()) with { Memory = memory }, [new HardDaysRule()]);
        return [.. days.Take(days.Count - 1), days[^1] with { Carried = new Carried { Runs = memory.On(days[^1].Date) } }];
    }

    private static RuleSubject Subject(IReadOnlyList<Day> days, RuleLimits limits) => new(Anna, days, limits)
    {
        Activities = [.. days.SelectMany(day => day.Sessions.Select(session => session.On(day.Date)))],
        SessionLoads = days.SelectMany(day => day.Sessions).ToDictionary(session => session.Key, session => session.Load),
    };

    private static ActivityOnDay Session(int day, double? load, string key) => Activity(day, load, key: key) with
    {
        Session = new DaySession($"{key}{day}", "cycling", load, new Dictionary<string, double>(), new Dictionary<Channel, double>(), AddsLoad: true),
    };
}
