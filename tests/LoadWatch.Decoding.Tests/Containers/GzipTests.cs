using System.Buffers.Binary;
using System.IO.Compression;
using System.Text;
using LoadWatch.Decoding.Containers;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Containers;

public class GzipTests
{
    private static readonly DecoderSet Decoders = new([]);

    public static TheoryData<string, byte[]> Broken()
    {
        var whole = Packed.Gzip(Packed.Ride);
        return new()
        {
            { "cut in the middle", whole[..(whole.Length / 2)] },
            { "cut in the trailer", whole[..^3] },
            { "without a trailer", whole[..^8] },
            { "cut in the header", whole[..7] },
            { "trailing zeros", [.. whole, .. new byte[512]] },
            { "one trailing zero", [.. whole, 0] },
            { "trailing text", [.. whole, .. "more"u8] },
            { "wrong CRC", Packed.Flipped(whole, whole.Length - 7) },
            { "wrong size", Packed.Flipped(whole, whole.Length - 2) },
            { "flipped packed byte", Packed.Flipped(whole, whole.Length / 2) },
            { "reserved flags", [.. whole[..3], 0x80, .. whole[4..]] },
            { "a second member that is cut", [.. whole, .. whole[..^1]] },
            { "a second member that is damaged", [.. whole, .. Packed.Flipped(whole, whole.Length / 2)] },
            { "a wrong header CRC", [.. whole[..3], 0x02, .. whole[4..10], 0, 0, .. whole[10..]] },
            { "a name that never ends", [0x1F, 0x8B, 8, 8, 0, 0, 0, 0, 0, 3, .. "abc"u8] },
            { "an extra field beyond the end", [0x1F, 0x8B, 8, 4, 0, 0, 0, 0, 0, 3, 0xFF, 0xFF] },
        };
    }

    [Theory]
    [MemberData(nameof(Broken))]
    public void AGzipFileThatIsNotWholeIsRefusedAndWaits(string fault, byte[] bytes)
    {
        var unpacked = Decoders.Unpack(bytes, "ride.csv.gz");

        Assert.NotEmpty(fault);
        Assert.Empty(unpacked.Members);
        var problem = Assert.Single(unpacked.Problems);
        Assert.Equal(ProblemSeverity.Error, problem.Severity);
        Assert.InRange(problem.ByteOffset!.Value, 0, bytes.Length);
        Assert.Equal(Completeness.NeedsSettling, Decoders.CheckCompleteness(bytes));
    }

