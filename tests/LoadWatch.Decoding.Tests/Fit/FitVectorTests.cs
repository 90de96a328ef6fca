using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>The hand-made files; every expected number was worked out from their bytes by hand.</summary>
public class FitVectorTests
{
    /// <summary>The time from which the vectors count: second 1,000,000,000 of the FIT epoch.</summary>
    private const long Base = (1_000_000_000 + 631_065_600) * 1000L;

    [Theory]
    [InlineData("v01")]
    [InlineData("v02")]
    [InlineData("v08")]
    [InlineData("v10")]
    public void AWholeFileWithoutTrainingGivesNoRecordingAndNoProblem(string vector)
    {
        var decoded = FitDecoder.Decode(FitVectors.Get(vector));
        Assert.Equal("activity", decoded.FileType);
        Assert.Empty(decoded.Problems);
        Assert.Empty(decoded.Recordings);
        Assert.Equal(FitCompleteness.Complete, FitDecoder.CheckCompleteness(FitVectors.Get(vector)));
    }

    [Theory]
    [InlineData("v06")]
    [InlineData("v09")]
    public void BeatsWithoutAnActivityBeforeThemAreNamed(string vector)
    {
        var decoded = FitDecoder.Decode(FitVectors.Get(vector));
        Assert.Contains("heart beats without an activity", Assert.Single(decoded.Problems).Reason, StringComparison.Ordinal);
        Assert.Empty(decoded.Recordings);
    }

    [Fact]
    public void CompressedTimestampsAdvanceFromTheLastTime()
    {
        var samples = Only("v03");
        Assert.Equal([30, 31, 32, 37, 37, 68], Seconds(samples));
        Assert.Equal([100, 101, 102, 103, 104, 105], samples[Channel.HeartRate]);
    }

    [Fact]
    public void BigEndianMessagesAreRead()
    {
        var samples = Only("v04");
        Assert.Equal([1], Seconds(samples));
        Assert.Equal([250], samples[Channel.Power]);
        Assert.Equal([20], samples[Channel.Altitude]);
        Assert.False(samples.Has(Channel.HeartRate));
    }

    [Fact]
    public void TheFieldOfTheProfileStandsBeforeADeveloperField() => Assert.Equal([200], Only("v05")[Channel.Power]);

    [Fact]
    public void LateBeatsAreTimedFromTheirAnchor()
    {
        var activity = new FitPartWriter().Define(0, new(20, new FitFieldLayout(253, FitBaseType.Unsigned32))).Message(0, 1_000_000_000);
        var decoded = FitDecoder.Decode((byte[])[.. activity.ToBytes(), .. FitVectors.Get("v06")]);
        var beats = Assert.Single(decoded.Recordings).LateHeartRates;
        Assert.Equal(Enumerable.Range(60, 9), beats.Select(beat => beat.BeatsPerMinute));
        Assert.Equal([500, 744, 988, 1232, 1476, 1720, 1964, 2208, 2453], beats.Select(beat => beat.UnixMilliseconds - Base));
    }

    [Fact]
    public void PackedDistanceRunsOverAndEmptyBytesAddNothing()
    {
        var samples = Only("v07");
        Assert.Equal([3, 3.1, 3.05, double.NaN], samples[Channel.Speed]);
        Assert.Equal([250, 255, 260, double.NaN], samples[Channel.Distance]);
    }

    [Theory]
    [InlineData("v11", 49, "wrong checksum")]
    [InlineData("v12", 82, "cut short")]
    [InlineData("v13", 4, "never closed")]
    public void DamageIsRefusedWithItsPlace(string vector, long offset, string reason)
    {
        var decoded = FitDecoder.Decode(FitVectors.Get(vector));
        Assert.Empty(decoded.Recordings);
        var problem = Assert.Single(decoded.Problems);
        Assert.Equal((ProblemSeverity.Error, offset), (problem.Severity, problem.ByteOffset));
        Assert.Contains(reason, problem.Reason, StringComparison.Ordinal);
        Assert.Equal(FitCompleteness.Suspect, FitDecoder.CheckCompleteness(FitVectors.Get(vector)));
    }

    [Fact]
    public void AMessageWithoutFieldsIsPassedOver() => Assert.Equal([0], Seconds(Only("v14")));

    [Fact]
    public void ALocalTypeCanBeDefinedAnew()
    {
        var samples = Only("v15");
        Assert.Equal([0, 1], Seconds(samples));
        Assert.Equal([90, double.NaN], samples[Channel.HeartRate]);
        Assert.Equal([double.NaN, 180], samples[Channel.Power]);
    }

    private static SampleSeries Only(string vector)
    {
        var decoded = FitDecoder.Decode(FitVectors.Get(vector));
        Assert.Empty(decoded.Problems);
        return Assert.Single(decoded.Recordings).Samples;
    }

    private static long[] Seconds(SampleSeries samples) => [.. samples.UnixMilliseconds.ToArray().Select(time => (time - Base) / 1000)];
}
