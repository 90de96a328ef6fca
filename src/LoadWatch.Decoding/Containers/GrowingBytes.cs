namespace LoadWatch.Decoding.Containers;

/// <summary>A buffer that doubles as it fills.</summary>
internal sealed class GrowingBytes(int firstCapacity)
{
    private const int RoomAtLeast = 4096;

    private byte[] buffer = new byte[firstCapacity];

    public int Length { get; private set; }

    /// <summary>Room to write into; never empty.</summary>
    public Span<byte> Free()
    {
        if (Length == buffer.Length)
        {
            Array.Resize(ref buffer, Math.Max(RoomAtLeast, buffer.Length * 2));
        }

        return buffer.AsSpan(Length);
    }

    public void Advance(int count) => Length += count;

    public ReadOnlySpan<byte> From(int start) => buffer.AsSpan(start, Length - start);

    public ReadOnlyMemory<byte> ToMemory() => buffer.AsMemory(0, Length);
}
