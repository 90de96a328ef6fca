namespace LoadWatch.Decoding.Containers;

/// <summary>
/// A read-only stream over a stretch of packed bytes that knows how far it was read, since the inflating stream does not say where it
/// stopped.
/// </summary>
internal sealed class PackedBytes(ReadOnlyMemory<byte> bytes) : ForwardStream
{
    /// <summary>Where the last read began. The packed data ends behind it, but for the few bytes that the inflater may hold back.</summary>
    public int LastRead { get; private set; }

    /// <summary>Bytes handed out so far.</summary>
    public int Handed { get; private set; }

    public override int Read(Span<byte> buffer)
    {
        var count = Math.Min(buffer.Length, bytes.Length - Handed);
        bytes.Span.Slice(Handed, count).CopyTo(buffer);
        LastRead = count == 0 ? LastRead : Handed;
        Handed += count;
        return count;
    }
}
