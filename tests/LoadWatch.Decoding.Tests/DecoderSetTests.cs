using System.Text;
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

    private static string Reason(byte[] bytes)
    {
        var file = Decoders.Decode(bytes);
        Assert.Empty(file.Recordings);
        return Assert.Single(file.Problems).ToString();
    }
}
