using System.Globalization;
using System.IO.Compression;
using System.Text;
using CsCheck;
using LoadWatch.Decoding.Containers;

namespace LoadWatch.Decoding.Tests.Containers;

/// <summary>Whatever a container holds, each member is whole or has a problem. LOADWATCH_FUZZ sets how many files of each kind are tried.</summary>
public class ContainerFuzzTests
{
    private static readonly int Tries = int.Parse(Environment.GetEnvironmentVariable("LOADWATCH_FUZZ") ?? "10000", CultureInfo.InvariantCulture);
    private static readonly ContainerLimits Limits = new() { MemberBytes = 2000, TotalBytes = 6000, Entries = 5, RatioFreeBytes = 500, Ratio = 20 };
    private static readonly DecoderSet Decoders = new([], Limits);
    private static readonly string[] Names = ["a.csv", "b/", "b/ä.fit", "..\\x", ".hidden", "c\0d", new('n', 300)];
    private static readonly byte[][] Contents = [[], "time,power_w\n"u8.ToArray(), new byte[600], Packed.Ride[..1500], Packed.Ride[..2500], Packed.Gzip(Packed.Ride[..900])];

    /// <summary>The fields of an entry of the directory and of the end record, by place and width.</summary>
    private static readonly (string Mark, int At, int Width)[] Fields =
    [
        ("PK\x1\x2", 4, 2), ("PK\x1\x2", 8, 2), ("PK\x1\x2", 10, 2), ("PK\x1\x2", 16, 4), ("PK\x1\x2", 20, 4), ("PK\x1\x2", 24, 4), ("PK\x1\x2", 28, 2), ("PK\x1\x2", 30, 2), ("PK\x1\x2", 32, 2),
        ("PK\x1\x2", 38, 4), ("PK\x1\x2", 42, 4), ("PK\x3\x4", 26, 2), ("PK\x3\x4", 28, 2), ("PK\x5\x6", 4, 2), ("PK\x5\x6", 8, 2), ("PK\x5\x6", 10, 2), ("PK\x5\x6", 12, 4), ("PK\x5\x6", 16, 4), ("PK\x5\x6", 20, 2),
    ];

    private static readonly uint[] Values = [0, 1, 5, 8, 0x0800, 0x7FFF, 0xFFFF, 0x10000, 0x7FFFFFFF, 0x80000000, 0xFFFFFFFF];

    private static readonly Gen<byte[]> Zips = Gen.Select(Gen.Select(Gen.Int[0, Names.Length - 1], Gen.Int[0, Contents.Length - 1]).Array[0, 6], Gen.Bool)
        .Select((members, packed) => Packed.Zip(packed ? CompressionLevel.Fastest : CompressionLevel.NoCompression, [.. members.Select(member => (Names[member.Item1], Contents[member.Item2]))]));

    private static readonly Gen<byte[]> Gzips = Gen.Int[0, Contents.Length - 1].Array[1, 5].Select(members => members.SelectMany(member => Packed.Gzip(Contents[member])).ToArray());

    [Fact]
    public void ZipFilesWithAnyFieldChangedAreSurvived() => Gen.Select(Zips, Gen.Select(Gen.Int[0, Fields.Length - 1], Gen.Int[0, Values.Length - 1]).Array[0, 3]).Sample(
        (zip, changes) => Survives(WithFields(zip, changes)), iter: Tries);

    [Fact]
    public void ChangedContainersAreSurvived() => Gen.Select(Gen.OneOf(Zips, Gzips), Gen.Select(Gen.Int[0, 8000], Gen.Byte).Array[0, 4], Gen.Int[0, 30]).Sample(
        (bytes, changes, cut) =>
        {
            var changed = bytes[..Math.Max(1, bytes.Length - Math.Max(0, cut - 15))];
            foreach (var (at, value) in changes)
            {
                changed[at % changed.Length] = value;
            }

            Survives(changed);
        },
        iter: Tries);

    private static void Survives(byte[] bytes)
    {
        var completeness = Decoders.CheckCompleteness(bytes);
        var unpacked = Decoders.Unpack(bytes, "x");

        Assert.True(unpacked.Problems.Count == 0 || unpacked.Members.Count == 0);
        Assert.True(completeness == Completeness.NeedsSettling || unpacked.Problems.Count == 0 || DecoderSet.Recognise(bytes) == ContentKind.Zip);
        Assert.All(unpacked.Problems, problem => Assert.InRange(problem.ByteOffset!.Value, 0, bytes.Length));
        var whole = unpacked.Members.Where(member => member.Problem is null).ToList();
        Assert.True(whole.Sum(member => (long)member.Bytes.Length) <= Limits.TotalBytes);
        Assert.All(whole, member => Assert.InRange(member.Bytes.Length, 0, Limits.MemberBytes));
        Assert.All(unpacked.Members, member => Assert.True(member.Problem is null || member.Bytes.IsEmpty));
        Assert.All(unpacked.Members, member => Assert.DoesNotContain(member.Name, c => char.IsControl(c) || c == '\\'));
        if (DecoderSet.Recognise(bytes) == ContentKind.Zip)
        {
            // The CRC is not checked against itself: what comes out is what went in, unless the directory was changed too.
            Assert.All(whole, member => Assert.True(member.Bytes.Length <= bytes.Length || member.Bytes.Length <= Limits.RatioFreeBytes || member.Bytes.Length <= (long)bytes.Length * Limits.Ratio));
        }
    }

    private static byte[] WithFields(byte[] zip, (int Field, int Value)[] changes)
    {
        var changed = (byte[])zip.Clone();
        foreach (var (field, value) in changes)
        {
            var (mark, at, width) = Fields[field];
            var start = changed.AsSpan().IndexOf(Encoding.Latin1.GetBytes(mark));
            if (start >= 0 && start + at + width <= changed.Length)
            {
                BitConverter.GetBytes(Values[value]).AsSpan(0, width).CopyTo(changed.AsSpan(start + at));
            }
        }

        return changed;
    }
}
