using System.Buffers.Binary;
using System.IO.Compression;

namespace LoadWatch.Decoding.Containers;

/// <summary>
/// Reads gzip files (RFC 1952) with checks of our own, because the platform's stream takes a file cut in the middle for whole and passes
/// over what
/// follows the last member. Every member must be whole: header, packed data, CRC-32 and size.
/// </summary>
internal static class Gzip
{
    private const int TrailerLength = 8;

    // The inflater may hold back a few bytes of the read before; the end of the packed data is sought from there.
    private const int HeldBackAtMost = 16;

    /// <summary>The members, joined, as one member of the given name.</summary>
    public static Unpacked Unpack(ReadOnlyMemory<byte> bytes, string name, ContainerLimits limits)
    {
        var output = InflatedBytes.Kept(FirstCapacity(bytes.Span, limits));
        var fault = ReadMembers(bytes, output, limits);
        if (output.IsFull)
        {
            // The last trailer told too little: what all members hold is counted first, so that no buffer has to grow.
            output = InflatedBytes.Counted();
            fault = ReadMembers(bytes, output, limits);
            if (fault is null)
            {
                output = InflatedBytes.Kept(output.Length + 1);
                fault = ReadMembers(bytes, output, limits);
            }
        }

        return fault is var (position, reason) ? Unpacked.Refused(reason, position) : new([new ContainerMember(name, output.ToMemory())], []);
    }

    /// <summary>Whether every member is whole and none beyond the limits; keeps nothing.</summary>
    public static bool IsWhole(ReadOnlyMemory<byte> bytes, ContainerLimits limits) => ReadMembers(bytes, InflatedBytes.Counted(), limits) is null;

    /// <returns>Null once all are read, or the output is full; else what is wrong and where.</returns>
    private static (int Position, string Reason)? ReadMembers(ReadOnlyMemory<byte> bytes, InflatedBytes output, ContainerLimits limits)
    {
        var position = 0;
        do
        {
            var (next, reason) = ReadMember(bytes, position, output, limits);
            if (reason is not null)
            {
                return (next, reason);
            }

            position = next;
        }
        while (position < bytes.Length && !output.IsFull);
        return null;
    }

    private static (int Position, string? Reason) ReadMember(
        ReadOnlyMemory<byte> bytes, int start, InflatedBytes output, ContainerLimits limits)
    {
        if (GzipHeader.End(bytes.Span, start, out var reason) is not { } dataStart)
        {
            return (start, reason);
        }

        output.BeginMember();
        var packed = new PackedBytes(bytes[dataStart..]);
        if (Inflate(packed, dataStart, output, limits) is { } fault)
        {
            return (dataStart, fault);
        }

        return output.IsFull ? (dataStart, null) : FindEnd(bytes.Span, dataStart, packed, output) is { } end
            ? (end, null)
            : (dataStart, "gzip data is cut or damaged, or other bytes follow it: no trailer fits what was unpacked");
    }

    /// <summary>The ratio is that of the whole file up to here: many members that each stay within it would do so together.</summary>
    private static string? Inflate(PackedBytes packed, int packedBefore, InflatedBytes output, ContainerLimits limits)
    {
        using var inflater = new DeflateStream(packed, CompressionMode.Decompress);
        try
        {
            while (!output.IsFull && inflater.Read(output.Free()) is > 0 and var count)
            {
                output.Advance(count);
                if (output.Length > limits.MemberBytes)
                {
                    return $"unpacks to more than {limits.MemberBytes} bytes";
                }

                if (limits.IsBomb(output.Length, packedBefore + packed.Handed))
                {
                    return $"unpacks to more than {limits.Ratio} times its size";
                }
            }

            return null;
        }
        catch (InvalidDataException)
        {
            return "gzip data is damaged";
        }
    }

    /// <summary>
    /// Finds the trailer by its value, near where the inflater stopped reading: eight bytes that are the CRC-32 and size of what was
    /// unpacked, with
    /// nothing or another member behind them.
    /// </summary>
    private static int? FindEnd(ReadOnlySpan<byte> bytes, int dataStart, PackedBytes packed, InflatedBytes unpacked)
    {
        Span<byte> trailer = stackalloc byte[TrailerLength];
        BinaryPrimitives.WriteUInt32LittleEndian(trailer, unpacked.MemberCrc);
        BinaryPrimitives.WriteUInt32LittleEndian(trailer[4..], (uint)unpacked.MemberLength);
        var last = Math.Min(dataStart + packed.Handed, bytes.Length - TrailerLength);
        for (var at = Math.Max(dataStart, dataStart + packed.LastRead - HeldBackAtMost); at <= last; at++)
        {
            var end = at + TrailerLength;
            if (bytes[at..end].SequenceEqual(trailer) && (end == bytes.Length || GzipHeader.StartsAt(bytes, end)))
            {
                return end;
            }
        }

        return null;
    }

    /// <summary>What the last trailer says, as far as it can be true, and one byte more for the read that finds the end.</summary>
    private static int FirstCapacity(ReadOnlySpan<byte> bytes, ContainerLimits limits)
    {
        var stated = bytes.Length < TrailerLength ? 0 : BinaryPrimitives.ReadUInt32LittleEndian(bytes[^4..]);
        return (int)Math.Min(stated, Math.Min(limits.MemberBytes, Math.Max(limits.RatioFreeBytes, (long)bytes.Length * limits.Ratio))) + 1;
    }
}
