using System.Text;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Csv;

/// <summary>What a cell said: an instant, with the offset if one was written, or a local time that a zone must place.</summary>
internal readonly record struct WrittenTime(Instant? Instant, Offset? Offset, LocalDateTime Local);

/// <summary>One way of writing a moment.</summary>
internal abstract class TimeNotation
{
    private readonly byte[] lastCell = new byte[64];
    private int lastLength;
    private WrittenTime last;

    /// <summary>What makes a format unusable, to be put behind the key's name, or null.</summary>
    public static string? Complaint(string format) => format switch
    {
        CsvTimeColumn.Iso8601 or CsvTimeColumn.UnixSeconds or CsvTimeColumn.UnixMilliseconds => null,
        CsvTimeColumn.SecondsFromStart => "seconds_from_start is no notation of a moment",
        _ => PatternNotation.Complain(format),
    };

    /// <param name="format">One without a <see cref="Complaint"/>.</param>
    /// <param name="decimalMark">The mark of numbers in this file.</param>
    public static TimeNotation Of(string format, char decimalMark) => format switch
    {
        CsvTimeColumn.Iso8601 => new IsoNotation(),
        CsvTimeColumn.UnixSeconds => new UnixNotation(1000, decimalMark),
        CsvTimeColumn.UnixMilliseconds => new UnixNotation(1, decimalMark),
        _ => new PatternNotation(format),
    };

    /// <summary>What a cell says. Rows of many people stand moment by moment, so the last cell is kept: most say the same.</summary>
    public bool TryRead(ReadOnlySpan<byte> cell, out WrittenTime time)
    {
        if (lastLength > 0 && cell.SequenceEqual(lastCell.AsSpan(0, lastLength)))
        {
            time = last;
            return true;
        }

        var found = TryReadNew(cell, out time);
        last = time;
        lastLength = found && cell.TryCopyTo(lastCell) ? cell.Length : 0;
        return found;
    }

    protected abstract bool TryReadNew(ReadOnlySpan<byte> cell, out WrittenTime time);

    /// <summary>Only the years 1 to 9998, so that an offset, a zone or a year from the start never leads out of the calendar.</summary>
    private static bool IsPlaceable(LocalDateTime local) => local.Year is >= 1 and <= 9998;

    protected static string Text(ReadOnlySpan<byte> cell) => cell.Length > 128 ? "" : Encoding.UTF8.GetString(cell);

    protected static bool TryRead(OffsetDateTimePattern pattern, string text, bool offsetStated, out WrittenTime time)
    {
        var found = pattern.Parse(text).TryGetValue(default, out var value) && IsPlaceable(value.LocalDateTime);
        time = found ? new(value.ToInstant(), offsetStated ? value.Offset : null, default) : default;
        return found;
    }

    protected static bool TryRead(LocalDateTimePattern pattern, string text, out WrittenTime time)
    {
        var found = pattern.Parse(text).TryGetValue(default, out var value) && IsPlaceable(value);
        time = new(null, null, value);
        return found;
    }
}

/// <summary>Seconds or milliseconds since 1970-01-01T00:00:00Z.</summary>
internal sealed class UnixNotation(double millisecondsPerUnit, char decimalMark) : TimeNotation
{
    // The years 1 to 9998 again.
    private const double Earliest = -62_135_596_800_000;
    private const double Latest = 253_370_764_799_999;

    protected override bool TryReadNew(ReadOnlySpan<byte> cell, out WrittenTime time)
    {
        time = default;
        if (!StrictNumber.TryRead(cell, decimalMark, out var number) || Milliseconds(number) is not { } milliseconds)
        {
            return false;
        }

        time = new(Instant.FromUnixTimeMilliseconds(milliseconds), null, default);
        return true;
    }

    private long? Milliseconds(double number)
    {
        var milliseconds = Math.Round(number * millisecondsPerUnit);
        return milliseconds is >= Earliest and <= Latest ? (long)milliseconds : null;
    }
}

/// <summary>
/// ISO 8601, extended format with seconds, a fraction after a full stop or comma, with <c>Z</c>, an offset, or neither; a blank may stand
/// for the T.
/// <c>Z</c> states UTC, not the offset of the place. A leap second is read as the second before it.
/// </summary>
internal sealed class IsoNotation : TimeNotation
{
    private const string Moment = "uuuu'-'MM'-'dd'T'HH':'mm':'ss;FFFFFFFFF";
    private const int DateLength = 10;
    private const int MinutesAt = 14;
    private const string LeapSecond = "59:60";

