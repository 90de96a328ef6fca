using CsCheck;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Cut, changed and invented bytes: a clear reason with its place, never a recording from a damaged part (I-3, I-10, I-11).</summary>
public class FitDamageTests
{
    private static readonly byte[] TwoParts = [.. Parts.Activity(), .. Parts.Activity(FitHeaderStyle.WithoutChecksum)];
    private static readonly int Half = Parts.Activity().Length;

    [Fact]
    public void AFileCutAnywhereKeepsItsWholePartsOnly()
    {
        for (var length = 0; length <= TwoParts.Length; length++)
        {
            var decoded = FitDecoder.Decode(TwoParts.AsMemory(0, length));
            Assert.Equal(length / Half, decoded.Recordings.Count);
            Assert.Equal(length % Half == 0 && length > 0, decoded.Problems.Count == 0);
            Assert.All(decoded.Problems, problem => Assert.InRange(problem.ByteOffset!.Value, 0, length));
            Assert.Equal(decoded.Problems.Count == 0, FitDecoder.CheckCompleteness(TwoParts.AsSpan(0, length)) == FitCompleteness.Complete);
        }
    }

    [Fact]
    public void NoChangedBitGoesUnnoticed()
    {
        var whole = FitDecoder.Decode(TwoParts);
        Assert.Empty(whole.Problems);
        Assert.Equal(2, whole.Recordings.Count);
        for (var bit = 0; bit < TwoParts.Length * 8; bit++)
        {
            var bytes = TwoParts.ToArray();
            bytes[bit / 8] ^= (byte)(1 << (bit % 8));
            var decoded = FitDecoder.Decode(bytes);
            Assert.NotEmpty(decoded.Problems);
            Assert.True(decoded.Recordings.Count < 2, $"bit {bit}");
            Assert.Equal(FitCompleteness.Suspect, FitDecoder.CheckCompleteness(bytes));
        }
    }

    [Fact]
    public void AnyBytesAreSurvived()
    {
        Gen.Byte.Array[0, 300].Sample(bytes => FitDecoder.Decode(bytes).Recordings.Count == 0);
        Gen.Byte.Array[0, 300].Sample(bytes => FitDecoder.Decode(Wrapped(bytes)).Problems.Count <= 1);
    }

    [Fact]
    public void AnyMessagesAreSurvived() =>
        Gen.Select(Gen.OneOf<byte>(0, 12, 18, 19, 20, 21, 23, 34, 101, 132, 162, 206, 225), Gen.Byte, Gen.Byte.Array[3, 60], Gen.Byte.Array[0, 400])
            .Sample((message, endian, fields, data) => FitDecoder.Decode(Wrapped(Defined(message, endian, fields, data))).Problems.Count <= 1);

    [Fact]
    public void ChangedFilesWithARightChecksumAreSurvived() =>
        Gen.Select(Gen.Int[0, 14], Gen.Select(Gen.Int[0, 200], Gen.Byte).Array[1, 6]).Sample((vector, changes) =>
        {
            var file = FitVectors.All.ElementAt(vector);
            var data = file[file[0]..^2];
            foreach (var (at, value) in changes)
                data[at % data.Length] = value;

            var decoded = FitDecoder.Decode(Wrapped(data));
            Assert.InRange(decoded.Problems.Count, 0, 1);
            Assert.True(decoded.Problems.Count == 0 || decoded.Recordings.Count == 0);
        });

    [Fact]
    public void AnUndefinedLocalTypeIsRefusedAtItsByte()
    {
        var bytes = Wrapped([0x0B, 0, 0]);
        var problem = Assert.Single(FitDecoder.Decode(bytes).Problems);
        Assert.Equal("byte 14: local message type 11 is not defined", problem.ToString());
    }

