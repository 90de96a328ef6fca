using LoadWatch.Loads;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>I-9 by hand: minutes are those of the interval drawn in each test.</summary>
public class SessionPlansTests
{
    private static readonly Channel[] Bike = [Channel.HeartRate, Channel.Power, Channel.Speed, Channel.Cadence];
    private static readonly Channel[] Watch = [Channel.HeartRate, Channel.Speed];

    [Theory]
    [InlineData(0, 60, 1)] // the same hour
    [InlineData(30, 90, 1)] // half of both
    [InlineData(31, 91, 2)] // 29 of 60 min
    [InlineData(50, 70, 1)] // 10 of 20 min
    [InlineData(51, 71, 2)] // 9 of 20 min
    [InlineData(60, 120, 2)] // the one ends where the other begins
    public void OverlappingByHalfOfTheShorterIsOneSession(double from, double to, int activities) =>
        Assert.Equal(activities, Worn.Plans([Worn.Of("a", 0, 60, Bike), Worn.Of("b", from, to, Watch)]).Count);

    [Theory]
    [InlineData(2, 1)]
    [InlineData(-2, 1)]
    [InlineData(2.001, 2)]
    public void RecordingsWithoutALengthAreOneSessionIfTheyStartWithinTwoSeconds(double seconds, int activities)
    {
        var (one, other) = (Worn.Of("a", 0, 0, [], sets: 3), Worn.Of("b", seconds / 60, seconds / 60, [], sets: 2));

        var plans = Worn.Plans([one, other]);

        Assert.Equal(activities, plans.Count);
        Assert.Equal(activities == 1 ? 3 : 5, plans.Sum(plan => plan.Frame.Sets));
    }

    [Fact]
    public void ARecordingOfSetsWithoutALengthBelongsToWhatItLiesIn()
    {
        var (watch, gym) = (Worn.Of("watch", 0, 60, Watch, sport: "generic"), Worn.Of("gym", 15, 15, [], sport: "training", sets: 4));

        var plan = Assert.Single(Worn.Plans([watch, gym]));

        Assert.Equal(("watch/1", 4, "training", 3600), (plan.Winner.Key, plan.Frame.Sets, plan.Frame.Sport.Name, plan.Frame.ElapsedSeconds));
        Assert.Equal(4, Worn.Merged(plan, [watch, gym]).Recording.Sets.Count);
    }

    [Fact]
    public void TwoDevicesGiveTheChannelsThatTheOtherHasNot()
    {
        Worn[] worn = [Worn.Of("bike", 0, 60, [Channel.Power, Channel.Cadence, Channel.Speed]), Worn.Of("watch", 0, 60, Watch, sport: "running")];

        var plan = Assert.Single(Worn.Plans(worn));

        Assert.Equal("bike/1", plan.Winner.Key);
        Assert.Equal((ContributionRole.Gives, Channel.HeartRate), (plan.Contributions[1].Role, Assert.Single(plan.Contributions[1].Gifts!).Channel));
        Assert.Equal((60, 60, 60), (Worn.Minutes(plan, Channel.Power, worn), Worn.Minutes(plan, Channel.HeartRate, worn), Worn.Minutes(plan, Channel.Speed, worn)));
        Assert.Equal(("cycling", 3600), (plan.Frame.Sport.Name, plan.Frame.ElapsedSeconds));
    }

    [Fact]
    public void AChannelThatIsNotUsableIsGivenByTheOtherDevice()
    {
        // 20 of 60 min with a reading: a third is less than the half that is wanted.
        var loose = Worn.Of("bike", 0, 60, Bike).Recording;
        var strap = loose.Samples[Channel.HeartRate].ToArray().Select((bpm, row) => row < 120 ? bpm : double.NaN).ToArray();
        var columns = loose.Samples.Channels.ToDictionary(channel => channel, channel => channel == Channel.HeartRate ? strap : loose.Samples[channel].ToArray());
        Worn[] worn = [Worn.Of("bike", loose with { Samples = new SampleSeries(loose.Samples.UnixMilliseconds.ToArray(), columns) }), Worn.Of("watch", 0, 60, Watch)];

        var plan = Assert.Single(Worn.Plans(worn));

        Assert.Equal("bike/1", plan.Winner.Key);
        Assert.Equal(60, Worn.Minutes(plan, Channel.HeartRate, worn));
        Assert.DoesNotContain(plan.Contributions[0].Gifts!, gift => gift.Channel == Channel.HeartRate);
    }

