namespace LoadWatch.Decoding.Containers;

/// <summary>
/// A read-only stream over a stretch of packed bytes that knows how far it was read, since the inflating stream does not say where it
/// stopped.
/// </summary>
internal sealed class PackedBytes(ReadOnlyMemory<byte> bytes) : Stream
{
    /// <summary>Where the last read began. The packed data ends behind it, but for the few bytes that the inflater may hold back.</summary>
    public int LastRead { get; private set; }

    /// <summary>Bytes handed out so far.</summary>
    public int Handed { get; private set; }

    public override bool CanRead => true;

    public override bool CanSeek => false;

    public override bool CanWrite => false;

    public override long Length => throw new NotSupportedException();

    public override long Position
    {
        get => throw new NotSupportedException();
        set => throw new NotSupportedException();
    }

    public override int Read(Span<byte> buffer)
    {
        var count = Math.Min(buffer.Length, bytes.Length - Handed);
        bytes.Span.Slice(Handed, count).CopyTo(buffer);
        LastRead = count == 0 ? LastRead : Handed;
        Handed += count;
        return count;
    }

    public override int Read(byte[] buffer, int offset, int count) => Read(buffer.AsSpan(offset, count));

    public override void Flush()
    {
    }

    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    public override void SetLength(long value) => throw new NotSupportedException();

    public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();
}
