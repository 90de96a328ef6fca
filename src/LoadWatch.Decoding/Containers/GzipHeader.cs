namespace LoadWatch.Decoding.Containers;

/// <summary>The header of a gzip member (RFC 1952, section 2.3).</summary>
internal static class GzipHeader
{
    private const int FixedLength = 10;
    private const int HeaderCrc = 0x02;
    private const int Extra = 0x04;
    private const int Name = 0x08;
    private const int Comment = 0x10;
    private const int Reserved = 0xE0;

    public static bool StartsAt(ReadOnlySpan<byte> bytes, int start) => bytes[start..] is [0x1F, 0x8B, 0x08, ..];

    /// <summary>Where the packed data begins, or null with the reason.</summary>
    public static int? End(ReadOnlySpan<byte> bytes, int start, out string? reason)
    {
        reason = StartsAt(bytes, start) ? "the gzip header is cut" : "not a gzip header";
        if (!StartsAt(bytes, start) || bytes.Length - start < FixedLength)
        {
            return null;
        }

        var flags = bytes[start + 3];
        if ((flags & Reserved) != 0)
        {
            reason = "the gzip header sets reserved flags";
            return null;
        }

        int? end = start + FixedLength;
        end = (flags & Extra) != 0 ? AfterExtra(bytes, end) : end;
        end = (flags & Name) != 0 ? AfterText(bytes, end) : end;
        end = (flags & Comment) != 0 ? AfterText(bytes, end) : end;
        end = (flags & HeaderCrc) != 0 ? AfterCrc(bytes, start, end, ref reason) : end;
        reason = end <= bytes.Length ? null : reason;
        return end <= bytes.Length ? end : null;
    }

    private static int? AfterExtra(ReadOnlySpan<byte> bytes, int? at) =>
        at is { } start && start + 2 <= bytes.Length ? start + 2 + bytes[start] + (bytes[start + 1] << 8) : null;

    private static int? AfterText(ReadOnlySpan<byte> bytes, int? at)
    {
        var length = at is { } start && start <= bytes.Length ? bytes[start..].IndexOf((byte)0) : -1;
        return length < 0 ? null : at + length + 1;
    }

    private static int? AfterCrc(ReadOnlySpan<byte> bytes, int start, int? at, ref string? reason)
    {
        if (at is not { } end || end + 2 > bytes.Length)
        {
            return null;
        }

        if ((Crc32.Of(bytes[start..end]) & 0xFFFF) == bytes[end] + ((uint)bytes[end + 1] << 8))
        {
            return end + 2;
        }

        reason = "the CRC of the gzip header does not fit";
        return null;
    }
}
