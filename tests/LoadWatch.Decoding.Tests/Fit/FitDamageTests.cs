using CsCheck;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.Fit;

/// <summary>Cut, changed and invented bytes: a clear reason with its place, never a recording from a damaged part (I-3, I-10, I-11).</summary>
public class FitDamageTests
{
    private static readonly int Half = Parts.Activity().Length;

    /// <summary>Three small files by their parts: two activities; everything that an activity may hold; an activity with beats in parts of their own.</summary>
    private static readonly byte[][][] Files =
    [
        [Parts.Activity(), Parts.Activity(FitHeaderStyle.WithoutChecksum)],
        [Rich()],
        [Parts.Activity(FitHeaderStyle.TwelveBytes), Beats(1), Beats(2)],
    ];

    [Theory]
    [InlineData(0, 2)]
    [InlineData(1, 1)]
    [InlineData(2, 1)]
    public void AFileCutAnywhereKeepsItsWholePartsOnly(int number, int recordings)
    {
        var parts = Files[number];
        byte[] file = [.. parts.SelectMany(part => part)];
        int[] ends = [.. parts.Select((_, i) => parts.Take(i + 1).Sum(part => part.Length))];
        for (var length = 0; length <= file.Length; length++)
        {
            var decoded = FitDecoder.Decode(file.AsMemory(0, length));
            var whole = ends.Count(end => end <= length);
            Assert.Equal(Math.Min(whole, recordings), decoded.Recordings.Count);
            Assert.Equal(ends.Contains(length), decoded.Problems.Count == 0);
            Assert.All(decoded.Problems, problem => Assert.InRange(problem.ByteOffset!.Value, 0, length));
            Assert.Equal(decoded.Problems.Count == 0, FitDecoder.CheckCompleteness(file.AsSpan(0, length)) == FitCompleteness.Complete);
        }
    }

    /// <summary>The parts before the one with the changed bit stand, and it gives nothing; those behind it stand where its size shows where they begin.</summary>
    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(2)]
    public void NoChangedBitGoesUnnoticed(int number)
    {
        var parts = Files[number];
        byte[] file = [.. parts.SelectMany(part => part)];
        Assert.Empty(FitDecoder.Decode(file).Problems);
        for (var bit = 0; bit < file.Length * 8; bit++)
        {
            var bytes = file.ToArray();
            bytes[bit / 8] ^= (byte)(1 << (bit % 8));
            var (damaged, within) = PlaceOf(parts, bit / 8);
            var decoded = FitDecoder.Decode(bytes);
            Assert.NotEmpty(decoded.Problems);
            Assert.Equal(FitCompleteness.Suspect, FitDecoder.CheckCompleteness(bytes));
            var before = Said(FitDecoder.Decode((byte[])[.. parts[..damaged].SelectMany(part => part)]).Recordings);
            var around = Said([.. FitDecoder.Decode((byte[])[.. parts[..damaged].SelectMany(part => part)]).Recordings, .. FitDecoder.Decode((byte[])[.. parts[(damaged + 1)..].SelectMany(part => part)]).Recordings]);
            Assert.True(HoldsPlace(within) ? Said(decoded.Recordings) == before || Said(decoded.Recordings) == around : Said(decoded.Recordings) == around, $"bit {bit}: {Said(decoded.Recordings)}");
        }
    }

    /// <summary>Bytes of a header by which parts are found: its size, that of the data, the mark.</summary>
    private static bool HoldsPlace(int within) => within is 0 or (>= 4 and < 12);

    private static (int Part, int Within) PlaceOf(byte[][] parts, int at)
    {
        var part = 0;
        for (; at >= parts[part].Length; part++)
            at -= parts[part].Length;

        return (part, at);
    }

    /// <summary>All readings and beats of recordings as text, to be compared.</summary>
    private static string Said(IReadOnlyList<Recording> recordings) => string.Join('|', recordings.Select(recording => string.Join(
        ' ',
        [
            recording.Start,
            .. recording.Samples.UnixMilliseconds.ToArray(),
            .. recording.Samples.Channels.SelectMany(channel => recording.Samples[channel].ToArray().Select(value => $"{channel}{value}")),
            .. recording.LateHeartRates.Select(beat => $"beat{beat.UnixMilliseconds}:{beat.BeatsPerMinute}"),
            .. recording.BeatIntervals.Select(interval => $"interval{interval}"),
            .. recording.Sets,
        ])));

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
    public void BytesBehindTheLastPartAreNamedBesidesAnotherWarning()
    {
        var decoded = Parts.Decode(Beats(1), [1, 2, 3]);
        Assert.Equal(["heart beats", "3 bytes beh"], decoded.Problems.Select(problem => problem.Reason[..11]));
    }

    [Fact]
    public void BeatsBehindADamagedPartAreNamedForWhatTheyAre()
    {
        var damaged = Beats(1);
        damaged[^1] ^= 1;
        var decoded = Parts.Decode(Parts.Activity(), damaged, Beats(2));
        Assert.Empty(Assert.Single(decoded.Recordings).LateHeartRates);
        Assert.Equal(
            ["wrong checksum: this part is damaged or was never finished", "heart beats behind a damaged part are not used: whether they belong to it cannot be told"],
            decoded.Problems.Select(problem => problem.Reason));
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
        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, (64 << 20) + (4L * data.Length));
        Assert.Empty(decoded.Recordings);
        Assert.Contains("more messages", Assert.Single(decoded.Problems).Reason, StringComparison.Ordinal);
    }

    private static byte[] Rich() => Parts.Begin()
        .Define(2, new(206, new(0, Unsigned8), new(1, Unsigned8), new(2, Unsigned8), new(6, Unsigned8), new(14, Unsigned16), new(15, Unsigned8)))
        .Message(2, 0, 5, 0x84, 10, 20, 7)
        .Define(0, new(20, new(253, Unsigned32), new(3, Unsigned8)) { BigEndian = true, Developer = [new(5, Unsigned16, 0)] })
        .Message(0, Parts.Base, 90, 2500).Message(0, Parts.Base + 1, 91, 2600)
        .Define(1, new(20, new(8, Bytes, 3), new(3, Unsigned8))).Compressed(1, (Parts.Base + 5) & 31, FitValue.None, 92)
        .Define(3, new(78, new FitFieldLayout(0, Unsigned16, 3))).Message(3, FitValue.Many(700, 710, null))
        .Define(4, new(225, new(254, Unsigned32), new(0, Unsigned32), new(7, Unsigned16, 2))).Message(4, Parts.Base, 30_000, FitValue.Many(28, null))
        .DefineSession().Message(1, Parts.Base, 1, 0, 1000, 1000)
        .ToBytes();

    private static byte[] Beats(int second) => new FitPartWriter()
        .Define(0, new(132, new(253, Unsigned32), new(9, Unsigned32), new(6, Unsigned8))).Message(0, Parts.Base + second, 1024 * second, 70)
        .ToBytes();

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
