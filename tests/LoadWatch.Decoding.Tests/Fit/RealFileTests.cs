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
        Assert.Equal(expected.Sports, decoded.Recordings.Select(recording => Plain(recording.Sport)).Distinct());
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

    [Theory]
    [InlineData("r004.fit", 0, "byte 768: cut short")]
    [InlineData("r005.fit", 1, "byte 771: 83 bytes behind the last whole part")]
    [InlineData("r012.fit", 0, "byte 253838: wrong checksum")]
    [InlineData("r013.fit", 0, "byte 769: wrong checksum")]
    [InlineData("r019.fit", 1, "byte 1540: wrong checksum")]
    [InlineData("r020.fit", 1, "byte 786: cut short")]
    [InlineData("r021.fit", 0, "byte 403454: wrong checksum")]
    [InlineData("r023.fit", 0, "byte 78233: cut short")]
    public void DamagedFilesKeepTheirWholePartsAndNameThePlace(string name, int recordings, string problem)
    {
        RealFiles.Get(name);
        var decoded = FitDecoder.Decode(RealFiles.Bytes(name));
        Assert.Equal(recordings, decoded.Recordings.Count);
        Assert.StartsWith(problem, Assert.Single(decoded.Problems).ToString(), StringComparison.Ordinal);
        Assert.Equal(FitCompleteness.Suspect, FitDecoder.CheckCompleteness(RealFiles.Bytes(name)));
    }

    [Theory]
    [InlineData("r037.fit")]
    [InlineData("r051.fit")]
    public void FilesThatCountUptimeHaveNoDates(string name)
    {
        RealFiles.Get(name);
        var recording = Assert.Single(FitDecoder.Decode(RealFiles.Bytes(name)).Recordings);
        Assert.Null(recording.Start);
        Assert.Null(recording.Samples.First);
        Assert.NotEqual(0, recording.Samples.Count);
    }

    private static string Plain(Sport sport) => sport.ToString().Replace("_", "", StringComparison.Ordinal);

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
