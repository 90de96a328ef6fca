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
        var summary = Of(Ride with { LocalOffset = Offset.FromHours(-5), Sets = [Given.Set("squat", 5, 50)], DistanceMetres = 40 });

        Assert.Equal((2, 6, 1, "p1", 40), (summary.Channels.Count, summary.Samples, summary.Sets, summary.Person, summary.DistanceMetres));
        Assert.Equal(Offset.FromHours(-5), summary.LocalOffset);
        Assert.Equal($"{Sha}/1", summary.Key);
    }

    [Fact]
    public void TellsFromWhenToWhenEachChannelIsUsable()
    {
        // Power has readings in all six seconds; of heart rate only 0 to 4 bpm, which is none of a living person.
        var channels = Of(Ride).Channels;

        Assert.Equal(new ChannelExtent(Channel.Power, IsUsable: true, Given.StartMilliseconds, Given.StartMilliseconds + 5000), channels[Channel.Power]);
        Assert.Equal(new ChannelExtent(Channel.HeartRate, IsUsable: false, null, null), channels[Channel.HeartRate]);
        Assert.Null(channels[Channel.Speed]);
        Assert.Equal((2, 1, Given.StartMilliseconds + 5000), (channels.Count, channels.UsableCount, channels.Last));
    }

    [Theory]
    [InlineData(60.0, 60)]
    [InlineData(null, 5)] // by the last reading
    [InlineData(3.0, 3)]
    [InlineData(0.0, 5)]
    [InlineData(1e9, 172_800)] // 48 h
    [InlineData(double.NaN, 5)]
    [InlineData(-3.0, 5)]
    public void EndsWithItsElapsedTimeOrItsLastReading(double? elapsed, double seconds) =>
        Assert.Equal(seconds, SessionOverlap.Length(Of(Ride with { ElapsedSeconds = elapsed })).TotalSeconds);

    [Fact]
    public void SetsWithoutATimeHaveNoLength() =>
        Assert.Equal(Duration.Zero, SessionOverlap.Length(Of(Given.Recording("training", SampleSeries.Empty, Given.Set("squat", 5, 50)))));

    [Theory]
    [InlineData(255, 7, 1234L, null, "device 255/7/1234")]
    [InlineData(255, null, 1234L, null, "device 255/1234")]
    [InlineData(null, null, null, "own_samples", "layout own_samples")]
    [InlineData(null, null, null, null, "unnamed device")]
    public void TheSourceIsTheDeviceElseTheLayout(int? manufacturer, int? product, long? serial, string? layout, string source) =>
        Assert.Equal(source, Of(Ride with { Device = new(manufacturer, product, serial) }, layout).Source);

    [Fact]
    public void ARecordingWithoutADateHasNoSummary() =>
        Assert.Throws<ArgumentException>(() => Of(Ride with { Start = null }));

    [Fact]
    public void EqualSamplesHaveEqualDigestsAndOthersNot()
    {
        var other = Given.EverySecond((Channel.Power, Given.Steps((200, 5))), (Channel.HeartRate, [0, 1, 2, 3, 5, double.NaN]));

        Assert.Equal(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Part = 2 }));
        Assert.NotEqual(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Samples = other }));
        Assert.NotEqual(SamplesDigest.Of(Ride), SamplesDigest.Of(Ride with { Sets = [Given.Set("squat", 5, 50)] }));
    }

    private static RecordingSummary Of(Recording recording, string? layout = null) =>
        RecordingSummaries.Of(Sha, new UsableRecording(recording, 0.5), Given.Person(), layout);

    /// <summary>The digest is stored, so it must not change between versions. Computed independently (in Python): nothing at all, and six rows of 200 W.</summary>
    [Fact]
    public void TheDigestOfSamplesStays()
    {
        Assert.Equal(8381727562152189491, SamplesDigest.Of(Given.Recording("cycling", SampleSeries.Empty)));
        Assert.Equal(4497958356562515116, SamplesDigest.Of(Given.Recording("cycling", Given.EverySecond((Channel.Power, Given.Steps((200, 5)))))));
    }
}