    [Fact]
    public void EveryCutOfASmallGzipFileIsSeen()
    {
        var whole = Packed.Gzip(Encoding.ASCII.GetBytes("time,power_w"));

        for (var length = 3; length < whole.Length; length++)
        {
            Assert.Equal(Completeness.NeedsSettling, Decoders.CheckCompleteness(whole.AsMemory(0, length)));
        }

        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(whole));
    }

    [Theory]
    [InlineData(CompressionLevel.Optimal)]
    [InlineData(CompressionLevel.NoCompression)]
    public void AWholeGzipFileGivesItsContent(CompressionLevel level)
    {
        var bytes = Packed.Gzip(Packed.Ride, level);

        Assert.Equal(Packed.Ride, Only(bytes, "ride.csv.gz").Bytes.ToArray());
        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(bytes));
    }

    [Fact]
    public void AnyLengthOfContentIsReadToItsEnd()
    {
        // Random bytes do not shrink, so the end of the packed data falls on every place of the inflater's reads.
        var content = new byte[20_000];
        new Random(7).NextBytes(content);
        for (var length = 0; length < content.Length; length += 61)
        {
            Assert.Equal(content[..length], Only(Packed.Gzip(content[..length]), "x").Bytes.ToArray());
        }
    }

    [Fact]
    public void MembersAreJoined()
    {
        byte[] bytes = [.. Packed.Gzip("time,"u8.ToArray()), .. Packed.Gzip([]), .. Packed.Gzip(Packed.Ride), .. Packed.Gzip("end"u8.ToArray())];

        Assert.Equal([.. "time,"u8, .. Packed.Ride, .. "end"u8], Only(bytes, "x").Bytes.ToArray());
    }

    [Fact]
    public void OptionalHeaderFieldsArePassedOver()
    {
        var plain = Packed.Gzip(Packed.Ride);
        byte[] header = [0x1F, 0x8B, 8, 0x1E, 0, 0, 0, 0, 0, 3, 3, 0, 1, 2, 3, .. "../../name\0"u8, .. "a comment\0"u8];
        // The platform writes the CRC-32 of what it packs into the trailer.
        var crc = BinaryPrimitives.ReadUInt32LittleEndian(Packed.Gzip(header).AsSpan()[^8..]);

        var member = Only([.. header, (byte)(crc & 0xFF), (byte)((crc >> 8) & 0xFF), .. plain[10..]], "ride.csv.gz");

        Assert.Equal("ride.csv", member.Name);
        Assert.Equal(Packed.Ride, member.Bytes.ToArray());
    }

    [Theory]
    [InlineData("ride.fit.gz", "ride.fit")]
    [InlineData("RIDE.FIT.GZ", "RIDE.FIT")]
    [InlineData("ride", "ride")]
    [InlineData(".gz", ".gz")]
    public void TheMemberIsCalledAsTheFileWithoutItsEnding(string name, string expected) =>
        Assert.Equal(expected, Only(Packed.Gzip(Packed.Ride), name).Name);

    [Fact]
    public void AContentThatUnpacksFarBeyondItsSizeIsRefused()
    {
        var bomb = Packed.Gzip(new byte[8 << 20]);

        Assert.Equal("unpacks to more than 200 times its size", Assert.Single(Decoders.Unpack(bomb, "x").Problems).Reason);
    }

    [Fact]
    public void UpToAMegabyteMayShrinkAnyFar() => Assert.Equal(1 << 20, Only(Packed.Gzip(new byte[1 << 20]), "x").Bytes.Length);

    [Fact]
    public void TheRatioIsThatOfTheWholeFile()
    {
        // Each member alone is small enough to shrink any far.
        var member = Packed.Gzip(new byte[1 << 20]);
        byte[] bomb = [.. Enumerable.Repeat(member, 16).SelectMany(bytes => bytes)];

        Assert.Equal("unpacks to more than 200 times its size", Assert.Single(Decoders.Unpack(bomb, "x").Problems).Reason);
        Assert.Equal(Completeness.NeedsSettling, Decoders.CheckCompleteness(bomb));
    }

    [Fact]
    public void SeveralMembersTakeNoMoreMemoryThanTheyHold()
    {
        // The last trailer tells only of the last member.
        var large = new byte[3_000_000];
        new Random(7).NextBytes(large);
        byte[] bytes = [.. Packed.Gzip(large), .. Packed.Gzip(large), .. Packed.Gzip("end"u8.ToArray())];
        var before = GC.GetAllocatedBytesForCurrentThread();

        var content = Only(bytes, "x").Bytes;

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 6_000_000, 6_300_000);
        Assert.Equal([.. large, .. large, .. "end"u8], content.ToArray());
    }

    [Fact]
    public void WhetherItIsWholeIsToldWithoutKeepingTheContent()
    {
        var bytes = Packed.Gzip(new byte[1 << 20]);
        var before = GC.GetAllocatedBytesForCurrentThread();

        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(bytes));

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 0, 200_000);
    }

    [Theory]
    [InlineData(1, false)]
    [InlineData(3, true)]
    public void AContentMayBeAsLargeAsAFile(int largestMegabytes, bool isRead)
    {
        var content = new byte[2 << 20];
        new Random(7).NextBytes(content);
        var decoders = new DecoderSet([], ContainerLimits.For((long)largestMegabytes << 20));

        Assert.Equal(isRead, decoders.Unpack(Packed.Gzip(content), "x").Problems.Count == 0);
        Assert.Equal(isRead, Assert.Single(decoders.Unpack(Packed.Zip(("x", content)), "x").Members).Problem is null);
    }

    [Fact]
    public void AContentBeyondTheLimitOfAFileIsRefused()
    {
        var decoders = new DecoderSet([], new ContainerLimits { MemberBytes = 1000 });

        Assert.Equal("unpacks to more than 1000 bytes", Assert.Single(decoders.Unpack(Packed.Gzip(Packed.Ride), "x").Problems).Reason);
    }

    private static ContainerMember Only(byte[] bytes, string name)
    {
        var unpacked = Decoders.Unpack(bytes, name);
        Assert.Empty(unpacked.Problems);
        return Assert.Single(unpacked.Members);
    }
}
