using CsCheck;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

public class ActivityComputationTests
{
    private static readonly AnchorBook Book = Given.Anchors(
        [.. Given.Cyclist, Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 190)]);

    /// <summary>By hand: 60 minutes at 150 bpm, rest 50, maximum 190 is 108.0954 (Banister 1991); 150 of 190 bpm is 79 %, weight 3
    /// (Edwards 1993) and 1.71 (Stagno 2007, from memory); 200 W for an hour is 720 kJ.</summary>
    [Fact]
    public void ARideGivesEveryQuantityThatItHolds()
    {
        var series = Given.EverySecond(
            (Channel.HeartRate, Given.Steps((150, 3600))),
            (Channel.Power, Given.Steps((200, 3600))),
            (Channel.Distance, [.. Enumerable.Range(0, 3601).Select(second => second * 8.5)]));
        var recording = Given.Recording("cycling", series) with { ElapsedSeconds = 4000, TimerSeconds = 3600 };

        var values = Compute(recording);

        Assert.Equal(
            [("banister_trimp", "AU"), ("distance", "m"), ("edwards_load", "AU"), ("minutes", "min"), ("power_top", "W"), ("stagno_load", "AU"), ("work", "kJ")],
            values.Quantities.Select(quantity => (quantity.Name, quantity.Unit)));
        Assert.Equal(108.0954, values.Quantities[0].Value, 1e-4);
        Assert.Equal([30_600.0, 180, 60, 200, 102.6, 720], values.Quantities.Skip(1).Select(quantity => quantity.Value));
        Assert.DoesNotContain(values.Quantities, quantity => quantity.Estimated);
        Assert.Equal((150.0, 150, 200.0, 200.0), (values.HeartRateMeanBpm, values.HeartRateMaxBpm, values.PowerMeanWatts, values.PowerMaxWatts));
        Assert.Equal([Channel.HeartRate, Channel.Power], values.TimesInZone.Select(zone => zone.Channel));
        Assert.Equal("power", Assert.Single(values.Stimulus).Channel);
        Assert.Empty(values.Remarks);
    }

    [Fact]
    public void AChannelUnderTheWantedShareGivesNothingAndSaysWhy()
    {
        var series = Given.EverySecond((Channel.HeartRate, Given.Steps((120, 12), (0, 88))));

        var values = Compute(Given.Recording("cycling", series));

        Assert.Equal(0.12, values.UsableShare[Channel.HeartRate], 1e-9);
        Assert.Empty(values.Histograms);
        Assert.Empty(values.TimesInZone);
        Assert.Empty(values.Quantities);
        Assert.Null(values.HeartRateMeanBpm);
        Assert.Equal("none", Assert.Single(values.Stimulus).Channel);
        Assert.Equal("heart rate usable in 12 % of the time: no load, zone or stimulus from heart rate", Assert.Single(values.Remarks));
    }

    [Fact]
    public void AnEstimatedMaximumMarksWhatRestsOnIt()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.HeartRateRest, 50));
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60)))));

        var values = ActivityComputation.Compute(recording, Given.Person(birthYear: 1986), book, new ComputationSettings());

        Assert.All(values.Quantities, quantity => Assert.True(quantity.Estimated));
        Assert.True(Assert.Single(values.TimesInZone).Estimated);
    }

    [Fact]
    public void AnUnstatedSexMarksTheTrainingImpulse()
    {
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60)))));

        var values = ActivityComputation.Compute(recording, Given.Person(sex: null), Book, new ComputationSettings());

        Assert.Equal([("banister_trimp", true), ("edwards_load", false), ("stagno_load", false)], values.Quantities.Select(quantity => (quantity.Name, quantity.Estimated)));
    }

    [Fact]
    public void WithoutARestingHeartRateTheImpulseIsUnknownAndNamed()
    {
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60)))));

        var values = ActivityComputation.Compute(
            recording, Given.Person(), Given.Anchors(Given.Anchor(AnchorKind.HeartRateMax, 190)), new ComputationSettings());

        Assert.Equal(["edwards_load", "stagno_load"], values.Quantities.Select(quantity => quantity.Name));
        Assert.Equal("no heart_rate_rest: no load by heart-rate reserve", Assert.Single(values.Remarks));
    }

    /// <summary>By hand: 30 minutes at 150 bpm lie between the thresholds, 2 x 30 (Lucia 2003); x = 100 / 140, a = 0.2, b = 4 give
    /// 30 x 0.7142857 x 0.2 x exp(2.8571429) = 74.6216 (Manzi 2009).</summary>
    [Fact]
    public void ThresholdsAndAnOwnPairAddTheLoadsThatNeedThem()
    {
        var book = Given.Anchors(
            Given.Anchor(AnchorKind.HeartRateRest, 50),
            Given.Anchor(AnchorKind.HeartRateMax, 190),
            Given.Anchor(AnchorKind.HeartRateVt1, 140),
            Given.Anchor(AnchorKind.HeartRateVt2, 170, source: AnchorSource.Estimated),
            Given.Anchor(AnchorKind.TrimpWeight, 0.2),
            Given.Anchor(AnchorKind.TrimpExponent, 4, source: AnchorSource.Estimated));
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 1800)))));

        var values = ActivityComputation.Compute(recording, Given.Person(), book, new ComputationSettings());

        Assert.Equal(
            [("banister_trimp", false), ("edwards_load", false), ("individual_trimp", true), ("lucia_load", true), ("stagno_load", false)],
            values.Quantities.Select(quantity => (quantity.Name, quantity.Estimated)));
        Assert.Equal(74.6216, values.Quantities[2].Value, 1e-4);
        Assert.Equal(60, values.Quantities[3].Value);
    }

    [Fact]
    public void HalfAPairIsNamed()
    {
        var book = Given.Anchors(
            Given.Anchor(AnchorKind.HeartRateRest, 50), Given.Anchor(AnchorKind.HeartRateMax, 190), Given.Anchor(AnchorKind.TrimpWeight, 0.2));
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60)))));

        var values = ActivityComputation.Compute(recording, Given.Person(), book, new ComputationSettings());

        Assert.DoesNotContain(values.Quantities, quantity => quantity.Name == "individual_trimp");
        Assert.Equal("trimp_weight without trimp_exponent: no individual training impulse", Assert.Single(values.Remarks));
    }

    /// <summary>Anchors hold on the local date: 23:30 UTC is the next day at +02:00.</summary>
    [Fact]
    public void TheDevicesOwnOffsetNamesTheDate()
    {
        var book = Given.Anchors(Given.Anchor(AnchorKind.HeartRateMax, 200, new LocalDate(2026, 3, 11)));
        var recording = Given.Recording("cycling", Given.EverySecond((Channel.HeartRate, Given.Steps((150, 60))))) with
        {
            Start = Instant.FromUtc(2026, 3, 10, 23, 30),
        };

        Assert.Empty(Quantities(recording));
        Assert.NotEmpty(Quantities(recording with { LocalOffset = Offset.FromHours(2) }));

        IReadOnlyList<LoadWatch.Loads.Quantity> Quantities(Recording one) =>
            ActivityComputation.Compute(one, Given.Person(), book, new ComputationSettings()).Quantities;
    }

    [Fact]
    public void ARecordingWithoutADateIsRefused() =>
        Assert.Throws<ArgumentException>(() => Compute(Given.Recording("cycling", SampleSeries.Empty) with { Start = null }));

    [Fact]
    public void AnEmptyRecordingGivesNothingAndNoZeros()
    {
        var values = Compute(Given.Recording("training", SampleSeries.Empty));

        Assert.Empty(values.Quantities);
        Assert.Empty(values.UsableShare);
        Assert.All(values.Stimulus, stimulus => Assert.True(stimulus.HardBouts is null && stimulus.SlowSeconds is null, "unknown, not none"));
    }

    [Fact]
    public void WhateverComesInOnlyFiniteNumbersComeOut() =>
        Gen.Select(Readings, Readings, Readings, Gen.Int[1, 60]).Sample((heartRate, power, speed, step) =>
        {
            var rows = Math.Min(heartRate.Length, Math.Min(power.Length, speed.Length));
            var series = new SampleSeries(
                [.. Enumerable.Range(0, rows).Select(row => Given.StartMilliseconds + (row * step * 317L % 90_001))],
                new Dictionary<Channel, double[]>
                {
                    [Channel.HeartRate] = heartRate[..rows],
                    [Channel.Power] = power[..rows],
                    [Channel.Speed] = speed[..rows],
                    [Channel.Distance] = speed[..rows],
                    [Channel.Altitude] = power[..rows],
                });
            var values = Compute(Given.Recording(step % 2 == 0 ? "cycling" : "running", series) with { TimerSeconds = heartRate[0], ElapsedSeconds = power[0] });
            return Numbers(values).All(double.IsFinite);
        });

    private static readonly double[] Odd =
        [double.NaN, double.PositiveInfinity, double.NegativeInfinity, double.MaxValue, double.Epsilon, 0, 254];

    private static readonly Gen<double[]> Readings = Gen.OneOf(
        Gen.Double[0, 300],
        Gen.Double[-1e6, 1e6],
        Gen.Double,
        Gen.Int[0, 6].Select(one => Odd[one])).Array[1, 40];

    private static IEnumerable<double> Numbers(ActivityValues values) =>
    [
        .. values.Quantities.Select(quantity => quantity.Value),
        .. values.TimesInZone.SelectMany(zone => zone.Seconds),
        .. values.UsableShare.Values,
        .. new[] { values.HeartRateMeanBpm, values.PowerMeanWatts, values.PowerMaxWatts }.OfType<double>(),
        .. values.Stimulus
            .SelectMany(region => new[] { region.HardBouts, region.SlowSeconds, region.MediumSeconds, region.LargeSeconds })
            .OfType<LoadWatch.Stimulus.Band>()
            .SelectMany(band => new[] { band.Low, band.Mid, band.High }),
    ];

    private static ActivityValues Compute(Recording recording) =>
        ActivityComputation.Compute(recording, Given.Person(), Book, new ComputationSettings());
}
