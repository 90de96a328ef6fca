namespace LoadWatch.Decoding.Fit;

/// <summary>How the bytes of a field are to be read, by the number in the low five bits of its type byte.</summary>
public enum FitBaseType
{
    Enumeration = 0,
    Signed8 = 1,
    Unsigned8 = 2,
    Signed16 = 3,
    Unsigned16 = 4,
    Signed32 = 5,
    Unsigned32 = 6,

    /// <summary>UTF-8, ended by a zero byte unless the field is full.</summary>
    Text = 7,
    Real32 = 8,
    Real64 = 9,

    /// <summary>A number for which 0 means no value; so are the other two of this kind.</summary>
    Unsigned8Z = 10,
    Unsigned16Z = 11,
    Unsigned32Z = 12,

    /// <summary>Bytes without a meaning of their own: no value only when all of them are 0xFF.</summary>
    Bytes = 13,
    Signed64 = 14,
    Unsigned64 = 15,
    Unsigned64Z = 16,
}

internal static class FitBaseTypes
{
    private const int MultiByte = 0x80;

    private static ReadOnlySpan<byte> Sizes => [1, 1, 1, 2, 2, 4, 4, 1, 4, 8, 1, 2, 4, 1, 8, 8, 8];

    /// <summary>The type behind a type byte; writers differ in the high bits.</summary>
    public static FitBaseType FromByte(int value) => (FitBaseType)(value & 0x1F);

    public static byte ToByte(this FitBaseType type) => (byte)(type.Size() > 1 ? MultiByte | (int)type : (int)type);

    /// <summary>Bytes of one value; 0 for a type that is not known.</summary>
    public static int Size(this FitBaseType type) => (uint)type < (uint)Sizes.Length ? Sizes[(int)type] : 0;

    public static bool IsFloat(this FitBaseType type) => type is FitBaseType.Real32 or FitBaseType.Real64;
}
