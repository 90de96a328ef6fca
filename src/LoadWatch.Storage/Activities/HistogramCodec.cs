using LoadWatch.Activities;

namespace LoadWatch.Storage.Activities;

/// <summary>
/// A histogram as bytes: for each bin, ascending, its distance from the bin before (the first from 0) and its milliseconds, both in groups of
/// seven bits, lowest first, the high bit saying that more follow. Distances are folded so that a negative first bin is short too.
/// </summary>
public static class HistogramCodec
{
    private const int LongestNumber = 10;

    public static byte[] Write(Histogram histogram)
    {
        var bytes = new List<byte>();
        var before = 0L;
        foreach (var (bin, milliseconds) in histogram.Bins)
        {
            var distance = bin - before;
            Append(bytes, unchecked((ulong)((distance << 1) ^ (distance >> 63))));
            Append(bytes, (ulong)milliseconds);
            before = bin;
        }

        return [.. bytes];
    }

    /// <exception cref="InvalidDataException">The bytes were not written by <see cref="Write"/>.</exception>
    public static Histogram Read(ReadOnlySpan<byte> bytes)
    {
        var histogram = new Histogram();
        var bin = 0L;
        while (!bytes.IsEmpty)
        {
            var folded = Next(ref bytes);
            var distance = (long)(folded >> 1) ^ -(long)(folded & 1);
            var milliseconds = Next(ref bytes);
            bin = unchecked(bin + distance);
            if (bin is < int.MinValue or > int.MaxValue || milliseconds is 0 or > long.MaxValue)
            {
                throw Damaged();
            }

            histogram.Add((int)bin, (long)milliseconds);
        }

        return histogram;
    }

    private static void Append(List<byte> bytes, ulong number)
    {
        for (; number >= 0x80; number >>= 7)
        {
            bytes.Add((byte)((number & 0x7F) | 0x80));
        }

        bytes.Add((byte)number);
    }

    private static ulong Next(ref ReadOnlySpan<byte> bytes)
    {
        var number = 0UL;
        for (var at = 0; at < bytes.Length && at < LongestNumber; at++)
        {
            number |= (ulong)(bytes[at] & 0x7F) << (7 * at);
            if (bytes[at] < 0x80)
            {
                bytes = bytes[(at + 1)..];
                return number;
            }
        }

        throw Damaged();
    }

    private static InvalidDataException Damaged() => new("no histogram: its bytes are damaged");
}
