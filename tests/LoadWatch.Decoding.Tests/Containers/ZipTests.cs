using System.IO.Compression;
using System.Text;
using LoadWatch.Decoding.Containers;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Containers;

public class ZipTests
{
    private const int LocalHeaderAndName = 30 + 5;
    private static readonly byte[] Other = "time,heart_rate_bpm\n"u8.ToArray();
    private static readonly DecoderSet Decoders = new([]);

    /// <summary>Faults of the first of two members; the second stays readable.</summary>
    public static TheoryData<string, byte[], string> BadMembers()
    {
        var deflated = Packed.Zip(("a.csv", Packed.Ride), ("b.csv", Other));
        var stored = Packed.Zip(CompressionLevel.NoCompression, ("a.csv", Packed.Ride), ("b.csv", Other));
        var length = (uint)Packed.Ride.Length;
        return new()
        {
            { "flipped stored byte", Packed.Flipped(stored, LocalHeaderAndName + 100), "its CRC-32 does not fit" },
            { "flipped packed byte", Packed.Flipped(deflated, LocalHeaderAndName + 100), "" },
            { "wrong CRC", Packed.WithField(deflated, 16, 14, 12345, 4), "its CRC-32 does not fit" },
            { "declares less than it holds", Packed.WithField(deflated, 24, 22, 10, 4), "declares 10 bytes but holds more" },
            { "declares more than it holds", Packed.WithField(deflated, 24, 22, length + 1, 4), $"declares {length + 1} bytes but holds {length}" },
            { "encrypted", Packed.WithField(deflated, 8, 6, 1, 2), "is encrypted" },
            { "another method", Packed.WithField(deflated, 10, 8, 9, 2), "is packed by method 9, which is not read" },
            { "packed data beyond the end", Packed.WithField(Packed.WithField(deflated, 20, 18, (uint)deflated.Length - 30, 4), 24, 22, length, 4), "its local header" },
            { "local header elsewhere", Packed.WithField(deflated, 42, null, 7, 4), "its local header" },
            { "local header beyond the end", Packed.WithField(deflated, 42, null, 0x7FFFFFFF, 4), "its local header" },
            { "declared beyond the limit of a file", Packed.WithField(deflated, 24, 22, (32 << 20) + 1, 4), "unpacks to 33554433 bytes, at most 33554432 are read" },
            { "a link", Packed.WithField(Packed.WithField(deflated, 38, null, 0xA1FF0000, 4), 4, null, 0x0314, 2), "is a link, not a file" },
            { "a bomb", Packed.Zip(("a.csv", new byte[8 << 20]), ("b.csv", Other)), "unpacks to more than 200 times its size" },
        };
    }

    [Theory]
    [MemberData(nameof(BadMembers))]
    public void ABadMemberIsNamedAndTheOthersAreRead(string fault, byte[] zip, string expected)
    {
        var unpacked = Decoders.Unpack(zip, "all.zip");

        Assert.NotEmpty(fault);
        Assert.Empty(unpacked.Problems);
        Assert.Collection(
            unpacked.Members,
            bad =>
            {
                Assert.Equal("a.csv", bad.Name);
                Assert.Contains(expected, bad.Problem!.Reason);
                Assert.Equal(("a.csv", ProblemSeverity.Error), (bad.Problem.Field, bad.Problem.Severity));
                Assert.True(bad.Bytes.IsEmpty);
            },
            good => Assert.Equal(Other, good.Bytes.ToArray()));
    }

    [Fact]
    public void EveryFlippedBitOfThePackedDataIsSeen()
    {
        var zip = Packed.Zip(("a.csv", Other));
        var end = zip.AsSpan().IndexOf("PK\x1\x2"u8);
        for (var at = LocalHeaderAndName; at < end; at++)
        {
            for (var bit = 1; bit < 256; bit <<= 1)
            {
                var changed = (byte[])zip.Clone();
                changed[at] ^= (byte)bit;
                var member = Assert.Single(Decoders.Unpack(changed, "x").Members);
                // A bit behind the end of the packed data changes nothing.
                Assert.True(member.Problem is not null || member.Bytes.Span.SequenceEqual(Other));
            }
        }
    }

