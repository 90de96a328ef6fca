using System.Buffers.Binary;

namespace LoadWatch.Decoding.Containers;

/// <summary>
/// The central directory of a zip file (APPNOTE 6.3.10). Read here because the platform's reader checks no CRC, reads an entry no further
/// than the size
/// it declares, and makes all entries before they can be counted.
/// </summary>
internal sealed record ZipDirectory(IReadOnlyList<ZipEntry> Entries, string? Fault, long FaultAt)
{
    private const int EndLength = 22;
    private const int CommentAtMost = ushort.MaxValue;

    public static ZipDirectory Read(ReadOnlySpan<byte> file, ContainerLimits limits)
    {
        if (FindEnd(file) is not { } end)
        {
            return Broken("no end record: the zip file is cut, or bytes follow it", file.Length);
        }

        var record = file[end..];
        var count = BinaryPrimitives.ReadUInt16LittleEndian(record[10..]);
        var length = BinaryPrimitives.ReadUInt32LittleEndian(record[12..]);
        var start = BinaryPrimitives.ReadUInt32LittleEndian(record[16..]);
        return true switch
        {
            _ when count == ushort.MaxValue || start == uint.MaxValue => Broken("zip64 is not read", end),
            _ when BinaryPrimitives.ReadUInt32LittleEndian(record[4..]) != 0 => Broken("a zip file in several parts is not read", end),
            _ when count > limits.Entries => Broken($"{count} entries, at most {limits.Entries} are read", end),
            _ when (long)start + length != end => Broken("the directory does not end where the end record begins", end),
            _ => Walk(file, (int)start, end, count),
        };
    }

    private static ZipDirectory Walk(ReadOnlySpan<byte> file, int start, int end, int count)
    {
        var entries = new List<ZipEntry>(count);
        var at = start;
        while (at < end && entries.Count < count)
        {
            if (ZipEntry.ReadAt(file, at, end, out var next) is not { } entry)
            {
                return Broken("the directory is damaged", at);
            }

            entries.Add(entry);
            at = next;
        }

        return at == end && entries.Count == count
            ? new(entries, null, 0)
            : Broken("the directory does not hold the number of entries stated", at);
    }

    /// <summary>The end record whose comment reaches exactly to the end of the file.</summary>
    private static int? FindEnd(ReadOnlySpan<byte> file)
    {
        var first = Math.Max(0, file.Length - EndLength - CommentAtMost);
        for (var at = file.Length - EndLength; at >= first; at--)
        {
            var comment = BinaryPrimitives.ReadUInt16LittleEndian(file[(at + 20)..]);
            if (file[at..].StartsWith("PK\x5\x6"u8) && at + EndLength + comment == file.Length)
            {
                return at;
            }
        }

        return null;
    }

    private static ZipDirectory Broken(string reason, long at) => new([], reason, at);
}
