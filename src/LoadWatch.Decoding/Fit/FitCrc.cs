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
        var tables = Tables;
        var next = tables[(15 << 8) | (bytes[0] ^ (crc & 0xFF))] ^ tables[(14 << 8) | (bytes[1] ^ (crc >> 8))];
        for (var i = 2; i < Stride; i++)
            next ^= tables[((Stride - 1 - i) << 8) | bytes[i]];

        return (ushort)next;
    }

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
