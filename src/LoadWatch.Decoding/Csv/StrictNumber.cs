using System.Globalization;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Numbers of a CSV cell: an optional sign, digits, optionally one decimal mark with digits behind it, optionally an exponent. No thousands
/// marks, blanks inside, hexadecimal, NaN or infinity, so that 1.234 is never read as 1234.
/// </summary>
internal static class StrictNumber
{
    private const int LongestBytes = 64;

    /// <summary>False for anything else, and for what no double can hold.</summary>
    public static bool TryRead(ReadOnlySpan<byte> cell, char decimalMark, out double value)
    {
        value = 0;
        Span<byte> plain = stackalloc byte[LongestBytes];
        if (cell.Length > LongestBytes || !Follows(cell, (byte)decimalMark))
        {
            return false;
        }

        cell.CopyTo(plain);
        plain = plain[..cell.Length];
        plain.Replace((byte)',', (byte)'.');
        return double.TryParse(plain, NumberStyles.Float, CultureInfo.InvariantCulture, out value) && double.IsFinite(value);
    }

    private static bool Follows(ReadOnlySpan<byte> cell, byte decimalMark)
    {
        var rest = AfterSign(cell);
        if (!TakeDigits(ref rest))
        {
            return false;
        }

        if (!rest.IsEmpty && rest[0] == decimalMark)
        {
            rest = rest[1..];
            if (!TakeDigits(ref rest))
            {
                return false;
            }
        }

        if (!rest.IsEmpty && rest[0] is (byte)'e' or (byte)'E')
        {
            rest = AfterSign(rest[1..]);
            return TakeDigits(ref rest) && rest.IsEmpty;
        }

        return rest.IsEmpty;
    }

    private static ReadOnlySpan<byte> AfterSign(ReadOnlySpan<byte> text) =>
        !text.IsEmpty && text[0] is (byte)'+' or (byte)'-' ? text[1..] : text;

    private static bool TakeDigits(ref ReadOnlySpan<byte> text)
    {
        var end = text.IndexOfAnyExceptInRange((byte)'0', (byte)'9');
        var digits = end < 0 ? text.Length : end;
        text = text[digits..];
        return digits > 0;
    }
}
