using System.Text;
using System.Text.Unicode;

namespace LoadWatch.Decoding.Csv;

/// <summary>The bytes of a text without their byte order mark, and their encoding; null stands for UTF-8.</summary>
internal sealed record CsvText(ReadOnlyMemory<byte> Bytes, Encoding? Encoding)
{
    public const string Auto = "auto";
    public const string Utf8Name = "utf-8";
    public const string Utf16 = "utf-16";
    public const string Windows1252 = "windows-1252";
    public const string Names = $"{Auto}, {Utf8Name}, {Utf16} or {Windows1252}";

    public static bool Knows(string name) => name is Auto or Utf8Name or Utf16 or Windows1252;

    /// <summary>A byte order mark decides; then the name; then, for <c>auto</c>, whether the bytes are valid UTF-8.</summary>
    public static CsvText Of(ReadOnlyMemory<byte> bytes, string name) => bytes.Span switch
    {
        [0xEF, 0xBB, 0xBF, ..] => new(bytes[3..], Encoding: null),
        [0xFF, 0xFE, ..] => new(bytes[2..], Utf16Reader(bigEndian: false)),
        [0xFE, 0xFF, ..] => new(bytes[2..], Utf16Reader(bigEndian: true)),
        _ => new(bytes, ByName(bytes.Span, name)),
    };

    /// <summary>At most this many lines: line ends of all three kinds, and one more where the text does not end with one.</summary>
    public int LinesAtMost()
    {
        var span = Bytes.Span;
        var open = span is [.., (byte)'\n' or (byte)'\r'] ? 0 : 1;
        return span.Count((byte)'\n') + span.Count((byte)'\r') - span.Count("\r\n"u8) + open;
    }

    private static Encoding? ByName(ReadOnlySpan<byte> bytes, string name) => name switch
    {
        Utf8Name => null,
        Utf16 => Utf16Reader(bigEndian: false),
        Windows1252 => Western(),
        _ => Utf8.IsValid(bytes) ? null : Western(),
    };

    private static UnicodeEncoding Utf16Reader(bool bigEndian) => new(bigEndian, byteOrderMark: false);

    private static Encoding Western() => CodePagesEncodingProvider.Instance.GetEncoding(1252)!;
}
