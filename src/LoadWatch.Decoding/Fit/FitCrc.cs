using System.Buffers.Binary;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// The checksum of FIT: CRC-16 with the reflected polynomial 0xA001, start 0, no final change. Sixteen bytes are taken per step, each through
/// the table that carries its effect past the bytes behind it.
/// </summary>
public static class FitCrc
{
    private const int Stride = 16;
    private static readonly ushort[] Tables = BuildTables();

    /// <summary>The checksum of <paramref name="bytes"/>, going on from <paramref name="crc"/>; over bytes and their checksum it is 0.</summary>
    public static ushort Of(ReadOnlySpan<byte> bytes, ushort crc = 0)
    {
        while (bytes.Length >= Stride)
        {
            crc = Step(bytes, crc);
            bytes = bytes[Stride..];
        }

        foreach (var value in bytes)
            crc = (ushort)((crc >> 8) ^ Tables[(crc ^ value) & 0xFF]);

        return crc;
    }

    private static ushort Step(ReadOnlySpan<byte> bytes, ushort crc)
    {
        var (tables, size) = (Tables, sizeof(ulong));
        var first = BinaryPrimitives.ReadUInt64LittleEndian(bytes) ^ crc;
        var second = BinaryPrimitives.ReadUInt64LittleEndian(bytes[size..]);
        return (ushort)(Eight(tables, size, first) ^ Eight(tables, 0, second));
    }

    /// <summary>
    /// The effect of eight bytes that are followed by as many as the number of the table that the last of them goes through. The first two wait for the
    /// step before, so they come last.
    /// </summary>
    private static int Eight(ushort[] tables, int last, ulong bytes) =>
        tables[At(last, bytes >> 56)] ^ tables[At(last + 1, bytes >> 48)] ^ tables[At(last + 2, bytes >> 40)] ^ tables[At(last + 3, bytes >> 32)]
        ^ tables[At(last + 4, bytes >> 24)] ^ tables[At(last + 5, bytes >> 16)] ^ tables[At(last + 6, bytes >> 8)] ^ tables[At(last + 7, bytes)];

    private static int At(int table, ulong bytes) => (table << 8) | (int)(bytes & 0xFF);

    private static ushort[] BuildTables()
    {
        var tables = new ushort[Stride << 8];
        for (var i = 0; i < 256; i++)
            tables[i] = Shifted((ushort)i);

        for (var i = 256; i < tables.Length; i++)
        {
            var before = tables[i - 256];
            tables[i] = (ushort)((before >> 8) ^ tables[before & 0xFF]);
        }

        return tables;
    }

    private static ushort Shifted(ushort value)
    {
        for (var bit = 0; bit < 8; bit++)
            value = (ushort)((value & 1) != 0 ? (value >> 1) ^ 0xA001 : value >> 1);

        return value;
    }
}
