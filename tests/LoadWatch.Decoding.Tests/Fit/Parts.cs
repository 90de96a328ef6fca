using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Parts of FIT files for tests. Field numbers are those of the public profile.</summary>
internal static class Parts
{
    /// <summary>2021-09-08T01:46:40Z in seconds of the FIT epoch.</summary>
    public const int Base = 1_000_000_000;

    public const long BaseUnixMilliseconds = (Base + 631_065_600L) * 1000;

    /// <summary>A part that begins with file_id; local type 15 stays taken by it.</summary>
    public static FitPartWriter Begin(int fileType = 4, FitHeaderStyle style = FitHeaderStyle.Full) =>
        new FitPartWriter(style)
            .Define(15, new(0, new(0, Enumeration), new(1, Unsigned16), new(2, Unsigned16), new(3, Unsigned32Z)))
            .Message(15, fileType, 255, 7, 42);

    /// <summary>Local type 0: record with time and heart rate.</summary>
    public static FitPartWriter DefineRecord(this FitPartWriter part) =>
        part.Define(0, new(20, new(253, Unsigned32), new(3, Unsigned8)));

    /// <summary>Local type 1: session with start, sport, sub-sport, elapsed and timer milliseconds.</summary>
    public static FitPartWriter DefineSession(this FitPartWriter part) =>
        part.Define(1, new(18, new(2, Unsigned32), new(5, Enumeration), new(6, Enumeration), new(7, Unsigned32), new(8, Unsigned32)));

    /// <summary>Two records and a session.</summary>
    public static byte[] Activity(FitHeaderStyle style = FitHeaderStyle.Full, int heartRate = 120) =>
        Begin(style: style)
            .DefineRecord().Message(0, Base, heartRate).Message(0, Base + 1, heartRate + 1)
            .DefineSession().Message(1, Base, 1, 0, 1000, 1000)
            .ToBytes();

    public static DecodedFile Decode(this FitPartWriter part) => FitDecoder.Decode(part.ToBytes());

    public static DecodedFile Decode(params byte[][] parts) => FitDecoder.Decode((byte[])[.. parts.SelectMany(part => part)]);

    public static SampleSeries Samples(this FitPartWriter part)
    {
        var decoded = part.Decode();
        Assert.Empty(decoded.Problems);
        return Assert.Single(decoded.Recordings).Samples;
    }

    public static int[] SecondsFromBase(this SampleSeries samples) =>
        [.. samples.UnixMilliseconds.ToArray().Select(time => (int)((time - BaseUnixMilliseconds) / 1000))];
}
