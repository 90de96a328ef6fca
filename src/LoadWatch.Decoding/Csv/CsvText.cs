using System.Text;

namespace LoadWatch.Decoding.Csv;

/// <summary>A text and its encoding; null stands for UTF-8.</summary>
/// <param name="MarkLength">Bytes of its byte order mark.</param>
internal sealed record CsvText(CsvSource Source, int MarkLength, Encoding? Encoding)
{
    public const string Auto = "auto";
    public const string Utf8Name = "utf-8";
    public const string Utf16 = "utf-16";
    public const string Windows1252 = "windows-1252";
    public const string Names = $"{Auto}, {Utf8Name}, {Utf16} or {Windows1252}";

    public static bool Knows(string name) => name is Auto or Utf8Name or Utf16 or Windows1252;

    /// <summary>A byte order mark decides; then the name; then, for <c>auto</c>, whether the bytes are valid UTF-8.</summary>
    public static CsvText Of(CsvSource source, string name) => source.Head switch
    {
        [0xEF, 0xBB, 0xBF, ..] => new(source, 3, Encoding: null),
        [0xFF, 0xFE, ..] => new(source, 2, Utf16Reader(bigEndian: false)),
        [0xFE, 0xFF, ..] => new(source, 2, Utf16Reader(bigEndian: true)),
        _ => new(source, 0, ByName(source, name)),
    };

    /// <summary>The text without its byte order mark.</summary>
    public Stream Open() => Source.Open(MarkLength);

    private static Encoding? ByName(CsvSource source, string name) => name switch
    {
        Utf8Name => null,
        Utf16 => Utf16Reader(bigEndian: false),
        Windows1252 => Western(),
        _ => source.IsUtf8 ? null : Western(),
    };

    private static UnicodeEncoding Utf16Reader(bool bigEndian) => new(bigEndian, byteOrderMark: false);

    private static Encoding Western() => CodePagesEncodingProvider.Instance.GetEncoding(1252)!;
}
