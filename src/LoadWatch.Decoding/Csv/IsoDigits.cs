using NodaTime;

namespace LoadWatch.Decoding.Csv;

/// <summary>The same for the usual writings of ISO 8601: with a fraction or none, with <c>Z</c>, an offset of hours and minutes, or neither.</summary>
internal sealed class IsoDigits
{
    private const int WholeSeconds = 19;
    private const int SeparatorAt = 10;
    private const int OffsetLength = 6;

    private readonly MomentDigits joined = MomentDigits.Of("yyyy-MM-ddTHH:mm:ss")!;
    private readonly MomentDigits apart = MomentDigits.Of("yyyy-MM-dd HH:mm:ss")!;

    public bool TryRead(ReadOnlySpan<byte> cell, out WrittenTime time)
    {
        time = default;
        if (cell.Length < WholeSeconds || !(cell[SeparatorAt] == ' ' ? apart : joined).TryRead(cell[..WholeSeconds], out var local))
        {
            return false;
        }

        var rest = cell[WholeSeconds..];
        if (!TakeFraction(ref rest, out var nanoseconds))
        {
            return false;
        }

        local = nanoseconds == 0 ? local : local.PlusNanoseconds(nanoseconds);
        switch (rest)
        {
            case []:
                time = new(null, null, local);
                return true;
            case [(byte)'Z']:
                time = new(local.WithOffset(Offset.Zero).ToInstant(), null, default);
                return true;
            default:
                return TryWithOffset(rest, local, out time);
        }
    }

    private static bool TakeFraction(ref ReadOnlySpan<byte> rest, out long nanoseconds)
    {
        nanoseconds = 0;
        if (rest is not [(byte)'.' or (byte)',', ..])
        {
            return true;
        }

        var at = 1;
        var unit = NodaConstants.NanosecondsPerSecond;
        for (; at < rest.Length && rest[at] is >= (byte)'0' and <= (byte)'9' && unit > 1; at++)
        {
            unit /= 10;
            nanoseconds += (rest[at] - '0') * unit;
        }

        rest = rest[at..];
        return at > 1;
    }

    private static bool TryWithOffset(ReadOnlySpan<byte> rest, LocalDateTime local, out WrittenTime time)
    {
        time = default;
        if (rest.Length != OffsetLength || rest[0] is not ((byte)'+' or (byte)'-') || rest[3] != ':')
        {
            return false;
        }

        var (hours, minutes) = (Two(rest[1..]), Two(rest[4..]));
        if (hours is < 0 or > 17 || minutes is < 0 or > 59)
        {
            return false;
        }

        var offset = Offset.FromHoursAndMinutes(rest[0] == '-' ? -hours : hours, rest[0] == '-' ? -minutes : minutes);
        time = new(local.WithOffset(offset).ToInstant(), offset, default);
        return true;
    }

    /// <summary>Two digits as a number, or -1.</summary>
    private static int Two(ReadOnlySpan<byte> digits) =>
        digits[0] is >= (byte)'0' and <= (byte)'9' && digits[1] is >= (byte)'0' and <= (byte)'9' ? ((digits[0] - '0') * 10) + digits[1] - '0' : -1;
}
