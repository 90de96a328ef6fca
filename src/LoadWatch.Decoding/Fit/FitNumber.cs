using System.Buffers.Binary;

namespace LoadWatch.Decoding.Fit;

/// <summary>Reads single values. What the type declares to be no value, and real numbers beyond any reading, are NaN.</summary>
internal static class FitNumber
{
    /// <summary>No reading is larger: a real number beyond it is damage or malice, and sums of it would overflow.</summary>
    private const double LargestReal = 1e12;

    /// <summary>The first value of a field that is one, or NaN.</summary>
    public static double FirstValid(ReadOnlySpan<byte> field, FitBaseType type, bool bigEndian)
    {
        var size = type.Size();
        for (var at = 0; at + size <= field.Length; at += size)
        {
            var value = Read(field[at..], type, bigEndian);
            if (!double.IsNaN(value))
                return value;
        }

        return double.NaN;
    }

    /// <summary>The value at the front of <paramref name="bytes"/>, which holds at least one.</summary>
    public static double Read(ReadOnlySpan<byte> bytes, FitBaseType type, bool bigEndian) => type switch
    {
        FitBaseType.Enumeration or FitBaseType.Unsigned8 or FitBaseType.Bytes => Unless(bytes[0], byte.MaxValue),
        FitBaseType.Unsigned8Z => Unless(bytes[0], 0),
        FitBaseType.Signed8 => Unless(unchecked((sbyte)bytes[0]), sbyte.MaxValue),
        FitBaseType.Unsigned16 => Unless(UInt16(bytes, bigEndian), ushort.MaxValue),
        FitBaseType.Unsigned16Z => Unless(UInt16(bytes, bigEndian), 0),
        FitBaseType.Signed16 => Unless(unchecked((short)UInt16(bytes, bigEndian)), short.MaxValue),
        FitBaseType.Unsigned32 => Unless(UInt32(bytes, bigEndian), uint.MaxValue),
        FitBaseType.Unsigned32Z => Unless(UInt32(bytes, bigEndian), 0),
        FitBaseType.Signed32 => Unless(unchecked((int)UInt32(bytes, bigEndian)), int.MaxValue),
        FitBaseType.Real32 => Finite(BitConverter.UInt32BitsToSingle(UInt32(bytes, bigEndian))),
        FitBaseType.Real64 => Finite(BitConverter.UInt64BitsToDouble(UInt64(bytes, bigEndian))),
        FitBaseType.Unsigned64 => UInt64(bytes, bigEndian) is var value and not ulong.MaxValue ? value : double.NaN,
        FitBaseType.Unsigned64Z => UInt64(bytes, bigEndian) is var value and not 0 ? value : double.NaN,
        FitBaseType.Signed64 => Unless(unchecked((long)UInt64(bytes, bigEndian)), long.MaxValue),
        _ => double.NaN,
    };

    public static ushort UInt16(ReadOnlySpan<byte> bytes, bool bigEndian) =>
        bigEndian ? BinaryPrimitives.ReadUInt16BigEndian(bytes) : BinaryPrimitives.ReadUInt16LittleEndian(bytes);

    public static uint UInt32(ReadOnlySpan<byte> bytes, bool bigEndian) =>
        bigEndian ? BinaryPrimitives.ReadUInt32BigEndian(bytes) : BinaryPrimitives.ReadUInt32LittleEndian(bytes);

    private static ulong UInt64(ReadOnlySpan<byte> bytes, bool bigEndian) =>
        bigEndian ? BinaryPrimitives.ReadUInt64BigEndian(bytes) : BinaryPrimitives.ReadUInt64LittleEndian(bytes);

    private static double Unless(long value, long noValue) => value == noValue ? double.NaN : value;

    private static double Finite(double value) => Math.Abs(value) <= LargestReal ? value : double.NaN;
}
