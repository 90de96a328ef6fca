namespace LoadWatch.Decoding.Csv;

/// <summary>Hands the bytes of a stream on and remembers whether a NUL was among them, so that rows need not be searched for one.</summary>
internal sealed class NulWatch(Stream inner) : ForwardStream
{
    public bool HasSeenNul { get; private set; }

    public override int Read(Span<byte> buffer)
    {
        var count = inner.Read(buffer);
        HasSeenNul = HasSeenNul || buffer[..count].Contains((byte)0);
        return count;
    }

    protected override void Dispose(bool disposing)
    {
        if (disposing)
        {
            inner.Dispose();
        }

        base.Dispose(disposing);
    }
}
