using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

public class RecordingSummariesTests
{
    private static readonly string Sha = new('a', 64);

    private static readonly Recording Ride = Given.Recording(
        "cycling", Given.EverySecond((Channel.Power, Given.Steps((200, 5))), (Channel.HeartRate, [0, 1, 2, 3, 4, double.NaN])));

    [Fact]
    public void CountsWhatMergingLooksAt()
    {
        var summary = RecordingSummaries.Of(Sha, Ride with { LocalOffset = Offset.FromHours(-5), Sets = [Given.Set("squat", 5, 50)] }, Given.Person(), null);

        Assert.Equal((2, 6, 1, "p1"), (summary.Channels, summary.Samples, summary.Sets, summary.Person));
        Assert.Equal(Offset.FromHours(-5), summary.LocalOffset);
        Assert.Equal($"{Sha}/1", summary.Key);
    }

    [Theory]
    [InlineData(255, 7, 1234L, null, "device 255/7/1234")]
    [InlineData(255, null, 1234L, null, "device 255/1234")]
    [InlineData(null, null, null, "own_samples", "layout own_samples")]
    [InlineData(null, null, null, null, "unnamed device")]
    public void TheSourceIsTheDeviceElseTheLayout(int? manufacturer, int? product, long? serial, string? layout, string source) =>
        Assert.Equal(source, RecordingSummaries.Of(Sha, Ride with { Device = new(manufacturer, product, serial) }, Given.Person(), layout).Source);

    [Fact]
    public void ARecordingWithoutADateHasNoSummary() =>
        Assert.Throws<ArgumentException>(() => RecordingSummaries.Of(Sha, Ride with { Start = null }, Given.Person(), null));

    [Fact]
    public void EqualSamplesHaveEqualDigestsAndOthersNot()
    {
        var other = Given.EverySecond((Channel.Power, Given.Steps((200, 5))), (Channel.HeartRate, [0, 1, 2, 3, 5, double.NaN]));

        Assert.Equal(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Part = 2 }));
        Assert.NotEqual(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Samples = other }));
        Assert.NotEqual(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Sets = [Given.Set("squat", 5, 50)] }));
    }

    /// <summary>The digest is stored, so it must not change between versions. Computed independently (in Python): nothing at all, and six rows of 200 W.</summary>
    [Fact]
    public void TheDigestOfSamplesStays()
    {
        Assert.Equal(8381727562152189491, SamplesDigest.Of(Given.Recording("cycling", SampleSeries.Empty)));
        Assert.Equal(4497958356562515116, SamplesDigest.Of(Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((200, 5)))))));
    }
}
