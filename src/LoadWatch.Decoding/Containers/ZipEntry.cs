using System.Buffers.Binary;

namespace LoadWatch.Decoding.Containers;

/// <summary>An entry of a zip file as the central directory states it (APPNOTE 6.3.10, section 4.3.12).</summary>
/// <param name="HeaderAt">Where its local header stands, by byte from the start of the file.</param>
/// <param name="DirectoryAt">Where the directory states it, likewise.</param>
internal sealed record ZipEntry(
    string Name, ushort Flags, ushort Method, uint Crc, long PackedLength, long Length, long HeaderAt, bool IsLink, int DirectoryAt)
{
    private const int FixedLength = 46;
    private const int UnixLink = 0xA000;
    private const int UnixKind = 0xF000;
    private const int UnixHost = 3;

    public bool IsEncrypted => (Flags & 0x0041) != 0;

    public bool IsFolder => Name.EndsWith('/');

    /// <summary>A leftover of a file manager, or hidden: not meant as a member.</summary>
    public bool IsHidden => Array.Exists(
        Name.Split('/'), part => part == "__MACOSX" || (part.StartsWith('.') && part is not ("." or "..")));

    /// <summary>Null where no whole entry stands; <paramref name="next"/> is where the following one begins.</summary>
    public static ZipEntry? ReadAt(ReadOnlySpan<byte> file, int at, int end, out int next)
    {
        next = at;
        if (end - at < FixedLength || !file[at..].StartsWith("PK\x1\x2"u8))
        {
            return null;
        }

        var entry = file[at..];
        var nameLength = U16(entry, 28);
        next = at + FixedLength + nameLength + U16(entry, 30) + U16(entry, 32);
        return next > end ? null : new ZipEntry(
            ZipName.Label(entry.Slice(FixedLength, nameLength), entry.Slice(FixedLength + nameLength, U16(entry, 30)), U16(entry, 8)),
            Flags: U16(entry, 8),
            Method: U16(entry, 10),
            Crc: U32(entry, 16),
            PackedLength: U32(entry, 20),
            Length: U32(entry, 24),
            HeaderAt: U32(entry, 42),
            IsLink: Link(entry),
            DirectoryAt: at);
    }

    private static bool Link(ReadOnlySpan<byte> entry) => entry[5] == UnixHost && ((U32(entry, 38) >> 16) & UnixKind) == UnixLink;

    private static ushort U16(ReadOnlySpan<byte> bytes, int at) => BinaryPrimitives.ReadUInt16LittleEndian(bytes[at..]);

    private static uint U32(ReadOnlySpan<byte> bytes, int at) => BinaryPrimitives.ReadUInt32LittleEndian(bytes[at..]);
}
