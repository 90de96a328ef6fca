using System.Buffers.Binary;

namespace LoadWatch.Decoding.Fit;

/// <summary>The header a part is written with; all are legal.</summary>
public enum FitHeaderStyle
{
    /// <summary>14 bytes with their own checksum.</summary>
    Full,

    /// <summary>14 bytes, their checksum left 0 (not computed).</summary>
    WithoutChecksum,

    /// <summary>The 12 bytes of old writers.</summary>
    TwelveBytes,
}

/// <summary>Writes one part of a FIT file message by message. Parts written one behind the other are a chained file.</summary>
public sealed class FitPartWriter(FitHeaderStyle style = FitHeaderStyle.Full)
{
    private const byte Protocol = 0x20;
    private const ushort Profile = 2132;
    private readonly Dictionary<int, FitDefinition> live = [];
    private readonly List<byte> data = [];

    /// <summary>Defines local type 0 to 15, or defines it anew.</summary>
    public FitPartWriter Define(int local, FitDefinition definition)
    {
        ArgumentNullException.ThrowIfNull(definition);
        live[local] = definition;
        data.Add((byte)(0x40 | (definition.Developer.Count > 0 ? 0x20 : 0) | local));
        data.AddRange(definition.ToBytes());
        return this;
    }

    /// <summary>Writes a message; values in the order of the definition, developer fields last, missing ones without a value.</summary>
    public FitPartWriter Message(int local, params ReadOnlySpan<FitValue> values) => Write((byte)local, local, values);

    /// <summary>Writes a message whose time is the next one with these low five bits; only for local types 0 to 3.</summary>
    public FitPartWriter Compressed(int local, int lowBits, params ReadOnlySpan<FitValue> values) =>
        Write((byte)(0x80 | (local << 5) | (lowBits & 0x1F)), local, values);

    /// <summary>The part: header, data, checksum.</summary>
    public byte[] ToBytes()
    {
        var header = Header();
        byte[] part = [.. header, .. data, 0, 0];
        BinaryPrimitives.WriteUInt16LittleEndian(part.AsSpan(part.Length - 2), FitCrc.Of(part.AsSpan(0, part.Length - 2)));
        return part;
    }

    private FitPartWriter Write(byte header, int local, ReadOnlySpan<FitValue> values)
    {
        var definition = live[local];
        data.Add(header);
        for (var i = 0; i < definition.Fields.Count; i++)
        {
            var field = definition.Fields[i];
            data.AddRange(FitFieldWriter.Bytes(field.Type, field.Count, ValueAt(values, i), definition.BigEndian));
        }

        for (var i = 0; i < definition.Developer.Count; i++)
        {
            var field = definition.Developer[i];
            var value = ValueAt(values, definition.Fields.Count + i);
            data.AddRange(FitFieldWriter.Bytes(field.Type, field.Count, value, definition.BigEndian));
        }

        return this;
    }

    private static FitValue ValueAt(ReadOnlySpan<FitValue> values, int index) => index < values.Length ? values[index] : FitValue.None;

    private byte[] Header()
    {
        var header = new byte[style == FitHeaderStyle.TwelveBytes ? FitFrame.ShortHeader : FitFrame.FullHeader];
        header[0] = (byte)header.Length;
        header[1] = Protocol;
        BinaryPrimitives.WriteUInt16LittleEndian(header.AsSpan(2), Profile);
        BinaryPrimitives.WriteInt32LittleEndian(header.AsSpan(4), data.Count);
        ".FIT"u8.CopyTo(header.AsSpan(8));
        if (style == FitHeaderStyle.Full)
            BinaryPrimitives.WriteUInt16LittleEndian(header.AsSpan(12), FitCrc.Of(header.AsSpan(0, 12)));

        return header;
    }
}
