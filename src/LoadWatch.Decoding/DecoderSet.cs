using LoadWatch.Decoding.Containers;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding;

/// <summary>The one way from bytes to recordings and rows of tables: tells what a content is, whether it is whole, and decodes or unpacks it.</summary>
/// <param name="layouts">The CSV layouts known, each without reasons from <see cref="CsvLayout.Validate"/>; <see cref="BuiltInLayouts"/>
/// are not added.</param>
/// <param name="limits">How much a container may hold; null for the defaults.</param>
public sealed class DecoderSet(IReadOnlyList<CsvLayout> layouts, ContainerLimits? limits = null)
{
    /// <summary>Containers may lie this deep: a gzip file in a zip file.</summary>
    public const int DepthAtMost = 2;

    /// <summary>As many bytes of the start as <see cref="Recognise"/> looks at.</summary>
    public const int HeadLength = 4096;

    private const string GzipEnding = ".gz";

    private readonly ContainerLimits limits = limits ?? new();

    /// <summary>What a content is by its first bytes.</summary>
    /// <param name="head">The first <see cref="HeadLength"/> bytes, or all of a shorter content.</param>
    public static ContentKind Recognise(ReadOnlySpan<byte> head) => head switch
    {
        _ when FitDecoder.LooksLikeFit(head) => ContentKind.Fit,
        [0x1F, 0x8B, 0x08, ..] => ContentKind.Gzip,
        [0x50, 0x4B, 0x03, 0x04, ..] or [0x50, 0x4B, 0x05, 0x06, ..] => ContentKind.Zip,
        [0xFF, 0xFE, ..] or [0xFE, 0xFF, ..] => ContentKind.Text,
        [] => ContentKind.Unknown,
        _ => head[..Math.Min(head.Length, HeadLength)].Contains((byte)0) ? ContentKind.Unknown : ContentKind.Text,
    };

    /// <summary>
    /// A FIT file by size and CRC, a gzip file by its trailers, a zip file by its end record and directory; nothing else can tell.
    /// </summary>
    /// <param name="bytes">The whole content.</param>
    public Completeness CheckCompleteness(ReadOnlyMemory<byte> bytes) => Recognise(bytes.Span) switch
    {
        ContentKind.Fit => When(FitDecoder.CheckCompleteness(bytes.Span) == FitCompleteness.Complete),
        ContentKind.Gzip => When(Gzip.IsWhole(bytes, limits)),
        ContentKind.Zip => When(ZipDirectory.Read(bytes.Span, limits).Fault is null),
        _ => Completeness.NeedsSettling,
    };

    /// <summary>Decodes a FIT file, or a CSV by the layout that its column names pick. Anything else gives nothing and an error.</summary>
    /// <param name="salvages">Whether what lies before the end of a FIT file that was cut off or never closed is used.</param>
    public DecodedFile Decode(ReadOnlyMemory<byte> bytes, bool salvages = false) => Recognise(bytes.Span) switch
    {
        ContentKind.Fit => FitDecoder.Decode(bytes, salvages),
        ContentKind.Text => CsvDecoder.Decode(bytes, layouts),
        ContentKind.Gzip => Refused("gzip", "a gzip file is unpacked first"),
        ContentKind.Zip => Refused("zip", "a zip file is unpacked first"),
        _ => Refused("unknown", bytes.IsEmpty ? "the file is empty" : "not a FIT, CSV, gzip or zip file"),
    };

    /// <inheritdoc cref="CsvDecoder.Open(Func{Stream}, IReadOnlyList{CsvLayout})"/>
    public TextContent OpenText(Func<Stream> open) => CsvDecoder.Open(open, layouts);

    /// <inheritdoc cref="CsvDecoder.Open(ReadOnlyMemory{byte}, IReadOnlyList{CsvLayout})"/>
    public TextContent OpenText(ReadOnlyMemory<byte> bytes) => CsvDecoder.Open(bytes, layouts);

    /// <inheritdoc cref="CsvDecoder.Read"/>
    public CsvReadThrough ReadText(Func<Stream> open, Action<Recording> take) => CsvDecoder.Read(open, layouts, take);

    /// <summary>Unpacks a gzip or zip file; its members are contents of their own.</summary>
    /// <param name="bytes">The whole content.</param>
    /// <param name="name">The name of the content: a gzip file's member is called the same without <c>.gz</c>.</param>
    public Unpacked Unpack(ReadOnlyMemory<byte> bytes, string name)
    {
        ArgumentNullException.ThrowIfNull(name);
        return Recognise(bytes.Span) switch
        {
            ContentKind.Gzip => Gzip.Unpack(bytes, NameInside(name), limits),
            ContentKind.Zip => Zip.Unpack(bytes, limits),
            _ => Unpacked.Refused("not a gzip or zip file", 0),
        };
    }

    /// <summary>Why a content must not be unpacked where it lies, or null.</summary>
    /// <param name="kind">What the content is.</param>
    /// <param name="depth">How many containers it lies in: 0 in the inbox, 1 as a member.</param>
    public static Problem? CheckNesting(ContentKind kind, int depth) => (kind, depth) switch
    {
        (ContentKind.Zip, > 0) => Error("a zip file inside another container is not unpacked"),
        (ContentKind.Gzip, >= DepthAtMost) => Error($"containers lie more than {DepthAtMost} deep"),
        _ => null,
    };

    private static string NameInside(string name) =>
        name.Length > GzipEnding.Length && name.EndsWith(GzipEnding, StringComparison.OrdinalIgnoreCase)
            ? name[..^GzipEnding.Length]
            : name;

    private static Completeness When(bool complete) => complete ? Completeness.Complete : Completeness.NeedsSettling;

    private static DecodedFile Refused(string kind, string reason) => new(kind, FileType: null, SourceName: null, [], [Error(reason)]);

    private static Problem Error(string reason) => new(ProblemSeverity.Error, reason, ByteOffset: 0);
}