    [Fact]
    public void ABikeComputerThatDiedAfterAThirdLosesNothing()
    {
        Worn[] worn = [Worn.Of("bike", 0, 40, Bike, metres: 20_000), Worn.Of("watch", 0, 120, Watch, metres: 57_000)];

        var plan = Assert.Single(Worn.Plans(worn));

        Assert.Equal(("bike/1", 7200, 57_000), (plan.Winner.Key, plan.Frame.ElapsedSeconds, plan.Frame.DistanceMetres));
        Assert.Equal((120, 40, 120), (Worn.Minutes(plan, Channel.HeartRate, worn), Worn.Minutes(plan, Channel.Power, worn), Worn.Minutes(plan, Channel.Speed, worn)));
    }

    [Fact]
    public void TheLoadOfTheDeadBikeComputerIsThatOfTheWholeRide()
    {
        Worn[] worn = [Worn.Of("bike", 0, 40, Bike), Worn.Of("watch", 0, 120, Watch)];
        var anchors = Given.Anchors(Given.Anchor(People.AnchorKind.HeartRateRest, 50), Given.Anchor(People.AnchorKind.HeartRateMax, 190));

        double? Load(Recording recording) => ActivityComputation.Compute(recording, Given.Person(), anchors, new ComputationSettings()).Quantities
            .First(quantity => quantity.Name == QuantityNames.BanisterTrimp).Value;

        // 140 bpm all the time: the load is proportional to the minutes, so three times that of 40 min.
        Assert.Equal(3 * Load(worn[0].Recording)!.Value, Load(Worn.Merged(Worn.Plans(worn)[0], worn).Recording)!.Value, 5);
    }

    [Fact]
    public void SecondsBetweenTwoButtonsAddNothing()
    {
        var plan = Assert.Single(Worn.Plans([Worn.Of("bike", 0, 60, Bike), Worn.Of("watch", -0.5, 60.5, Watch)]));

        Assert.Equal([ContributionRole.Wins, ContributionRole.Superseded], plan.Contributions.Select(one => one.Role));
        Assert.Null(plan.Contributions[0].Gifts);
        Assert.Equal((Worn.At(0), 3600), (plan.Frame.Start, plan.Frame.ElapsedSeconds));
    }

    [Fact]
    public void AWatchSwitchedOnEarlierMovesTheStart()
    {
        Worn[] worn = [Worn.Of("bike", 20, 80, Bike), Worn.Of("watch", 0, 90, Watch)];

        var plan = Assert.Single(Worn.Plans(worn));

        Assert.Equal((Worn.At(0), 5400), (plan.Frame.Start, plan.Frame.ElapsedSeconds));
        Assert.Equal((90, 60), (Worn.Minutes(plan, Channel.HeartRate, worn), Worn.Minutes(plan, Channel.Power, worn)));
    }

    [Fact]
    public void AWatchOverTwoSessionsCountsNothingTwice()
    {
        // The watch belongs to the richer session (70 min), takes the 30 min between them there, and stops where the other begins.
        Worn[] worn = [Worn.Of("first", 0, 70, Bike), Worn.Of("second", 100, 160, Bike), Worn.Of("watch", 0, 160, Watch)];

        var plans = Worn.Plans(worn);

        Assert.Equal(["first/1", "second/1"], plans.Select(plan => plan.Winner.Key));
        Assert.Equal([100 * 60, 60 * 60.0], plans.Select(plan => plan.Frame.ElapsedSeconds));
        Assert.Equal([100, 60], plans.Select(plan => Worn.Minutes(plan, Channel.HeartRate, worn)));
        Assert.Equal([70, 60], plans.Select(plan => Worn.Minutes(plan, Channel.Power, worn)));
    }

