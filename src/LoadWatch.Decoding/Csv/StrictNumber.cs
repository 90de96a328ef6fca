using System.Globalization;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Numbers of a CSV cell: an optional sign, digits, optionally one decimal mark with digits behind it, optionally an exponent. No thousands
/// marks, blanks inside, hexadecimal, NaN or infinity, so that 1.234 is never read as 1234.
/// </summary>
internal static class StrictNumber
{
    private const int LongestBytes = 64;

    /// <summary>So many digits make a whole number that a double holds exactly.</summary>
    private const int ExactDigits = 15;

    private static readonly double[] PowersOfTen = [1, 1e1, 1e2, 1e3, 1e4, 1e5, 1e6, 1e7, 1e8, 1e9, 1e10, 1e11, 1e12, 1e13, 1e14];

    /// <summary>False for anything else, and for what no double can hold.</summary>
    public static bool TryRead(ReadOnlySpan<byte> cell, char decimalMark, out double value) =>
        TryReadPlain(cell, (byte)decimalMark, out value) || TryReadAny(cell, decimalMark, out value);

    /// <summary>Few digits without sign and exponent: one division of two exact numbers, which rounds as reading the text would.</summary>
    private static bool TryReadPlain(ReadOnlySpan<byte> cell, byte decimalMark, out double value)
    {
        var (digits, mark) = (0L, -1);
        value = 0;
        for (var at = 0; at < cell.Length && at <= ExactDigits; at++)
        {
            if (cell[at] == decimalMark && mark < 0)
            {
                mark = at;
            }
            else if (cell[at] is >= (byte)'0' and <= (byte)'9')
            {
                digits = (digits * 10) + (cell[at] - '0');
            }
            else
            {
                return false;
            }
        }

        var behind = mark < 0 ? 0 : cell.Length - 1 - mark;
        value = digits / PowersOfTen[Math.Min(behind, ExactDigits - 1)];
        return cell.Length is > 0 and <= ExactDigits && mark != 0 && mark != cell.Length - 1;
    }

    private static bool TryReadAny(ReadOnlySpan<byte> cell, char decimalMark, out double value)
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