    private static readonly LocalDateTimePattern Local = LocalDateTimePattern.CreateWithInvariantCulture(Moment);
    private static readonly OffsetDateTimePattern LongOffset = OffsetDateTimePattern.CreateWithInvariantCulture(Moment + "o<Z+HH:mm>");
    private static readonly OffsetDateTimePattern[] ShortOffsets =
    [
        OffsetDateTimePattern.CreateWithInvariantCulture(Moment + "o<+HHmm>"),
        OffsetDateTimePattern.CreateWithInvariantCulture(Moment + "o<+HH>"),
    ];

    private readonly IsoDigits usual = new();

    protected override bool TryReadNew(ReadOnlySpan<byte> cell, out WrittenTime time) => usual.TryRead(cell, out time) || TryReadAny(cell, out time);

    private static bool TryReadAny(ReadOnlySpan<byte> cell, out WrittenTime time)
    {
        var text = Text(cell);
        if (text.Length <= DateLength)
        {
            time = default;
            return false;
        }

        if (text[DateLength] == ' ')
        {
            text = string.Concat(text.AsSpan(0, DateLength), "T", text.AsSpan(DateLength + 1));
        }

        if (text.AsSpan(Math.Min(MinutesAt, text.Length)).StartsWith(LeapSecond, StringComparison.Ordinal))
        {
            text = string.Concat(text.AsSpan(0, MinutesAt), "59:59", text.AsSpan(MinutesAt + LeapSecond.Length));
        }

        return text.AsSpan(DateLength).ContainsAny("Z+-") ? TryReadOffset(text, out time) : TryRead(Local, text, out time);
    }

    private static bool TryReadOffset(string text, out WrittenTime time)
    {
        if (TryRead(LongOffset, text, offsetStated: !text.EndsWith('Z'), out time))
        {
            return true;
        }

        foreach (var pattern in ShortOffsets)
        {
            if (TryRead(pattern, text, offsetStated: true, out time))
            {
                return true;
            }
        }

        return false;
    }
}

/// <summary>A NodaTime pattern of a date and time, with an offset where it holds <c>o&lt;...&gt;</c>.</summary>
internal sealed class PatternNotation : TimeNotation
{
    private readonly LocalDateTimePattern? local;
    private readonly OffsetDateTimePattern? withOffset;
    private readonly MomentDigits? usual;

    public PatternNotation(string format)
    {
        if (HoldsOffset(format))
        {
            withOffset = OffsetDateTimePattern.CreateWithInvariantCulture(format);
        }
        else
        {
            local = LocalDateTimePattern.CreateWithInvariantCulture(format);
            usual = MomentDigits.Of(format);
        }
    }

    /// <summary>
    /// Writes a moment of an afternoon and reads it again: a pattern that loses the year or the half of the day does not give it back.
    /// </summary>
    public static string? Complain(string format)
    {
        try
        {
            var probe = new LocalDateTime(2026, 10, 17, 15, 42);
            var back = HoldsOffset(format)
                ? Back(OffsetDateTimePattern.CreateWithInvariantCulture(format), probe.WithOffset(Offset.FromHours(3)))?.LocalDateTime
                : Back(LocalDateTimePattern.CreateWithInvariantCulture(format), probe);
            return back == probe ? null : $"'{format}' does not hold a full date and time";
        }
        catch (InvalidPatternException wrong)
        {
            return $"'{format}' is not a pattern: {wrong.Message}";
        }
    }

    protected override bool TryReadNew(ReadOnlySpan<byte> cell, out WrittenTime time)
    {
        if (usual is not null && usual.TryRead(cell, out var read))
        {
            time = new(null, null, read);
            return true;
        }

        return withOffset is not null ? TryRead(withOffset, Text(cell), offsetStated: true, out time) : TryRead(local!, Text(cell), out time);
    }

    private static bool HoldsOffset(string format) => format.Contains("o<", StringComparison.Ordinal);

    private static T? Back<T>(IPattern<T> pattern, T probe)
        where T : struct => pattern.Parse(pattern.Format(probe)).TryGetValue(default, out var value) ? value : null;
}
