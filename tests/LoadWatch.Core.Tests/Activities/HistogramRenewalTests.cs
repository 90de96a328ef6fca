using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Quality;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class HistogramRenewalTests
{
    private static readonly Anchor[] Before = [Given.Anchor(AnchorKind.HeartRateRest, 60)];

    private static readonly Anchor[] After =
    [
        .. Given.Cyclist,
        Given.Anchor(AnchorKind.HeartRateRest, 48),
        Given.Anchor(AnchorKind.HeartRateMax, 191),
        Given.Anchor(AnchorKind.HeartRateVt1, 139),
        Given.Anchor(AnchorKind.HeartRateVt2, 166),
        Given.Anchor(AnchorKind.TrimpWeight, 0.2),
        Given.Anchor(AnchorKind.SpeedMax, 9.3, source: AnchorSource.Estimated),
    ];

    private static readonly SampleSeries Samples = Given.EverySecond(
        (Channel.HeartRate, [.. Enumerable.Range(0, 900).Select(second => 120.0 + (second % 61))]),
        (Channel.Power, [.. Enumerable.Range(0, 900).Select(second => 100.0 + (second * 7 % 301))]),
        (Channel.Speed, [.. Enumerable.Range(0, 900).Select(second => 2 + (second * 13 % 71 / 10.0))]),
        (Channel.Altitude, [.. Enumerable.Range(0, 900).Select(second => second % 40 / 2.0)]));

    private static readonly ComputationSettings OtherBounds = new() { SpeedBounds = [3, 6], SpeedMaxShares = [0.7], PowerBounds = [0.8] };

    /// <summary>Whichever way the anchors change, and there and back again.</summary>
    [Theory]
    [InlineData("soccer")]
    [InlineData("running")]
    [InlineData("cycling")]
    public void RenewedValuesAreThoseOfTheSamplesButForTheStimulus(string sport)
    {
        var recording = Given.Recording(sport, Samples, Given.Set("squat", 5, 100) with { Active = false });
        var old = ActivityComputation.Compute(recording, Given.Person(), Given.Anchors(Before), new ComputationSettings());
        var wanted = ActivityComputation.Compute(recording, Given.Person(), Given.Anchors(After), OtherBounds);

        var renewed = HistogramRenewal.Of(old, recording.Sport, Given.Date, Given.Person(), Given.Anchors(After), OtherBounds);
        var back = HistogramRenewal.Of(renewed, recording.Sport, Given.Date, Given.Person(), Given.Anchors(Before), new ComputationSettings());

        AssertSame(wanted, renewed);
        AssertSame(old, back);
        Assert.NotEqual(old.Quantities, renewed.Quantities);
        Assert.Equal(old.Stimulus, renewed.Stimulus);
    }

    /// <summary>The sets of a recording are no matter of its histograms: what was said of them stays, and stays in its place.</summary>
    [Fact]
    public void OtherRemarksStay()
    {
        var old = new ActivityValues
        {
            Histograms = new Dictionary<Channel, Histogram> { [Channel.HeartRate] = Given.Histogram((150, 10)) },
            Cuts = [new Cut(null, CutReason.Gap, new Stretch(1, 2), 0, 1, 0.5)],
            Remarks = ["power usable in 12 % of the time: no load, zone or stimulus from power", "no heart_rate_rest: no load by heart-rate reserve"],
        };

        var renewed = HistogramRenewal.Of(old, new Sport("cycling"), Given.Date, Given.Person(), AnchorBook.Empty, new ComputationSettings());

        Assert.Equal(old.Cuts, renewed.Cuts);
        Assert.Equal([old.Remarks[0], HeartRateReserve.EveryMissing[0]], renewed.Remarks);
    }

    [Fact]
    public void EveryQuantityOfHeartRateOrAboveASpeedIsTold()
    {
        var told = QuantityNames.AllWith([6], [0.8]).Where(HistogramLoads.Tells);

        Assert.Equal(
            ["banister_trimp", "edwards_load", "lucia_load", "stagno_load", "individual_trimp", "distance_above_6_m_s", "distance_above_80_percent_speed_max"],
            told);
    }

    private static void AssertSame(ActivityValues wanted, ActivityValues renewed)
    {
        Assert.Equal(wanted.Quantities, renewed.Quantities);
        Assert.Equal(wanted.Remarks, renewed.Remarks);
        Assert.Equal(
            wanted.TimesInZone.Select(zone => (zone.Channel, zone.Basis, string.Join(';', zone.Bounds), string.Join(';', zone.Seconds), zone.Estimated)),
            renewed.TimesInZone.Select(zone => (zone.Channel, zone.Basis, string.Join(';', zone.Bounds), string.Join(';', zone.Seconds), zone.Estimated)));
    }
}
