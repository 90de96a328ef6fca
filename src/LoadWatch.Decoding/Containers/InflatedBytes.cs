namespace LoadWatch.Decoding.Containers;

/// <summary>What an inflater gives: kept in a buffer of a fixed size, or only counted. Either way the member under way has its CRC-32.</summary>
internal sealed class InflatedBytes
{
    private const int CountedAtOnce = 64 * 1024;

    private readonly byte[] buffer;
    private readonly bool isKept;
    private int memberStart;
    private uint crc;

    private InflatedBytes(int capacity, bool isKept)
    {
        buffer = new byte[capacity];
        this.isKept = isKept;
    }

    /// <summary>Of all members.</summary>
    public int Length { get; private set; }

    public int MemberLength => Length - memberStart;

    public uint MemberCrc => Crc32.End(crc);

    /// <summary>There is no room for another byte, so that nothing can tell whether one would come.</summary>
    public bool IsFull => isKept && Length == buffer.Length;

    public static InflatedBytes Kept(int capacity) => new(capacity, isKept: true);

    public static InflatedBytes Counted() => new(CountedAtOnce, isKept: false);

    public void BeginMember()
    {
        memberStart = Length;
        crc = Crc32.Begin;
    }

    public Span<byte> Free() => isKept ? buffer.AsSpan(Length) : buffer;

    public void Advance(int count)
    {
        crc = Crc32.Continue(crc, Free()[..count]);
        Length += count;
    }

    public ReadOnlyMemory<byte> ToMemory() => buffer.AsMemory(0, Length);
}
