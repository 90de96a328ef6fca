using LoadWatch.People;
using LoadWatch.Recordings;

namespace LoadWatch.Activities;

public class PlausibilityTests
{
    /// <summary>By hand: 1.25 times 8 m/s is 10 m/s.</summary>
    [Theory]
    [InlineData("soccer", 10.0, false)]
    [InlineData("soccer", 10.1, true)]
    [InlineData("running", 10.1, true)]
    [InlineData("cycling", 12, false)]
    [InlineData("soccer", 13.5, false)] // No reading: nobody runs as fast.
    public void ATopSpeedFarAboveTheAnchorIsOfAnotherPerson(string sport, double top, bool held) =>
        Assert.Equal(held, Reason(Speeds(sport, (3, 60), (top, 2)), Given.Anchor(AnchorKind.SpeedMax, 8)) is not null);

    [Fact]
    public void TheReasonNamesBothSpeeds() => Assert.Equal(
        "top speed 10.5 m/s where 8.0 m/s is the person's: of another person?",
        Reason(Speeds("soccer", (3, 60), (10.5, 2)), Given.Anchor(AnchorKind.SpeedMax, 8)));

    /// <summary>By hand: 1.25 times 6 m/s is 7.5 m/s.</summary>
    [Theory]
    [InlineData(9.0, false)]
    [InlineData(9.1, true)]
    public void BelowNineMetresASecondNobodyIsTooFast(double top, bool held) =>
        Assert.Equal(held, Reason(Speeds("running", (3, 60), (top, 2)), Given.Anchor(AnchorKind.SpeedMax, 6)) is not null);

    [Fact]
    public void AJumpThatLastsLessThanASecondSaysNothing()
    {
        var series = new SampleSeries(
            [.. Enumerable.Range(0, 100).Select(row => Given.StartMilliseconds + (row * 100L))],
            new Dictionary<Channel, double[]> { [Channel.Speed] = [.. Enumerable.Range(0, 100).Select(row => row is >= 50 and < 59 ? 12.0 : 3)] });

        Assert.Null(Reason(Given.Recording("soccer", series), Given.Anchor(AnchorKind.SpeedMax, 8)));
    }

    /// <summary>By hand: of 10,000 s, 50 s above are 0.5 %, 51 s are more.</summary>
    [Theory]
    [InlineData(206, 50, false)]
    [InlineData(206, 51, true)]
    [InlineData(205, 5000, false)]
    public void AHeartRateFarAboveTheMeasuredMaximumIsOfAnotherPerson(int bpm, int seconds, bool held) =>
        Assert.Equal(held, Reason(Hearts((150, 10_000 - seconds), (bpm, seconds)), Given.Anchor(AnchorKind.HeartRateMax, 190)) is not null);

    /// <summary>A strap that slips is no other person: 100 spikes of 10 s are 10 % of the time, and are cut before anybody is suspected.</summary>
    [Fact]
    public void SpikesAreOfABadContactNotOfAnotherPerson() =>
        Assert.Null(Reason(Hearts([.. Enumerable.Repeat<(double, int)[]>([(150, 90), (210, 10)], 100).SelectMany(steps => steps), (150, 90)]), Given.Anchor(AnchorKind.HeartRateMax, 190)));

    [Fact]
    public void TheReasonNamesBothHeartRates() => Assert.Equal(
        "heart rate 210 bpm where 190 bpm is the person's maximum: of another person?",
        Reason(Hearts((150, 10), (210, 10)), Given.Anchor(AnchorKind.HeartRateMax, 190)));

    [Theory]
    [InlineData(AnchorSource.Observed)]
    [InlineData(AnchorSource.Estimated)]
    public void OnlyAMeasuredMaximumSaysSo(AnchorSource source) =>
        Assert.Null(Reason(Hearts((230, 1000)), Given.Anchor(AnchorKind.HeartRateMax, 160, source: source)));

    [Fact]
    public void WithoutAnchorsAnythingMayBe()
    {
        Assert.Null(Reason(Speeds("soccer", (12, 60))));
        Assert.Null(Reason(Hearts((240, 60))));
        Assert.Null(Reason(Speeds("soccer", (12, 60)), Given.Anchor(AnchorKind.SpeedMax, 6, Given.Date.PlusDays(1))));
    }

    [Fact]
    public void WithoutReadingsThereIsNothingToHold() => Assert.Null(
        Reason(Given.Recording("soccer", SampleSeries.Empty), Given.Anchor(AnchorKind.SpeedMax, 8), Given.Anchor(AnchorKind.HeartRateMax, 190)));

    private static string? Reason(Recording recording, params Anchor[] anchors) =>
        Plausibility.Of(new UsableRecording(recording, 0.5), Given.Person(), Given.Anchors(anchors), Given.Date);

    private static Recording Speeds(string sport, params (double, int)[] steps) =>
        Given.Recording(sport, Given.EverySecond((Channel.Speed, Given.Steps(steps))));

    private static Recording Hearts(params (double, int)[] steps) =>
        Given.Recording("soccer", Given.EverySecond((Channel.HeartRate, Given.Steps(steps))));
}