    public static TheoryData<string, byte[], string> BadContainers()
    {
        var whole = Packed.Zip(("a.csv", Packed.Ride));
        var end = whole.AsSpan().IndexOf("PK\x5\x6"u8);
        byte[] At(int offset, byte value) => [.. whole[..(end + offset)], value, .. whole[(end + offset + 1)..]];
        return new()
        {
            { "cut in the end record", whole[..^1], "no end record" },
            { "cut in the directory", whole[..(end - 5)], "no end record" },
            { "cut in the data", whole[..(whole.Length / 2)], "no end record" },
            { "only the first bytes", whole[..4], "no end record" },
            { "bytes behind it", [.. whole, 0], "no end record" },
            { "bytes before the directory", [.. whole[..end], 0, 0, .. whole[end..]], "the directory does not end" },
            { "more entries stated than there are", At(10, 2), "the directory does not hold the number of entries stated" },
            { "fewer entries stated than there are", At(10, 0), "the directory does not hold the number of entries stated" },
            { "damaged directory", Packed.Flipped(whole, whole.AsSpan().IndexOf("PK\x1\x2"u8)), "the directory is damaged" },
            { "several parts", At(4, 1), "several parts" },
            { "a name longer than the directory", Packed.WithField(whole, 28, null, 0xFFFF, 2), "the directory is damaged" },
        };
    }

    [Theory]
    [MemberData(nameof(BadContainers))]
    public void AZipFileThatIsNotWholeIsRefusedAndWaits(string fault, byte[] zip, string expected)
    {
        Assert.NotEmpty(fault);
        var unpacked = Decoders.Unpack(zip, "all.zip");

        Assert.Empty(unpacked.Members);
        var problem = Assert.Single(unpacked.Problems);
        Assert.Contains(expected, problem.Reason);
        Assert.InRange(problem.ByteOffset!.Value, 0, zip.Length);
        Assert.Equal(Completeness.NeedsSettling, Decoders.CheckCompleteness(zip));
    }

