using System.Text;

namespace LoadWatch.Decoding.Csv.Tables;

/// <summary>The strict numbers of a CSV, from text.</summary>
internal static class CellNumber
{
    private const int LongestBytes = 64;

    public static double? Read(string text, char decimalMark)
    {
        Span<byte> bytes = stackalloc byte[LongestBytes];
        return Encoding.UTF8.TryGetBytes(text, bytes, out var length) && StrictNumber.TryRead(bytes[..length], decimalMark, out var number)
            ? number
            : null;
    }
}
