using System.Buffers.Binary;
using System.Text;
using System.Text.Unicode;

namespace LoadWatch.Decoding.Containers;

/// <summary>
/// The name of an entry as text (APPNOTE 6.3.10, sections 4.4.17, 4.6.9 and appendix D): UTF-8 where the entry says so or brings a name in UTF-8
/// that is stated to be of these bytes; else UTF-8 where the bytes are it, as many programs write it without saying so, and code page 437, the one
/// of the format.
/// </summary>
internal static class ZipName
{
    private const ushort Utf8Flag = 0x0800;
    private const ushort UnicodePath = 0x7075;
    private const int FieldHeaderLength = 4;
    private const int CrcLength = 4;
    private const int LabelCharacters = 255;

    /// <summary>To show and to match: <c>/</c> between folders, control characters replaced, cut at 255.</summary>
    /// <param name="name">As the directory holds it.</param>
    /// <param name="extra">The extra fields of the entry.</param>
    /// <param name="flags">Of the entry.</param>
    public static string Label(ReadOnlySpan<byte> name, ReadOnlySpan<byte> extra, ushort flags) =>
        string.Concat(Text(name, extra, flags).Take(LabelCharacters).Select(c => c == '\\' ? '/' : char.IsControl(c) ? '\uFFFD' : c));

    private static string Text(ReadOnlySpan<byte> name, ReadOnlySpan<byte> extra, ushort flags)
    {
        if ((flags & Utf8Flag) != 0)
        {
            return Encoding.UTF8.GetString(name);
        }

        return Field(extra) is [1, .. var path] && path.Length >= CrcLength && BinaryPrimitives.ReadUInt32LittleEndian(path) == Crc32.Of(name)
            ? Encoding.UTF8.GetString(path[CrcLength..])
            : (Utf8.IsValid(name) ? Encoding.UTF8 : Original()).GetString(name);
    }

    /// <summary>The content of the field that holds the name in UTF-8, or nothing.</summary>
    private static ReadOnlySpan<byte> Field(ReadOnlySpan<byte> extra)
    {
        while (extra.Length >= FieldHeaderLength)
        {
            var length = BinaryPrimitives.ReadUInt16LittleEndian(extra[2..]);
            if (length > extra.Length - FieldHeaderLength)
            {
                return default;
            }

            if (BinaryPrimitives.ReadUInt16LittleEndian(extra) == UnicodePath)
            {
                return extra.Slice(FieldHeaderLength, length);
            }

            extra = extra[(FieldHeaderLength + length)..];
        }

        return default;
    }

    private static Encoding Original() => CodePagesEncodingProvider.Instance.GetEncoding(437)!;
}