    [Fact]
    public void APauseBetweenThatTheWatchGoesOnBehindIsNotCountedTwice()
    {
        // It goes on for 40 min behind the second session: those are the first one's too, the second session's hour is not.
        Worn[] worn = [Worn.Of("first", 0, 70, Bike), Worn.Of("second", 100, 160, Bike), Worn.Of("watch", 0, 200, Watch)];

        var plans = Worn.Plans(worn);

        Assert.Equal([140 * 60, 60 * 60.0], plans.Select(plan => plan.Frame.ElapsedSeconds));
        Assert.Equal(Worn.At(0), plans[0].Frame.Start);
        Assert.Equal([140, 60], plans.Select(plan => Worn.Minutes(plan, Channel.HeartRate, worn)));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void AMultisportFileBesideOneLongRecordingCountsOnce(bool partsAreRicher)
    {
        var (parts, longOne) = partsAreRicher ? (Bike, Watch) : (Watch, Bike);
        Worn[] worn =
        [
            Worn.Of("race", 0, 30, parts, part: 1, sport: "swimming"),
            Worn.Of("race", 32, 92, parts, part: 2),
            Worn.Of("race", 94, 134, parts, part: 3, sport: "running"),
            Worn.Of("long", 0, 134, longOne, sport: "multisport"),
        ];

        var plans = Worn.Plans(worn);

        Assert.Equal(partsAreRicher ? 3 : 1, plans.Count);
        Assert.Equal(134 * 60, plans.Sum(plan => plan.Frame.ElapsedSeconds)!.Value, 6);
        Assert.Equal(134, plans.Sum(plan => Worn.Minutes(plan, Channel.HeartRate, worn)), 6);
    }

    [Fact]
    public void PartsOfOneFileCompeteOnlyIfStartAndSamplesAreEqual()
    {
        Assert.Equal(2, Worn.Plans([Worn.Of("a", 0, 60, Watch), Worn.Of("a", 0, 50, Watch, part: 2)]).Count);
        Assert.Equal(2, Worn.Plans([Worn.Of("a", 0, 60, Watch), Worn.Of("a", 1, 60, Watch, part: 2)]).Count);
        Assert.Single(Worn.Plans([Worn.Of("a", 0, 60, Watch), Worn.Of("a", 0, 60, Watch, part: 2)]));
    }

    [Fact]
    public void AnExportWithOtherBytesCountsOnce()
    {
        var plan = Assert.Single(Worn.Plans([Worn.Of("a", 0, 60, Bike), Worn.Of("b", 0, 60, Bike)]));

        Assert.Equal("a/1", plan.Winner.Key);
        Assert.Equal((ContributionRole.Superseded, 0), (plan.Contributions[1].Role, plan.Contributions[1].Gifts!.Count));
    }

    [Fact]
    public void AChainCountsEachMinuteOnce()
    {
        // a and c do not overlap; b overlaps half of each. The richest decides: b takes both, or a takes b and c stays.
        Worn[] middle = [Worn.Of("a", 0, 60, Watch), Worn.Of("b", 30, 90, Bike), Worn.Of("c", 60, 120, Watch)];
        Worn[] end = [Worn.Of("a", 0, 60, Bike), Worn.Of("b", 30, 90, Watch), Worn.Of("c", 60, 120, Watch)];

        var one = Assert.Single(Worn.Plans(middle));
        var two = Worn.Plans(end);

        Assert.Equal((7200, 120), (one.Frame.ElapsedSeconds, Worn.Minutes(one, Channel.HeartRate, middle)));
        Assert.Equal([("a/1", 3600.0, 60.0), ("c/1", 3600.0, 60.0)], two.Select(plan => (plan.Winner.Key, plan.Frame.ElapsedSeconds!.Value, Worn.Minutes(plan, Channel.HeartRate, end))));
    }

    [Fact]
    public void AnOverlapOfLessThanHalfIsCountedByTheRicherOne()
    {
        // Ten of 60 min: two sessions, and the ten minutes are the bike's; power has only the bike.
        Worn[] worn = [Worn.Of("bike", 0, 60, Bike), Worn.Of("watch", 50, 110, Watch)];

        var plans = Worn.Plans(worn);

        Assert.Equal([3600, 3000.0], plans.Select(plan => plan.Frame.ElapsedSeconds));
        Assert.Equal([60, 50], plans.Select(plan => Worn.Minutes(plan, Channel.HeartRate, worn)));
        Assert.Equal(Worn.At(60), plans[1].Frame.Start);
    }

    [Fact]
    public void OfAnOverlapAChannelThatTheRicherOneHasNotIsKept()
    {
        Worn[] worn = [Worn.Of("bike", 0, 60, [Channel.Power, Channel.Speed, Channel.Cadence]), Worn.Of("strap", 50, 110, [Channel.HeartRate])];

        Assert.Equal(60, Worn.Minutes(Worn.Plans(worn)[1], Channel.HeartRate, worn));
    }

    [Fact]
    public void ACorrectedFileYieldsHoweverRichItWas()
    {
        Worn[] worn = [Worn.Of("old", 0, 60, Bike), Worn.Of("new", 0, 60, Watch)];

        var plan = Assert.Single(Worn.Plans(worn, ("old", "new")));

        Assert.Equal([("new/1", ContributionRole.Wins), ("old/1", ContributionRole.Replaced)], plan.Contributions.Select(one => (one.Key, one.Role)));
        Assert.Equal(0, Worn.Minutes(plan, Channel.Power, worn));
    }

    [Fact]
    public void AFileWhoseNameWentToAnotherSessionStaysCounted()
    {
        // An exporter that always writes latest.fit: yesterday's ride is no mistake. A watch beside it wins, as it still has its name, and the ride gives its power.
        Worn[] worn = [Worn.Of("yesterday", 0, 60, Bike), Worn.Of("today", 1440, 1500, Bike), Worn.Of("watch", 0, 60, Watch)];

        Assert.Equal(2, Worn.Plans(worn[..2], ("yesterday", "today")).Count);
        var plans = Worn.Plans(worn, ("yesterday", "today"));

        Assert.Equal(["watch/1", "today/1"], plans.Select(plan => plan.Winner.Key));
        Assert.Equal([60, 60], plans.Select(plan => Worn.Minutes(plan, Channel.Power, worn)));
    }

    [Fact]
    public void ACorrectionWithAMovedDateLeavesBoth() =>
        Assert.Equal(2, Worn.Plans([Worn.Of("old", 0, 60, Bike), Worn.Of("new", 1440, 1500, Bike)], ("old", "new")).Count);

    [Fact]
    public void ARecordingThatCannotBeReadGivesNothingAndKeepsItsName()
    {
        Worn[] worn = [Worn.Of("bike", 0, 60, Bike), Worn.Of("watch", 0, 60, Watch)];

        var plan = Assert.Single(SessionPlans.Of(
            [.. worn.Select(one => one.Summary)], new Dictionary<string, IReadOnlyList<string>>(), new HashSet<string> { "bike/1" }));

        Assert.Equal([("bike/1", ContributionRole.Unreadable), ("watch/1", ContributionRole.Gives)], plan.Contributions.Select(one => (one.Key, one.Role)));
        Assert.Equal(["watch/1"], plan.Givers);
        Assert.Equal(60, Worn.Minutes(plan, Channel.HeartRate, worn[1..]));
    }

    [Fact]
    public void TheWinnerAloneIsComputedAsItIs()
    {
        var worn = Worn.Of("a", 0, 60, Bike);

        Assert.Same(worn.Recording, Worn.Merged(Assert.Single(Worn.Plans([worn])), [worn]).Recording);
        Assert.Empty(Worn.Plans([]));
    }

    [Fact]
    public void AReadingWithAStrayTimeMakesNoSessionOfYears()
    {
        // One row of the watch is dated 30 years before, one a year later.
        var watch = Worn.Of("watch", 0, 120, Watch).Recording;
        long[] times = [.. watch.Samples.UnixMilliseconds];
        (times[0], times[^1]) = (Worn.At(-30 * 525_600).ToUnixTimeMilliseconds(), Worn.At(525_600).ToUnixTimeMilliseconds());
        var strayed = watch with { Samples = new SampleSeries(times, watch.Samples.Channels.ToDictionary(channel => channel, channel => watch.Samples[channel].ToArray())) };
        Worn[] worn = [Worn.Of("bike", 0, 40, Bike), Worn.Of("watch", strayed), Worn.Of("next", 1440, 1500, Bike)];

        var plans = Worn.Plans(worn);

        Assert.Equal([("bike/1", 7200.0), ("next/1", 3600.0)], plans.Select(plan => (plan.Winner.Key, plan.Frame.ElapsedSeconds!.Value)));
    }

    [Fact]
    public void TotalsAreTakenFromOneDevice()
    {
        // The bike's running total ends at 19.2 km, the watch's own at 57.6: in one column they would tell of a jump.
        Channel[] totals = [Channel.Distance, Channel.HeartRate];
        Worn[] worn = [Worn.Of("bike", 0, 40, [.. Bike, Channel.Distance]), Worn.Of("watch", 0, 120, totals)];

        var merged = Worn.Merged(Assert.Single(Worn.Plans(worn)), worn);

        Assert.Equal(720 * 80, merged[Channel.Distance]!.Samples.Max(sample => sample.Value));
        Assert.Equal(721, merged[Channel.Distance]!.Samples.Count);
    }
}
