using System.Text;
using CsCheck;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Tests.Containers;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests;

public class DecoderSetTests
{
    private const string Csv = "time,power_w\n2026-10-05T06:00:00Z,200\n2026-10-05T06:00:01Z,210\n";
    private static readonly DecoderSet Decoders = new([BuiltInLayouts.Samples]);

    public static TheoryData<string, byte[], ContentKind> Contents() => new()
    {
        { "zip.fit", Packed.Zip(("a", Packed.Ride)), ContentKind.Zip },
        { "empty.zip", Packed.Zip(), ContentKind.Zip },
        { "gzip.csv", Packed.Gzip(Packed.Ride), ContentKind.Gzip },
        { "fit.csv", [14, 0x20, 0, 0, 0, 0, 0, 0, .. ".FIT"u8, 0, 0, 0, 0], ContentKind.Fit },
        { "csv.zip", Encoding.UTF8.GetBytes(Csv), ContentKind.Text },
        { "marked.gz", [0xEF, 0xBB, 0xBF, .. "time"u8], ContentKind.Text },
        { "utf16le.fit", [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(Csv)], ContentKind.Text },
        { "utf16be.fit", [0xFE, 0xFF, .. Encoding.BigEndianUnicode.GetBytes(Csv)], ContentKind.Text },
        { "unmarked-utf16.csv", Encoding.Unicode.GetBytes(Csv), ContentKind.Unknown },
        { "program.csv", [0x4D, 0x5A, 0x90, 0, 3, 0, 0, 0], ContentKind.Unknown },
        { "nul-far-behind.csv", [.. Encoding.UTF8.GetBytes(new string('x', 4096)), 0], ContentKind.Text },
        { "nul.csv", [.. Encoding.UTF8.GetBytes(new string('x', 4095)), 0], ContentKind.Unknown },
        { "empty.csv", [], ContentKind.Unknown },
        { "one.csv", [0x1F], ContentKind.Text },
    };

    [Theory]
    [MemberData(nameof(Contents))]
    public void ContentIsRecognisedByItsBytesWhateverItsName(string name, byte[] bytes, ContentKind expected)
    {
        Assert.NotEmpty(name);
        Assert.Equal(expected, DecoderSet.Recognise(bytes));
    }

    [Theory]
    [InlineData(Csv)]
    [InlineData("")]
    [InlineData("\0\0\0")]
    public void WhatCannotTellItsEndNeedsSettling(string text) =>
        Assert.Equal(Completeness.NeedsSettling, Decoders.CheckCompleteness(Encoding.UTF8.GetBytes(text)));

    [Fact]
    public void ACsvIsDecodedByTheLayoutsGiven()
    {
        var file = Decoders.Decode(Encoding.UTF8.GetBytes(Csv));

        Assert.Equal(("csv", "samples"), (file.Kind, file.SourceName));
        Assert.Equal([200, 210], Assert.Single(file.Recordings).Samples[Channel.Power].ToArray());
    }

    [Fact]
    public void OtherContentIsRefusedWithTheReason()
    {
        Assert.Equal("byte 0: not a FIT, CSV, gzip or zip file", Reason([0, 1, 2]));
        Assert.Equal("byte 0: the file is empty", Reason([]));
        Assert.Equal("byte 0: a gzip file is unpacked first", Reason(Packed.Gzip(Packed.Ride)));
        Assert.Equal("byte 0: a zip file is unpacked first", Reason(Packed.Zip()));
        Assert.Equal("byte 0: not a gzip or zip file", Assert.Single(Decoders.Unpack(Packed.Ride, "x").Problems).ToString());
    }

    [Fact]
    public void AGzipInAZipIsReadToItsRecording()
    {
        var zip = Packed.Zip(("rides/monday.csv.gz", Packed.Gzip(Encoding.UTF8.GetBytes(Csv))));

        var outer = Assert.Single(Decoders.Unpack(zip, "week.zip").Members);
        Assert.Null(DecoderSet.CheckNesting(DecoderSet.Recognise(outer.Bytes.Span), depth: 1));
        var inner = Assert.Single(Decoders.Unpack(outer.Bytes, outer.Name).Members);

        Assert.Equal("rides/monday.csv", inner.Name);
        Assert.Single(Decoders.Decode(inner.Bytes).Recordings);
    }

    [Theory]
    [InlineData(ContentKind.Zip, 0, true)]
    [InlineData(ContentKind.Gzip, 0, true)]
    [InlineData(ContentKind.Gzip, 1, true)]
    [InlineData(ContentKind.Zip, 1, false)]
    [InlineData(ContentKind.Gzip, 2, false)]
    [InlineData(ContentKind.Zip, 2, false)]
    [InlineData(ContentKind.Fit, 2, true)]
    [InlineData(ContentKind.Text, 2, true)]
    public void ContainersLieTwoDeepAtMost(ContentKind kind, int depth, bool allowed) =>
        Assert.Equal(allowed, DecoderSet.CheckNesting(kind, depth) is null);

    [Fact]
    public void NoDamageOfAFewBytesCrashes()
    {
        byte[][] whole =
        [
            Encoding.UTF8.GetBytes(Csv), [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(Csv)], Packed.Gzip(Encoding.UTF8.GetBytes(Csv)),
            Packed.Zip(("a.csv", Encoding.UTF8.GetBytes(Csv)), ("b/", []), ("b/c.gz", Packed.Gzip(Encoding.UTF8.GetBytes(Csv)))),
        ];

        Gen.Select(Gen.Int[0, whole.Length - 1].Select(index => whole[index]), Gen.Select(Gen.Int[0, 1000], Gen.Byte).Array[1, 4], Gen.Int[0, 20]).Sample((bytes, changes, cut) =>
        {
            var changed = bytes[..^cut];
            foreach (var (at, value) in changes)
            {
                changed[at % changed.Length] = value;
            }

            // Whatever comes, there is either something in it or a problem.
            var file = Decoders.Decode(changed);
            Assert.True(file.Recordings.Count > 0 || file.Problems.Count > 0);
            Decoders.CheckCompleteness(changed);
            var unpacked = Decoders.Unpack(changed, "x");
            Assert.All(unpacked.Members, member => Assert.True(member.Problem is null || member.Bytes.IsEmpty));
        }, iter: 5000);
    }

    private static string Reason(byte[] bytes)
    {
        var file = Decoders.Decode(bytes);
        Assert.Empty(file.Recordings);
        return Assert.Single(file.Problems).ToString();
    }
}
