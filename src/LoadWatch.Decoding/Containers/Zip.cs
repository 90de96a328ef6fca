using System.Buffers.Binary;
using System.IO.Compression;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Containers;

/// <summary>
/// Reads zip files with checks of our own: CRC-32, declared against real size, ratio, total, number of entries, overlaps.
/// </summary>
internal static class Zip
{
    private const int LocalHeaderLength = 30;
    private const ushort Stored = 0;
    private const ushort Deflated = 8;

    /// <summary>Folders, hidden entries and leftovers of file managers are passed over.</summary>
    public static Unpacked Unpack(ReadOnlyMemory<byte> file, ContainerLimits limits)
    {
        var directory = ZipDirectory.Read(file.Span, limits);
        if (directory.Fault is { } fault)
        {
            return Unpacked.Refused(fault, directory.FaultAt);
        }

        var wanted = directory.Entries.Where(entry => !entry.IsFolder && !entry.IsHidden).ToList();
        return (wanted.Sum(entry => entry.PackedLength), wanted.Sum(entry => entry.Length)) switch
        {
            var (packed, _) when packed > file.Length =>
                Unpacked.Refused("entries overlap: together they are longer than the file", file.Length),
            var (_, total) when total > limits.TotalBytes =>
                Unpacked.Refused($"unpacks to {total} bytes, at most {limits.TotalBytes} are read", wanted[0].DirectoryAt),
            _ => new(new MembersOnDemand(wanted.Count, index => Read(file, wanted[index], limits)), []),
        };
    }

    private static ContainerMember Read(ReadOnlyMemory<byte> file, ZipEntry entry, ContainerLimits limits)
    {
        var refusal = Refusal(entry, limits);
        var packed = refusal is null ? PackedData(file, entry) : null;
        refusal ??= packed is null ? "its local header is not where the directory says, or its data is cut" : null;
        var bytes = refusal is null ? Bytes(packed!.Value, entry, out refusal) : default;
        return refusal is null
            ? new ContainerMember(entry.Name, bytes)
            : new(entry.Name, default, new Problem(ProblemSeverity.Error, refusal, ByteOffset: entry.HeaderAt, Field: entry.Name));
    }

    private static string? Refusal(ZipEntry entry, ContainerLimits limits) => entry switch
    {
        { IsEncrypted: true } => "is encrypted",
        { IsLink: true } => "is a link, not a file",
        { Method: not (Stored or Deflated) } => $"is packed by method {entry.Method}, which is not read",
        _ when entry.Length > limits.MemberBytes => $"unpacks to {entry.Length} bytes, at most {limits.MemberBytes} are read",
        _ when limits.IsBomb(entry.Length, entry.PackedLength) => $"unpacks to more than {limits.Ratio} times its size",
        _ => null,
    };

    private static ReadOnlyMemory<byte>? PackedData(ReadOnlyMemory<byte> file, ZipEntry entry)
    {
        if (entry.HeaderAt + LocalHeaderLength > file.Length)
        {
            return null;
        }

        var header = file.Span[(int)entry.HeaderAt..];
        var start = entry.HeaderAt + LocalHeaderLength
            + BinaryPrimitives.ReadUInt16LittleEndian(header[26..]) + BinaryPrimitives.ReadUInt16LittleEndian(header[28..]);
        if (!header.StartsWith("PK\x3\x4"u8) || start + entry.PackedLength > file.Length)
        {
            return null;
        }

        return file.Slice((int)start, (int)entry.PackedLength);
    }

    private static ReadOnlyMemory<byte> Bytes(ReadOnlyMemory<byte> packed, ZipEntry entry, out string? fault)
    {
        var bytes = entry.Method == Stored ? packed : Inflate(packed, (int)entry.Length);
        fault = bytes switch
        {
            null => "its packed data is damaged",
            { } some when some.Length > entry.Length => $"declares {entry.Length} bytes but holds more",
            { } some when some.Length < entry.Length => $"declares {entry.Length} bytes but holds {some.Length}",
            { } some when Crc32.Of(some.Span) != entry.Crc => "its CRC-32 does not fit",
            _ => null,
        };
        return fault is null ? bytes!.Value : default;
    }

    /// <summary>At most one byte more than declared, which is enough to see a lie. Null for damaged data.</summary>
    private static ReadOnlyMemory<byte>? Inflate(ReadOnlyMemory<byte> packed, int declared)
    {
        try
        {
            using var inflater = new DeflateStream(new PackedBytes(packed), CompressionMode.Decompress);
            var buffer = new byte[declared + 1];
            return buffer.AsMemory(0, inflater.ReadAtLeast(buffer, buffer.Length, throwOnEndOfStream: false));
        }
        catch (InvalidDataException)
        {
            return null;
        }
    }
}
