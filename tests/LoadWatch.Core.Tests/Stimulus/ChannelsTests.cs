using CsCheck;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Stimulus;

/// <summary>What every endurance channel has to say alike. No source: laws of the estimator.</summary>
public class ChannelsTests
{
    /// <summary>The second threshold at 169 bpm is 0.85 of the reserve.</summary>
    private static readonly Anchor[] Everything =
    [
        .. Given.Cyclist, .. Given.Runner,
        Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 190), Given.Anchor(AnchorKind.HeartRateVt2, 169),
    ];

    [Theory]
    [InlineData(0.3)]
    [InlineData(0.5)]
    [InlineData(0.7)]
    [InlineData(0.8)]
    [InlineData(0.95)]
    [InlineData(1)]
    public void OneSteadyStateIsTheSameInEveryChannel(double shareOfCritical)
    {
        var power = Power(Given.Steps((250 * shareOfCritical, 3600)));
        var speed = Speed(Given.Steps((4 * shareOfCritical, 3600)));
        var heartRate = HeartRate(Given.Steps((50 + (119 * shareOfCritical), 3600)));

        Assert.All([speed, heartRate], other =>
        {
            Assert.Equal(power.SlowSeconds!.Value.Mid, other.SlowSeconds!.Value.Mid, 1e-3);
            Assert.Equal(power.MediumSeconds!.Value.Mid, other.MediumSeconds!.Value.Mid, 1e-3);
        });
        Assert.Equal(power.LargeSeconds!.Value.Mid, speed.LargeSeconds!.Value.Mid, 1e-3);
        Assert.All(new[] { power, speed, heartRate }, one => Assert.InRange(power.MediumSeconds!.Value.Mid, one.MediumSeconds!.Value.Low, one.MediumSeconds.Value.High));
    }

    [Theory]
    [InlineData(0.9)]
    [InlineData(0.99)]
    public void AnHourBelowTheCriticalIntensityHoldsNoHardBout(double shareOfCritical)
    {
        Assert.Equal(0, Power(Given.Steps((250 * shareOfCritical, 3600))).HardBouts!.Value.Mid);
        Assert.Equal(0, Speed(Given.Steps((4 * shareOfCritical, 3600))).HardBouts!.Value.Mid);
        Assert.Null(HeartRate(Given.Steps((50 + (119 * shareOfCritical), 3600))).HardBouts);
    }

    [Fact]
    public void WithoutATrueMaximumNoChannelKnowsBoutsOrTheLargestClass()
    {
        Anchor[] anchors = [.. Everything.Where(one => one.Kind is not (AnchorKind.PowerMax or AnchorKind.SpeedMax))];

        Assert.All(
            [
                Of("cycling", anchors, (Channel.Power, Given.Steps((600, 60)))),
                Of("running", anchors, (Channel.Speed, Given.Steps((7, 60)))),
                Of("running", anchors, (Channel.HeartRate, Given.Steps((185, 60)))),
            ],
            legs =>
            {
                Assert.Null(legs.HardBouts);
                Assert.Null(legs.LargeSeconds);
            });
    }

    /// <summary>350 W of critical 250 W last 173.3 s (Morton 1996); 5 m/s of critical 4 m/s with D' 200 m and maximum 8 m/s last 150 s. From there the whole pool.</summary>
    [Fact]
    public void AtExhaustionTheWholePoolIsCalledOn()
    {
        Assert.Equal(5, Power(Given.Steps((350, 180))).LargeSeconds!.Value.Mid - Power(Given.Steps((350, 175))).LargeSeconds!.Value.Mid, 1e-6);
        Assert.Equal(5, Speed(Given.Steps((5, 160))).LargeSeconds!.Value.Mid - Speed(Given.Steps((5, 155))).LargeSeconds!.Value.Mid, 1e-6);
        Assert.True(Power(Given.Steps((350, 100))).LargeSeconds!.Value.Mid - Power(Given.Steps((350, 95))).LargeSeconds!.Value.Mid < 4.5);
    }

    [Fact]
    public void BandsAndClassesAreOrderedInEveryChannel() =>
        Gen.Select(Gen.Double[0, 1].Array[2, 200], Gen.Bool.Select(isOlder => isOlder ? Variants.Older : Variants.Usual)).Sample(
            (shares, variants) =>
            {
                var anchors = Given.Anchors(Everything);
                var watts = Readings(Channel.Power, shares, share => share * 1100);
                var speeds = Readings(Channel.Speed, shares, share => share * 9);
                var bpm = Readings(Channel.HeartRate, shares, share => 50 + (share * 140));
                var power = PowerStimulus.Of(watts, PowerCapacity.On(Given.Date, "p1", anchors, new Sport("cycling"))!, variants);
                var speed = SpeedStimulus.Of(speeds, null, new Sport("running"), SpeedCapacity.On(Given.Date, "p1", anchors)!, variants);
                var drive = HeartRateDrive.On(Given.Date, "p1", anchors, new HeartRateReserve(50, 190, Estimated: false));
                var heartRate = HeartRateStimulus.Of(bpm, bpm.Milliseconds, drive, variants) with { LargeSeconds = default(Band) };
                return IsOrdered(power) && IsOrdered(speed) && IsOrdered(heartRate);
            },
            iter: 300);

    /// <summary>
    /// By hand: 100 s at 350 W spend 10 kJ of 20. With b left of W' the drive is 0.65 + 0.35 x 100 / (750 b), 0.70 from b = 0.9333 on, so from the 14th second on.
    /// 5 m/s of critical 4 m/s, maximum 8, D' 200 m: 0.65 + 0.35 / (4 b), above 0.70 from the first second on.
    /// </summary>
    [Fact]
    public void WhatLiesBetweenIsKept()
    {
        var ride = Session(Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((350, 100), (100, 600))))), Everything);
        var run = Session(Given.Recording("running", Given.EverySecond((Channel.Speed, Given.Steps((5, 100), (2, 600))))), Everything);

        Assert.Equal(10_000, ride.Endurance!.LowestLeft!.Value, 1e-6);
        Assert.Equal((100, 86), (ride.Endurance.CriticalSeconds, ride.Endurance.HardSeconds));
        Assert.Equal(100, run.Endurance!.LowestLeft!.Value, 1e-6);
        Assert.Equal((100, 100), (run.Endurance.CriticalSeconds, run.Endurance.HardSeconds));
        Assert.True(ride is { HeartRate: null, Sets: [] });
    }

    /// <summary>Exactly at critical power counts as there; without a maximum nobody knows what is hard, nor what is left.</summary>
    [Fact]
    public void WithoutATrueMaximumTheTimeAtCriticalPowerIsStillKnown()
    {
        Anchor[] anchors = [.. Everything.Where(one => one.Kind != AnchorKind.PowerMax)];
        var steps = Session(Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((250, 60), (249, 60), (300, 60))))), anchors).Endurance!;

        Assert.Equal(120, steps.CriticalSeconds);
        Assert.True(steps is { HardSeconds: null, LowestLeft: null });
    }

    [Theory]
    [InlineData(true, 0.85, 0.02)]
    [InlineData(false, 0.85, 0.2)]
    public void HeartRateKeepsByWhichThresholdItWasRead(bool isAnchored, double threshold, double error)
    {
        Anchor[] anchors = [.. Everything.Where(one => isAnchored || one.Kind != AnchorKind.HeartRateVt2)];
        var drive = Session(Given.Recording("rowing", Given.EverySecond((Channel.HeartRate, Given.Steps((120, 60))))), anchors).HeartRate!;

        Assert.Equal((isAnchored, threshold, error), (drive.IsAnchored, Math.Round(drive.Threshold, 9), drive.RelativeError));
    }

    /// <summary>By hand: 600 s of power, then 400 s of heart rate alone, 145 bpm being 0.8 of the second threshold's part as 200 W are of critical power.</summary>
    [Fact]
    public void HeartRateTellsWhatPowerLeaves()
    {
        double[] power = [.. Enumerable.Repeat(200.0, 600), .. Enumerable.Repeat(double.NaN, 401)];
        var heartRate = Given.Steps((50 + (119 * 0.8), 1000));

        var legs = Of("cycling", Everything, (Channel.Power, power), (Channel.HeartRate, heartRate));
        var whole = Power(Given.Steps((200, 1000)));

        Assert.Equal(("power", Grade.D), (legs.Channel, legs.Grade));
        Assert.True(legs is { HardBouts: null, LargeSeconds: null, SeesHardWork: false });
        Assert.Equal(whole.MediumSeconds!.Value.Mid, legs.MediumSeconds!.Value.Mid, 1);
        Assert.Equal(whole.SlowSeconds!.Value.Mid, legs.SlowSeconds!.Value.Mid, 1);
        Assert.Contains(legs.NotSeen, reason => reason.StartsWith("7 min without usable power", StringComparison.Ordinal));
    }

    /// <summary>A tenth of a session may be lost; of more it is not told that nothing hard was done there. A choice.</summary>
    [Theory]
    [InlineData(900, true)]
    [InlineData(880, false)]
    public void WhatWasNotSeenIsNotToldAsNotDone(int seconds, bool isKnown)
    {
        double[] power = [.. Enumerable.Repeat(200.0, seconds), .. Enumerable.Repeat(double.NaN, 1000 - seconds)];
        var legs = Of("cycling", Everything, (Channel.Power, power), (Channel.Cadence, Given.Steps((80, 999))));

        Assert.Equal((isKnown, isKnown), (legs.SeesHardWork, legs.LargeSeconds is not null));
        Assert.Equal(isKnown ? Grade.A : Grade.D, legs.Grade);
        Assert.Equal(!isKnown, legs.NotSeen.Any(reason => reason.StartsWith("12 % of the session without usable power: bouts and the largest class are unknown", StringComparison.Ordinal)));
    }

    [Fact]
    public void HardWorkThatWasSeenStandsWhateverWasNot()
    {
        double[] power = [.. Given.Steps((100, 60), (900, 6), (100, 120), (900, 6), (100, 120), (900, 6), (100, 282)), .. Enumerable.Repeat(double.NaN, 400)];
        var legs = Of("cycling", Everything, (Channel.Power, power), (Channel.Cadence, Given.Steps((80, 1000))));

        Assert.Equal((3, Grade.D), (legs.HardBouts!.Value.Mid, legs.Grade));
        Assert.Contains(legs.NotSeen, reason => reason.StartsWith("40 % of the session without usable power: bouts and the largest class are a lower bound", StringComparison.Ordinal));
    }

    [Fact]
    public void HeartRateTellsWhatSpeedLeaves()
    {
        double[] speed = [.. Enumerable.Repeat(3.2, 600), .. Enumerable.Repeat(double.NaN, 401)];

        var legs = Of("running", Everything, (Channel.Speed, speed), (Channel.HeartRate, Given.Steps((50 + (119 * 0.8), 1000))));

        Assert.Equal("speed", legs.Channel);
        Assert.Equal(Power(Given.Steps((200, 1000))).MediumSeconds!.Value.Mid, legs.MediumSeconds!.Value.Mid, 1);
    }

    /// <summary>Ahlquist et al. 1992, Eur J Appl Physiol: at the same power 50 rpm call on more type II fibres than 100; power alone does not tell.</summary>
    [Theory]
    [InlineData(50.0, true)]
    [InlineData(60.0, false)]
    [InlineData(0.0, false)]
    public void HeavyPedallingAtALowCadenceIsALowerBound(double rpm, bool told)
    {
        var legs = Of("cycling", Everything, (Channel.Power, Given.Steps((200, 120))), (Channel.Cadence, Given.Steps((rpm, 120))));

        Assert.Equal(told, legs.NotSeen.Any(reason => reason.StartsWith("heavy pedalling: 2 min", StringComparison.Ordinal)));
    }

    [Fact]
    public void AgeWidensTheBandAndLeavesTheMiddle()
    {
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((200, 600)))));
        var (younger, older) = (Of(recording, Everything, 1967), Of(recording, Everything, 1966));

        Assert.Equal(younger.MediumSeconds!.Value.Mid, older.MediumSeconds!.Value.Mid);
        Assert.True(older.MediumSeconds.Value.Low < younger.MediumSeconds.Value.Low);
        Assert.True(older.MediumSeconds.Value.High >= younger.MediumSeconds.Value.High);
        Assert.Equal(younger, Of(recording, Everything, null), (one, other) => one.MediumSeconds == other.MediumSeconds);
    }

    /// <summary>
    /// The line that makes work count as hard is the same at any age: only the band around it is wider. Bouts may be fewer in the wider band, as two that are read longer
    /// become one.
    /// </summary>
    [Fact]
    public void AtAnyAgeTheMiddleOfAnyRideIsTheSameAndTheBandHoldsTheYoungersBand() =>
        Gen.Select(Gen.Double[0, 1200].Array[2, 200], Gen.Int[20, 59], Gen.Int[60, 95]).Sample((watts, young, old) =>
        {
            var recording = Given.Recording("cycling", Given.EverySecond((Channel.Power, watts)));
            var (younger, older) = (Of(recording, Everything, Given.Date.Year - young), Of(recording, Everything, Given.Date.Year - old));
            return younger.HardBouts?.Mid == older.HardBouts?.Mid && Seconds(younger).Length == Seconds(older).Length
                && Seconds(younger).Zip(Seconds(older)).All(pair =>
                    pair.First.Mid == pair.Second.Mid && pair.Second.Low <= pair.First.Low + 1e-9 && pair.First.High <= pair.Second.High + 1e-9);
        });

    private static Band[] Seconds(RegionStimulus legs) => [.. new[] { legs.SlowSeconds!.Value, legs.MediumSeconds!.Value, legs.LargeSeconds }.OfType<Band>()];

    private static bool IsOrdered(EnduranceEstimate legs)
    {
        Band[] bands = [legs.SlowSeconds!.Value, legs.MediumSeconds!.Value, legs.LargeSeconds!.Value];
        return Array.TrueForAll(bands, band => band.Low >= 0 && band.Low <= band.Mid && band.Mid <= band.High && double.IsFinite(band.High))
            && bands.Zip(bands.Skip(1)).All(pair => pair.First.Low >= pair.Second.Low && pair.First.Mid >= pair.Second.Mid && pair.First.High >= pair.Second.High);
    }

    private static UsableChannel Readings(Channel channel, double[] shares, Func<double, double> value) =>
        new(channel, Given.Samples([.. shares.Select(share => (value(share), 1))]), 1);

    private static RegionStimulus Power(double[] watts) => Of("cycling", Everything, (Channel.Power, watts));

    private static RegionStimulus Speed(double[] metresPerSecond) => Of("running", Everything, (Channel.Speed, metresPerSecond));

    private static RegionStimulus HeartRate(double[] bpm) => Of("running", Everything, (Channel.HeartRate, bpm));

    private static RegionStimulus Of(string sport, Anchor[] anchors, params (Channel Channel, double[] Values)[] columns) =>
        Of(Given.Recording(sport, Given.EverySecond(columns)), anchors, birthYear: null);

    private static RegionStimulus Of(Recording recording, Anchor[] anchors, int? birthYear) => Assert.Single(Session(recording, anchors, birthYear).Regions);

    private static SessionStimulus Session(Recording recording, Anchor[] anchors, int? birthYear = null) => SessionStimulus.Of(
        new UsableRecording(recording, 0.5), Given.Date, Given.Person(birthYear: birthYear), Given.Anchors(anchors), new ComputationSettings());
}
