using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Anchors;

public class ObservedAnchorsTests
{
    private static readonly LocalDate March = new(2026, 3, 1);

    private static readonly EquationChoices Equations = new();

    private static readonly Person Someone = Given.Person(birthYear: 1986);

    /// <summary>By hand: W = 18 kJ + 250 W t at 120, 300 and 720 s; with nothing left over the errors are 2 % and 10 %. The best second is the best of 120 s here.</summary>
    [Fact]
    public void ThreeEffortsAtTheLimitGiveACapacityFromTheNextMonthOn()
    {
        var observed = Of(AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17));

        Assert.Equal([AnchorKind.CriticalPower, AnchorKind.WPrime, AnchorKind.PowerMax], observed.Select(one => one.Kind));
        Assert.All(observed, one => Assert.Equal((March, "cycling"), (one.From, one.Sport)));
        Assert.Equal([250, 18_000, 400], observed.Select(one => Math.Round(one.Value, 3)));
        Assert.Equal([5, 1800, 20], observed.Select(one => Math.Round(one.Error, 3)));
        Assert.Equal(new LocalDate(2026, 2, 17), observed[0].ShownOn);
        Assert.Equal("work on time, 3 bests of 120 to 720 s from 3 sessions", observed[0].Basis);
    }

    [Fact]
    public void TheMonthsOwnSessionsDoNotCountForIt() => Assert.Empty(Of(AllOut("a", 120, 3, 1), AllOut("b", 300, 3, 2), AllOut("c", 720, 3, 3)));

    [Fact]
    public void AMoveWithinTheErrorIsNotAdopted()
    {
        SessionBests[] first = [AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17)];
        SessionBests[] better = [.. first, AllOut("d", 120, 3, 3, 254), AllOut("e", 300, 3, 10, 254), AllOut("f", 720, 3, 17, 254)];
        SessionBests[] muchBetter = [.. first, AllOut("d", 120, 3, 3, 262), AllOut("e", 300, 3, 10, 262), AllOut("f", 720, 3, 17, 262)];

        Assert.Single(Through(4, better), one => one.Kind == AnchorKind.CriticalPower);
        Assert.Equal([250, 262], Through(4, muchBetter).Where(one => one.Kind == AnchorKind.CriticalPower).Select(one => Math.Round(one.Value, 3)));
        Assert.Equal(2, Through(4, muchBetter).Count(one => one.Kind == AnchorKind.WPrime));
    }

    [Fact]
    public void WhatIsAdoptedGoesOnWhenNothingNewIsShown()
    {
        var observed = ObservedAnchors.Of(Someone, Equations, [AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17)], [], [], March, March.PlusMonths(30));

        Assert.Equal(3, observed.Count);
    }

    [Fact]
    public void AMaximalPowerShownAgainIsDatedAnew()
    {
        var observed = Through(6, AllOut("a", 120, 2, 3), AllOut("b", 120, 4, 20, 245)).Where(one => one.Kind == AnchorKind.PowerMax).ToList();

        Assert.Equal([(March, 400.0, new LocalDate(2026, 2, 3)), (new(2026, 5, 1), 400, new(2026, 4, 20))], observed.Select(one => (one.From, one.Value, one.ShownOn)));
    }

    /// <summary>By hand: one second of 700 W amid 100 W is 400 W over two; a sprint of 600 W goes on for two at least.</summary>
    [Fact]
    public void OneReadingAmongLowerOnesIsNoMaximalPower()
    {
        var spike = new SessionBests("spike", new LocalDate(2026, 2, 5), new Sport("cycling"), Means(Channel.Power, 1, 700, 100));
        var sprint = new SessionBests("sprint", new LocalDate(2026, 2, 6), new Sport("cycling"), Means(Channel.Power, 2, 600, 100));

        Assert.Empty(Of(spike));
        Assert.Equal((AnchorKind.PowerMax, 600.0, sprint.Date), Assert.Single(Of(spike, sprint)) is var shown ? (shown.Kind, shown.Value, shown.ShownOn) : default);
    }

    [Fact]
    public void EachSportHasItsOwn()
    {
        SessionBests[] both =
        [
            AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17),
            .. new[] { AllOut("d", 120, 2, 4, 200), AllOut("e", 300, 2, 11, 200), AllOut("f", 720, 2, 18, 200) }.Select(one => one with { Sport = new Sport("fitness_equipment", "indoor_rowing") }),
        ];

        Assert.Equal([("cycling", 250), ("rowing", 200)], Of(both).Where(one => one.Kind == AnchorKind.CriticalPower).Select(one => (one.Sport!, (int)Math.Round(one.Value))));
    }

    [Theory]
    [InlineData("running")]
    [InlineData("walking")]
    [InlineData("soccer")]
    [InlineData("e_biking")]
    public void PowerOnFootAndOfMotorsIsNotRead(string sport) => Assert.DoesNotContain(
        Of([.. new[] { AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17) }.Select(one => one with { Sport = new Sport(sport) })]), one => one.Kind == AnchorKind.CriticalPower);

    /// <summary>By hand: d = 200 m + 4 m/s t.</summary>
    [Fact]
    public void RunsGiveCriticalSpeed()
    {
        SessionBests[] runs = [Run("a", 150, 3), Run("b", 420, 10), Run("c", 1200, 17)];

        Assert.Equal([(AnchorKind.CriticalSpeed, 4.0), (AnchorKind.DPrime, 200.0)], Of(runs).Select(one => (one.Kind, Math.Round(one.Value, 6))));
        Assert.Empty(Of([.. runs.Select(run => run with { Sport = new Sport("cycling") })]));
        Assert.All(Of(runs), one => Assert.Null(one.Sport));
    }

    /// <summary>Forty years: Tanaka's equation says 180. The second highest counts.</summary>
    [Theory]
    [InlineData(195, 188.7, 188)]
    [InlineData(195, 183.9, null)]
    [InlineData(195, 184, 184)]
    [InlineData(211, 190, null)]
    public void TheHighestHeartRateOfTwoSessionsIsTakenAboveWhatAgeLetsExpect(double one, double other, int? expected)
    {
        var observed = Of(Heart("a", one, 3), Heart("b", other, 10), Heart("c", 150, 17));

        Assert.Equal(expected is null ? [] : [(AnchorKind.HeartRateMax, (double)expected, 3.0)], observed.Select(shown => (shown.Kind, shown.Value, shown.Error)));
    }

    /// <summary>By hand: 220 lies 40 above the 180 of age, a strap's fault at the default of 30 and a maximum where 40 are allowed.</summary>
    [Theory]
    [InlineData(30, null)]
    [InlineData(39, null)]
    [InlineData(40, 220)]
    public void HowFarAboveAgeAMaximumMayLieIsSetInTheConfiguration(double above, int? expected) => Assert.Equal(
        expected,
        ObservedAnchors.Of(Someone, Equations with { HeartRateAboveEquation = above }, [Heart("a", 220, 3), Heart("b", 220, 10)], [], [], March, March).SingleOrDefault()?.Value);

    [Fact]
    public void SessionsWithoutHeartRateShowNone() => Assert.Empty(ObservedAnchors.Of(Given.Person(), Equations, [Run("a", 150, 3), Run("b", 150, 10)], [], [], March, March));

    [Fact]
    public void WithoutABirthYearNothingElseIsKnown() => Assert.Equal(
        162, Assert.Single(ObservedAnchors.Of(Given.Person(), Equations, [Heart("a", 165, 3), Heart("b", 162, 10)], [], [], March, March)).Value);

    [Fact]
    public void TheSecondBestDateOfAnExerciseOnAMachineCounts()
    {
        ShownMaximum[] maxima =
        [
            Press(2, "press_2", 120), Press(2, "press_2", 118), Press(9, "press_2", 110), Press(16, "press_2", 105), Press(9, "press_1", 140), Press(9, null, 90), Press(16, null, 92),
        ];

        var observed = ObservedAnchors.Of(Someone, Equations, [], maxima, [], March, March);

        Assert.Equal([(null, 90.0, 9.0), ("press_2", 110, 11)], observed.Select(one => (one.Machine, one.Value, one.Error)));
        Assert.All(observed, one => Assert.Equal((AnchorKind.OneRepetitionMax, "leg_press"), (one.Kind, one.Exercise)));
    }

    [Fact]
    public void TheOrderOfSessionsChangesNothing() => Gen.Shuffle(Season()).Sample(sessions => Assert.Equal(Through(12, Season()), Through(12, sessions)));

    [Fact]
    public void GoingOnFromAnyMonthIsTheSameAsAllAtOnce() => Gen.Int[4, 12].Sample(month =>
    {
        var cut = new LocalDate(2026, month, 1);
        var before = ObservedAnchors.Of(Someone, Equations, Season(), [], [], March, cut.PlusMonths(-1));
        var late = Season().Where(session => session.Date >= cut.PlusMonths(-ObservedAnchors.Months)).ToList();

        Assert.Equal(Through(12, Season()), [.. before, .. ObservedAnchors.Of(Someone, Equations, late, [], before, cut, new LocalDate(2026, 12, 1))]);
    });

    private static SessionBests[] Season() =>
    [
        AllOut("a", 120, 2, 3), AllOut("b", 300, 2, 10), AllOut("c", 720, 2, 17), Heart("d", 190, 12), Heart("e", 191, 13),
        AllOut("f", 120, 5, 3, 270), AllOut("g", 300, 6, 10, 270), AllOut("h", 720, 7, 17, 270), AllOut("i", 300, 9, 2, 300), Run("j", 150, 3), Run("k", 420, 10), Run("l", 1200, 17),
    ];

    private static IReadOnlyList<ObservedAnchor> Of(params SessionBests[] sessions) => ObservedAnchors.Of(Someone, Equations, sessions, [], [], March, March);

    private static IReadOnlyList<ObservedAnchor> Through(int month, params SessionBests[] sessions) => ObservedAnchors.Of(Someone, Equations, sessions, [], [], March, new LocalDate(2026, month, 1));

    private static SessionBests AllOut(string key, int seconds, int month, int day, double critical = 250) => new(
        key, new LocalDate(2026, month, day), new Sport("cycling"), Means(Channel.Power, seconds, critical + (18_000.0 / seconds), 100));

    private static SessionBests Run(string key, int seconds, int day) => new(key, new LocalDate(2026, 2, day), new Sport("running"), Means(Channel.Speed, seconds, 4 + (200.0 / seconds), 1));

    private static SessionBests Heart(string key, double bpm, int day) => new(key, new LocalDate(2026, 2, day), new Sport("running"), Means(Channel.HeartRate, 60, bpm, 100));

    private static ShownMaximum Press(int day, string? machine, double kilograms) => new(new LocalDate(2026, 2, day), "leg_press", machine, kilograms);

    private static Dictionary<Channel, BestMeans> Means(Channel channel, int seconds, double mean, double behind) => new()
    {
        [channel] = new(BestMeans.Durations.Select(one => one <= seconds ? mean : ((seconds * mean) + ((one - seconds) * behind)) / one)),
    };
}