    [Theory]
    [InlineData(new byte[] { 0x40, 0, 0, 20, 0, 1, 253, 4, 0x86, 0x00, 1, 2, 3 }, "byte 23: a message runs past the end of the data")]
    [InlineData(new byte[] { 0x40, 0, 0, 20, 0, 2, 253, 4, 0x86 }, "byte 14: a definition runs past the end of the data")]
    [InlineData(new byte[] { 0x40, 0, 0 }, "byte 14: a definition runs past the end of the data")]
    [InlineData(new byte[] { 0x60, 0, 0, 20, 0, 0 }, "byte 14: a definition runs past the end of the data")]
    [InlineData(new byte[] { 0x60, 0, 0, 20, 0, 0, 1, 1, 1 }, "byte 14: a definition runs past the end of the data")]
    public void WhatRunsPastTheDataIsRefusedAtItsByte(byte[] data, string expected)
    {
        var decoded = FitDecoder.Decode(Wrapped(data));
        Assert.Empty(decoded.Recordings);
        Assert.Equal(expected, Assert.Single(decoded.Problems).ToString());
    }

    [Fact]
    public void AnEmptyPartIsWholeAndHoldsNothing()
    {
        var empty = Convert.FromHexString("0E10D907000000002E46495491330000");
        var decoded = FitDecoder.Decode(empty);
        Assert.Empty(decoded.Problems);
        Assert.Empty(decoded.Recordings);
        Assert.Equal(FitCompleteness.Complete, FitDecoder.CheckCompleteness(empty));
        Assert.Single(Parts.Decode(empty, Parts.Activity()).Recordings);
    }

    [Fact]
    public void BytesBehindTheLastPartAreAWarning()
    {
        var decoded = Parts.Decode(Parts.Activity(), [1, 2, 3]);
        Assert.Single(decoded.Recordings);
        Assert.Equal(ProblemSeverity.Warning, Assert.Single(decoded.Problems).Severity);
        Assert.Equal(FitCompleteness.Suspect, FitDecoder.CheckCompleteness([.. Parts.Activity(), 1, 2, 3]));
    }

    [Fact]
    public void AWholePartBehindADamagedOneStands()
    {
        var damaged = Parts.Activity();
        damaged[40] ^= 1;
        var decoded = Parts.Decode(damaged, Parts.Activity(heartRate: 150));
        Assert.Equal([150, 151], Assert.Single(decoded.Recordings).Samples[Channel.HeartRate]);
        Assert.Equal(Half - 2, Assert.Single(decoded.Problems).ByteOffset);
    }

    [Theory]
    [InlineData(20)]
    [InlineData(18)]
    [InlineData(225)]
    [InlineData(19)]
    public void MessagesOfOneByteCannotFillTheMemory(byte message)
    {
        var data = new byte[16_000_000];
        byte[] definition = [0x40, 0, 0, message, 0, 0];
        definition.CopyTo(data, 0);
        var before = GC.GetAllocatedBytesForCurrentThread();
        var decoded = FitDecoder.Decode(Wrapped(data));
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, (64 << 20) + (6L * data.Length));
        Assert.Empty(decoded.Recordings);
        Assert.Contains("more messages", Assert.Single(decoded.Problems).Reason, StringComparison.Ordinal);
    }

    private static byte[] Defined(byte message, byte endian, byte[] fields, byte[] data) =>
        [0x40, 0, (byte)(endian & 1), .. (endian & 1) != 0 ? new byte[] { 0, message } : [message, 0],
            (byte)(fields.Length / 3), .. fields[..(fields.Length / 3 * 3)], .. data.Select(value => (byte)(value % 8 == 0 ? 0 : value))];

    /// <summary>The bytes as the data of a part with right size and checksum.</summary>
    private static byte[] Wrapped(byte[] data)
    {
        byte[] part = [14, 0x20, 0, 0, .. BitConverter.GetBytes(data.Length), .. ".FIT"u8, 0, 0, .. data];
        return [.. part, .. BitConverter.GetBytes(FitCrc.Of(part))];
    }
}
