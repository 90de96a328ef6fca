using CsCheck;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Capacity;

public class TrialChoiceTests
{
    private const double Critical = 250;
    private const double Reserve = 18_000;

    [Fact]
    public void EffortsAtTheLimitAreFound()
    {
        var choice = Of(AllOut("a", 120), AllOut("b", 300), AllOut("c", 720), Easy("d"));

        Assert.Null(choice.Refusal);
        Assert.Equal(["a", "b", "c"], choice.Trials.Select(one => one.Session));
        Assert.Equal([120, 300, 720], choice.Trials.Select(one => one.Trial.Seconds));
        Assert.Equal((Critical, Reserve), (choice.Fit!.Critical, choice.Fit.Reserve), new Close());
    }

    /// <summary>A hard, yet submaximal, ride lies below the line between two others.</summary>
    [Fact]
    public void ASubmaximalRideBetweenOthersIsPassedOver()
    {
        var choice = Of(AllOut("a", 120), Ride("hard", (480, 270)), AllOut("b", 300), AllOut("c", 720));

        Assert.DoesNotContain(choice.Trials, one => one.Session == "hard");
        Assert.Equal(Critical, choice.Fit!.Critical, 6);
    }

    /// <summary>Without a short effort of its own the best two minutes are a piece of the best five.</summary>
    [Fact]
    public void APieceOfALongerEffortIsNoTrial()
    {
        var choice = Of(AllOut("a", 300), AllOut("b", 600), AllOut("c", 900));

        Assert.Equal([300, 600, 900], choice.Trials.Select(one => one.Trial.Seconds));
    }

    [Fact]
    public void WhoNeverGoesLongAtTheLimitIsReadWithoutTheLongest()
    {
        var choice = Of(AllOut("a", 120), AllOut("b", 240), AllOut("c", 480), Ride("easy", (1200, 150)));

        Assert.Equal(480, choice.Trials[^1].Trial.Seconds);
        Assert.Equal(Critical, choice.Fit!.Critical, 6);
    }

    [Fact]
    public void NoSessionIsNoTrial() => Assert.Equal("no session with an unbroken stretch of 2 minutes or more", Of().Refusal);

    [Fact]
    public void OneRaceAloneIsRefused()
    {
        var choice = Of(Ride("race", (120, 400), (300, 310), (720, 275)));

        Assert.Equal(("bests that may have been all out: 5, of sessions: 1; wanted are 3 of 3 sessions", null), (choice.Refusal, choice.Fit));
        Assert.Empty(choice.Trials);
    }

    [Fact]
    public void DurationsTooNearEachOtherAreRefused() =>
        Assert.StartsWith(
            "bests that may have been all out last 300 to 720 s; the longest is to last 3 times as long as the shortest; with longer ones ",
            Of(AllOut("a", 300), AllOut("b", 420), AllOut("c", 720)).Refusal);

    /// <summary>In life efforts scatter: 0.5 % below the line is still all out.</summary>
    [Fact]
    public void AnEffortNextToTheLineCounts() => Assert.Contains(Of(AllOut("a", 120), Ride("b", (300, 308.5)), AllOut("c", 720)).Trials, one => one.Session == "b");

    [Fact]
    public void EasyRidesAloneAreRefused()
    {
        var choice = Of(Easy("a"), Easy("b"), Easy("c"));

        Assert.Null(choice.Fit);
        Assert.StartsWith("bests that may have been all out: ", choice.Refusal);
    }

    [Fact]
    public void BestsOnNoLineAreRefused()
    {
        var choice = Of(Ride("a", (120, 700)), Ride("b", (300, 500)), Ride("c", (480, 360)));

        Assert.Null(choice.Fit);
        Assert.Contains("with longer ones the bests lie on no line: critical power within ", choice.Refusal);
    }

    /// <summary>By hand: W = 5 kJ + 200 W t: 216.7 W for 300 s are 6 % above the 204.2 W of 1200 s, on one line without any error.</summary>
    [Fact]
    public void BestsThatAreAlikeAtAllDurationsAreRefused()
    {
        var choice = Of(Steady("a", 300), Steady("b", 600), Steady("c", 1200));

        Assert.Null(choice.Fit);
        Assert.EndsWith("with longer ones the best of 300 s is above that of 1200 s by 6 %, wanted is 10 %; they were hardly all out", choice.Refusal);
    }

    /// <summary>The same curve over speed is told: 5 % is what is wanted there.</summary>
    [Fact]
    public void OfSpeedAFlatterCurveIsTold() =>
        Assert.NotNull(TrialChoice.Of([.. new[] { Steady("a", 300), Steady("b", 600), Steady("c", 1200) }.Select(AsRun)], Channel.Speed).Fit);

    [Fact]
    public void SpeedIsNamedAsSuch() =>
        Assert.Contains("critical speed", TrialChoice.Of([.. new[] { Ride("a", (120, 700)), Ride("b", (300, 500)), Ride("c", (480, 360)) }.Select(AsRun)], Channel.Speed).Refusal);

    [Fact]
    public void TheOrderOfSessionsChangesNothing() => Gen.Shuffle(Rides()).Sample(rides => Assert.Equal(Of(Rides()).Trials, Of(rides).Trials));

    private static SessionBests[] Rides() => [AllOut("a", 120), AllOut("b", 300), AllOut("c", 720), Easy("d"), AllOut("e", 300), Ride("f", (180, 333.3), (1200, 230))];

    private static TrialChoice Of(params SessionBests[] rides) => TrialChoice.Of(rides, Channel.Power);

    /// <summary>So long as W' lasts, and easy before and behind.</summary>
    private static SessionBests AllOut(string key, int seconds) => Ride(key, (seconds, Critical + (Reserve / seconds)));

    private static SessionBests Steady(string key, int seconds) => Ride(key, (seconds, 200 + (5000.0 / seconds)));

    private static SessionBests Easy(string key) => Ride(key, (1200, 180));

    /// <summary>The best means of efforts amid 100 W; the longest effort is the last that counts.</summary>
    private static SessionBests Ride(string key, params (int Seconds, double Watts)[] efforts) => new(
        key,
        new LocalDate(2026, 1, 10),
        new Sport("cycling"),
        new Dictionary<Channel, BestMeans> { [Channel.Power] = new(BestMeans.Durations.Select(seconds => efforts.Max(effort => Mean(effort, seconds)))) });

    private static SessionBests AsRun(SessionBests ride) => ride with { Means = new Dictionary<Channel, BestMeans> { [Channel.Speed] = new(ride.Means[Channel.Power].Values.Select(watts => watts / 100)) } };

    private static double Mean((int Seconds, double Watts) effort, int seconds) =>
        seconds <= effort.Seconds ? effort.Watts : ((effort.Seconds * effort.Watts) + ((seconds - effort.Seconds) * 100)) / seconds;

    private sealed class Close : IEqualityComparer<(double, double)>
    {
        public bool Equals((double, double) one, (double, double) other) => Math.Abs(one.Item1 - other.Item1) < 1e-6 && Math.Abs(one.Item2 - other.Item2) < 1e-3;

        public int GetHashCode((double, double) value) => 0;
    }
}
