using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>
/// Reads moments written in digits at fixed places, as most exports write them, without making a text of the cell. What it does not read may still be
/// right: the pattern itself decides.
/// </summary>
internal sealed class MomentDigits
{
    private const string Letters = "yMdHmsf";
    private const int Fraction = 6;
    private const int FractionDigitsAtMost = 9;

    // By place in the cell: the number that a digit there belongs to, or -1 and the mark that stands there.
    private readonly (int Part, byte Mark)[] places;
    private readonly int nanosecondsPerFraction;
    private readonly int[] parts = new int[Letters.Length];
    private int dateKey = -1;
    private LocalDate date;

    private MomentDigits(string plain)
    {
        places = [.. plain.Select(c => (Letters.IndexOf(c, StringComparison.Ordinal), (byte)c))];
        nanosecondsPerFraction = (int)Math.Pow(10, FractionDigitsAtMost - plain.Count(c => c == Letters[Fraction]));
    }

    /// <summary>Null for a pattern with anything but a four-digit year, two-digit numbers, a fraction and marks between them.</summary>
    public static MomentDigits? Of(string pattern)
    {
        var plain = pattern.Replace("'", "", StringComparison.Ordinal).Replace('u', 'y');
        var fraction = plain.Count(c => c == Letters[Fraction]);
        string[] groups = ["yyyy", "MM", "dd", "HH", "mm", "ss", new('f', fraction)];
        return fraction <= FractionDigitsAtMost
            && plain.Count(char.IsLetter) - plain.Count(c => c == 'T') == groups.Sum(group => group.Length)
            && Array.TrueForAll(groups, group => plain.Contains(group, StringComparison.Ordinal))
            && plain.All(c => char.IsAsciiLetter(c) || c is '-' or '/' or ':' or '.' or ' ')
                ? new MomentDigits(plain)
                : null;
    }

    /// <summary>False where the cell has another shape, or says what no calendar has.</summary>
    public bool TryRead(ReadOnlySpan<byte> cell, out LocalDateTime time)
    {
        time = default;
        if (cell.Length != places.Length || !TakeParts(cell) || parts is not [>= 1 and <= 9998, >= 1 and <= 12, >= 1 and <= 31, <= 23, <= 59, <= 59, _] || !TakeDate())
        {
            return false;
        }

        var seconds = (((parts[3] * 60) + parts[4]) * 60) + parts[5];
        time = date.At(LocalTime.FromNanosecondsSinceMidnight((seconds * NodaConstants.NanosecondsPerSecond) + ((long)parts[Fraction] * nanosecondsPerFraction)));
        return true;
    }

    private bool TakeParts(ReadOnlySpan<byte> cell)
    {
        Array.Clear(parts);
        for (var at = 0; at < cell.Length; at++)
        {
            var (part, mark) = places[at];
            var digit = cell[at] - '0';
            if (part < 0 ? cell[at] != mark : digit is < 0 or > 9)
            {
                return false;
            }

            if (part >= 0)
            {
                parts[part] = (parts[part] * 10) + digit;
            }
        }

        return true;
    }

    /// <summary>Rows of one day follow each other.</summary>
    private bool TakeDate()
    {
        var key = (parts[0] * 10_000) + (parts[1] * 100) + parts[2];
        if (key == dateKey)
        {
            return true;
        }

        if (parts[2] > CalendarSystem.Iso.GetDaysInMonth(parts[0], parts[1]))
        {
            return false;
        }

        (dateKey, date) = (key, new LocalDate(parts[0], parts[1], parts[2]));
        return true;
    }
}
