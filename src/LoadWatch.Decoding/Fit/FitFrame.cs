using System.Buffers.Binary;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Fit;

/// <summary>One part of a file: a header, the data it announces, and their checksum. Several may follow each other.</summary>
/// <param name="Offset">Where the header begins in the file.</param>
/// <param name="Size">Bytes of the whole part, checksum included, as the header states it.</param>
internal readonly record struct FitFrame(int Offset, int HeaderSize, long Size)
{
    public const int ShortHeader = 12;
    public const int FullHeader = 14;
    public const int CrcSize = 2;

    public int DataStart => Offset + HeaderSize;

    public long DataEnd => Offset + Size - CrcSize;

    public long End => Offset + Size;

    public static bool HasHeader(ReadOnlySpan<byte> bytes) =>
        bytes.Length >= ShortHeader && bytes[0] is ShortHeader or FullHeader && bytes.Slice(8, 4).SequenceEqual(".FIT"u8);

    /// <summary>The part whose header begins at <paramref name="offset"/>; one must be there.</summary>
    public static FitFrame At(ReadOnlySpan<byte> bytes, int offset)
    {
        var header = bytes[offset..];
        return new FitFrame(offset, header[0], header[0] + (long)BinaryPrimitives.ReadUInt32LittleEndian(header[4..]) + CrcSize);
    }

    /// <summary>What is wrong with the part as a whole, or null.</summary>
    public Problem? Check(ReadOnlySpan<byte> bytes)
    {
        if (IsUnclosed(bytes))
            return Fault($"the recording was never closed: its header states no data, {bytes.Length - DataStart} bytes follow", Offset + 4);

        if (End > bytes.Length)
            return Fault($"cut short: {bytes.Length - Offset} of the {Size} bytes that its header states", bytes.Length);

        return FitCrc.Of(bytes[Offset..(int)End]) == 0 ? null : Fault("wrong checksum: this part is damaged or was never finished", DataEnd);
    }

    /// <summary>Whether the header's own checksum is right; old headers have none, and it may be left out.</summary>
    public bool HasSoundHeader(ReadOnlySpan<byte> bytes) =>
        HeaderSize < FullHeader
        || (bytes.Length >= DataStart
            && (BinaryPrimitives.ReadUInt16LittleEndian(bytes[(Offset + ShortHeader)..]) == 0 || FitCrc.Of(bytes.Slice(Offset, FullHeader)) == 0));

    public bool IsUnclosed(ReadOnlySpan<byte> bytes) =>
        DataEnd == DataStart && bytes.Length > End && !HasHeader(bytes[(int)End..]);

    private static Problem Fault(string reason, long offset) => new(ProblemSeverity.Error, reason, offset);
}
