using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Decoding.Fit;

public class RealFileTests
{
    public static TheoryData<string> References => RealFiles.Names(file => file.IsReference);

    [Theory]
    [MemberData(nameof(References))]
    public void FirstAndLastRecordAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var decoded = FitDecoder.Decode(RealFiles.Bytes(name));
        Close(expected.FirstRecord, decoded.Recordings.Min(recording => recording.Samples.First));
        Close(expected.LastRecord, decoded.Recordings.Max(recording => recording.Samples.Last));
    }

    [Theory]
    [MemberData(nameof(References))]
    public void CountsAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var decoded = FitDecoder.Decode(RealFiles.Bytes(name));
        Assert.Empty(decoded.Problems);
        Assert.Equal(expected.FileType, decoded.FileType);
        Assert.Equal(expected.Int("records"), decoded.Recordings.Sum(recording => recording.Samples.Count));
        Assert.Equal(expected.Int("sessions"), decoded.Recordings.Count);
        Assert.Equal(expected.Int("sets"), decoded.Recordings.Sum(recording => recording.Sets.Count));
        Assert.Equal(expected.Int("lengths"), decoded.Recordings.Sum(recording => recording.Lengths));
        Assert.Equal(expected.Int("hr_messages") > 0, decoded.Recordings.Any(recording => recording.LateHeartRates.Count > 0));
    }

    [Theory]
    [MemberData(nameof(References))]
    public void ChannelsAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var decoded = FitDecoder.Decode(RealFiles.Bytes(name));
        Agree(expected, "hr", Over(decoded, Channel.HeartRate));
        Agree(expected, "power", Over(decoded, Channel.Power));
        Agree(expected, "speed", Over(decoded, Channel.Speed));
        Agree(expected, "cadence", Over(decoded, Channel.Cadence));
        if (expected.Number("distance_m") is { } metres)
            Assert.Equal(metres, Over(decoded, Channel.Distance).Max!.Value, 1.0);
    }

    [Theory]
    [MemberData(nameof(References))]
    public void SessionTotalsAgreeWithAnIndependentDecoder(string name)
    {
        var expected = RealFiles.Get(name);
        var decoded = FitDecoder.Decode(RealFiles.Bytes(name));
        Assert.Equal(expected.Number("session_elapsed_s")!.Value, decoded.Recordings.Sum(recording => recording.ElapsedSeconds ?? 0), 1.0);
        Assert.Equal(expected.Number("session_timer_s")!.Value, decoded.Recordings.Sum(recording => recording.TimerSeconds ?? 0), 1.0);
    }

    private static void Close(Instant? expected, Instant? actual)
    {
        Assert.Equal(expected is null, actual is null);
        Assert.True(expected is null || Math.Abs((expected - actual)!.Value.TotalSeconds) <= 1, $"{expected} and {actual}");
    }

    private static void Agree(RealFile expected, string channel, ChannelStatistics actual)
    {
        if (expected.Int(channel + "_n") == 0)
            return;

        Assert.Equal(expected.Int(channel + "_n"), actual.Count);
        Assert.Equal(expected.Number(channel + "_max")!.Value, actual.Max!.Value, 0.001);
        if (channel is "hr" or "power")
            Assert.Equal(expected.Number(channel + "_mean")!.Value, actual.Mean!.Value, 0.5);
    }

    private static ChannelStatistics Over(DecodedFile file, Channel channel)
    {
        var parts = file.Recordings.Select(recording => ChannelStatistics.Of(recording.Samples, channel)).ToList();
        var count = parts.Sum(part => part.Count);
        return count == 0 ? default : new(count, parts.Sum(part => part.Mean * part.Count) / count, parts.Max(part => part.Max));
    }
}