    [Fact]
    public void AWholeZipFileIsCompleteWithAndWithoutAComment()
    {
        var zip = Packed.Zip(("a.csv", Packed.Ride));
        byte[] commented = [.. zip[..^2], 3, 0, .. "PK\x5"u8];

        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(zip));
        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(commented));
        Assert.Equal(Completeness.Complete, Decoders.CheckCompleteness(Packed.Zip()));
        Assert.Empty(Decoders.Unpack(Packed.Zip(), "x").Members);
    }

    [Fact]
    public void NamesAreLabelsOnly()
    {
        string[] names = ["../../etc/x.csv", "/abs.csv", "a\\..\\b.csv", "C:\\x.csv", "twice.csv", "twice.csv", "new\nline.csv", "nul\0.csv", "sub/ö.csv"];

        var members = Decoders.Unpack(Packed.Zip([.. names.Select(name => (name, Other))]), "x").Members.ToList();

        Assert.Equal(
            names.Select(name => name.Replace('\n', '\uFFFD').Replace('\0', '\uFFFD').Replace('\\', '/')), members.Select(member => member.Name));
        Assert.All(members, member => Assert.Equal(Other, member.Bytes.ToArray()));
    }

    [Theory]
    [InlineData(437)]
    [InlineData(850)]
    [InlineData(65001)]
    public void NamesWithoutAStatedEncodingKeepTheirLetters(int codePage)
    {
        // Both old code pages write these letters alike.
        var written = CodePagesEncodingProvider.Instance.GetEncoding(codePage) ?? Encoding.UTF8;
        var zip = Packed.Zip(CompressionLevel.Optimal, written, ("Jörg Müller/Übung.csv", Other));
        var unstated = Packed.WithField(zip, 8, 6, 0, 2);

        Assert.Equal("Jörg Müller/Übung.csv", Assert.Single(Decoders.Unpack(unstated, "x").Members).Name);
    }

    [Theory]
    [InlineData(0, "Åsa Šimek/x.csv")]
    [InlineData(1, "?sa ?imek/x.csv")]
    public void ANameInUtf8BesideTheOldOneCountsWhereItIsStatedToBeOfTheSameEntry(uint wrongBy, string expected)
    {
        var old = "?sa ?imek/x.csv"u8.ToArray();
        var path = Encoding.UTF8.GetBytes("Åsa Šimek/x.csv");
        // The platform writes the CRC-32 of what it packs into the trailer. Another field before it, then: id, length, version 1, CRC-32 of the name as the directory has it, the name.
        byte[] extra =
        [
            0x55, 0x54, 1, 0, 0, 0x75, 0x70, (byte)(path.Length + 5), 0, 1, .. BitConverter.GetBytes(BitConverter.ToUInt32(Packed.Gzip(old).AsSpan()[^8..]) + wrongBy), .. path,
        ];

        var zip = Packed.WithExtra(Packed.Zip((Encoding.ASCII.GetString(old), Other)), extra);

        Assert.Equal(expected, Assert.Single(Decoders.Unpack(zip, "x").Members).Name);
    }

    [Fact]
    public void ACutExtraFieldLeavesTheNameAlone()
    {
        var zip = Packed.WithExtra(Packed.Zip(("a.csv", Other)), [0x75, 0x70, 200, 0, 1]);

        Assert.Equal("a.csv", Assert.Single(Decoders.Unpack(zip, "x").Members).Name);
    }

    [Fact]
    public void OldProgramsSeparateFoldersByBackslashes()
    {
        var zip = Packed.Zip(("anna\\", []), ("anna\\ride.csv", Other), ("anna\\.hidden\\ride.csv", Other));

        Assert.Equal("anna/ride.csv", Assert.Single(Decoders.Unpack(zip, "x").Members).Name);
    }

    [Fact]
    public void AMemberCanBeHadAlone()
    {
        var zip = Packed.Zip([.. Enumerable.Range(0, 40).Select(i => ($"{i}", new byte[1 << 20]))]);
        var members = Decoders.Unpack(zip, "x").Members;
        var before = GC.GetAllocatedBytesForCurrentThread();

        Assert.Equal("39", members[39].Name);

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 1 << 20, 3 << 20);
        Assert.Equal(40, members.Count);
    }

    [Fact]
    public void FoldersHiddenEntriesAndLeftoversArePassedOver()
    {
        var zip = Packed.Zip(
            ("folder/", []), ("__MACOSX/._a.fit", Other), ("folder/._a.fit", Other), (".DS_Store", Other), (".hidden/a.csv", Other), ("folder/a.csv", Other));

        Assert.Equal("folder/a.csv", Assert.Single(Decoders.Unpack(zip, "x").Members).Name);
    }

    [Fact]
    public void TooManyEntriesAreRefusedBeforeTheyAreListed()
    {
        var zip = Packed.Zip(CompressionLevel.NoCompression, [.. Enumerable.Range(0, 10_001).Select(i => ($"{i}", Array.Empty<byte>()))]);

        Assert.Equal("10001 entries, at most 10000 are read", Assert.Single(Decoders.Unpack(zip, "x").Problems).Reason);
    }

    [Fact]
    public void MoreThanTheTotalIsRefusedBeforeAnythingIsUnpacked()
    {
        var decoders = new DecoderSet([], new ContainerLimits { TotalBytes = (2L * Packed.Ride.Length) - 1 });

        var unpacked = decoders.Unpack(Packed.Zip(("a.csv", Packed.Ride), ("b.csv", Packed.Ride)), "x");

        Assert.Empty(unpacked.Members);
        Assert.StartsWith($"unpacks to {2 * Packed.Ride.Length} bytes", Assert.Single(unpacked.Problems).Reason);
    }

    [Fact]
    public void EntriesThatShareTheirDataAreRefused()
    {
        var zip = Packed.Zip(CompressionLevel.NoCompression, ("a.csv", Packed.Ride), ("b.csv", []));
        var second = zip.AsSpan().LastIndexOf("PK\x1\x2"u8);
        var first = zip.AsSpan().IndexOf("PK\x1\x2"u8);
        // The second entry gets the sizes, CRC and place of the first.
        zip.AsSpan(first + 10, 18).CopyTo(zip.AsSpan(second + 10));
        zip.AsSpan(first + 42, 4).CopyTo(zip.AsSpan(second + 42));

        Assert.StartsWith("entries overlap", Assert.Single(Decoders.Unpack(zip, "x").Problems).Reason);
    }

    [Fact]
    public void MembersAreUnpackedOneAtATime()
    {
        var zip = Packed.Zip([.. Enumerable.Range(0, 40).Select(i => ($"{i}", new byte[1 << 20]))]);
        var before = GC.GetAllocatedBytesForCurrentThread();

        using var members = Decoders.Unpack(zip, "x").Members.GetEnumerator();
        Assert.True(members.MoveNext());

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 1 << 20, 3 << 20);
        Assert.Equal(1 << 20, members.Current.Bytes.Length);
    }
}
