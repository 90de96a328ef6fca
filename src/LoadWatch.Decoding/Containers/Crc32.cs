namespace LoadWatch.Decoding.Containers;

/// <summary>
/// The CRC-32 of gzip and zip: polynomial 0x04C11DB7 reflected, start and final complement all ones (RFC 1952, section 8; ISO 3309).
/// </summary>
internal static class Crc32
{
    /// <summary>The state before the first byte.</summary>
    public const uint Begin = uint.MaxValue;

    private static readonly uint[] Table = [.. Enumerable.Range(0, 256).Select(Entry)];

    public static uint Of(ReadOnlySpan<byte> bytes) => End(Continue(Begin, bytes));

    /// <summary>The CRC of all bytes that led to a state.</summary>
    public static uint End(uint state) => ~state;

    /// <summary>The state behind more bytes.</summary>
    public static uint Continue(uint state, ReadOnlySpan<byte> bytes)
    {
        var crc = state;
        foreach (var value in bytes)
        {
            crc = Table[(crc ^ value) & 0xFF] ^ (crc >> 8);
        }

        return crc;
    }

    private static uint Entry(int index)
    {
        var entry = (uint)index;
        for (var bit = 0; bit < 8; bit++)
        {
            entry = (entry & 1) == 1 ? 0xEDB88320 ^ (entry >> 1) : entry >> 1;
        }

        return entry;
    }
}
