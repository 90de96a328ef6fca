using System.Text;

namespace LoadWatch.Decoding.Fit;

/// <summary>Writes values into fields.</summary>
internal static class FitFieldWriter
{
    /// <exception cref="ArgumentOutOfRangeException">A value does not fit the type, or there are more values than the field holds.</exception>
    public static byte[] Bytes(FitBaseType type, int count, FitValue value, bool bigEndian)
    {
        if (type == FitBaseType.Text)
            return Text(value.Text ?? "", count);

        ArgumentOutOfRangeException.ThrowIfLessThan(count, value.Numbers.Length);
        var size = type.Size();
        var bytes = new byte[size * count];
        for (var i = 0; i < count; i++)
        {
            var number = i < value.Numbers.Length ? value.Numbers[i] : null;
            Put(bytes.AsSpan(i * size, size), number is { } known ? Bits(type, known) : NoValue(type), bigEndian);
        }

        return bytes;
    }

    private static byte[] Text(string text, int size)
    {
        var bytes = Encoding.UTF8.GetBytes(text);
        ArgumentOutOfRangeException.ThrowIfLessThan(size, bytes.Length);
        Array.Resize(ref bytes, size);
        return bytes;
    }

    private static void Put(Span<byte> bytes, ulong bits, bool bigEndian)
    {
        for (var i = 0; i < bytes.Length; i++)
            bytes[bigEndian ? bytes.Length - 1 - i : i] = unchecked((byte)(bits >> (8 * i)));
    }

    private static ulong Bits(FitBaseType type, double value)
    {
        if (type == FitBaseType.Real32)
            return BitConverter.SingleToUInt32Bits((float)value);

        if (type == FitBaseType.Real64)
            return BitConverter.DoubleToUInt64Bits(value);

        var (least, most) = Range(type);
        ArgumentOutOfRangeException.ThrowIfLessThan(value, least);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(value, most);
        return unchecked((ulong)(long)Math.Round(value));
    }

    private static (double Least, double Most) Range(FitBaseType type)
    {
        var bits = 8 * type.Size();
        return type is FitBaseType.Signed8 or FitBaseType.Signed16 or FitBaseType.Signed32 or FitBaseType.Signed64
            ? (-Math.Pow(2, bits - 1), Math.Pow(2, bits - 1) - 1)
            : (0, Math.Pow(2, Math.Min(bits, 63)) - 1);
    }

    private static ulong NoValue(FitBaseType type) => type switch
    {
        FitBaseType.Unsigned8Z or FitBaseType.Unsigned16Z or FitBaseType.Unsigned32Z or FitBaseType.Unsigned64Z => 0,
        FitBaseType.Signed8 or FitBaseType.Signed16 or FitBaseType.Signed32 or FitBaseType.Signed64 =>
            ulong.MaxValue >> (65 - (8 * type.Size())),
        _ => ulong.MaxValue,
    };
}
