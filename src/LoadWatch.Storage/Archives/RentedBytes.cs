using System.Buffers;

namespace LoadWatch.Storage.Archives;

/// <summary>Bytes of one file in memory that the next file uses again. A large file has memory of its own, so that no more than it needs is held.</summary>
internal sealed class RentedBytes : IDisposable
{
    private const int LargestRented = 1024 * 1024;

    private byte[] bytes;
    private bool isRented;

    /// <param name="expected">As many bytes as are likely to come; more may.</param>
    public RentedBytes(int expected)
    {
        // One more than expected, so that the end is seen without growing.
        bytes = Get(expected + 1);
    }

    public int Length { get; private set; }

    /// <exception cref="ObjectDisposedException">The memory is given back.</exception>
    public ReadOnlyMemory<byte> Memory
    {
        get
        {
            ObjectDisposedException.ThrowIf(bytes.Length == 0, this);
            return bytes.AsMemory(0, Length);
        }
    }

    /// <summary>Where the next bytes may be put.</summary>
    /// <param name="atMost">No more than these.</param>
    public Span<byte> Free(int atMost)
    {
        if (Length == bytes.Length)
        {
            Grow();
        }

        return bytes.AsSpan(Length, Math.Min(atMost, bytes.Length - Length));
    }

    /// <summary>Takes over what was put where there was free space.</summary>
    public ReadOnlySpan<byte> Took(int count)
    {
        var piece = bytes.AsSpan(Length, count);
        Length += count;
        return piece;
    }

    /// <summary>The next bytes are put where these are.</summary>
    public void Forget() => Length = 0;

    public void Dispose()
    {
        if (isRented)
        {
            ArrayPool<byte>.Shared.Return(bytes);
        }

        (bytes, isRented) = ([], false);
    }

    private void Grow()
    {
        var (old, wasRented) = (bytes, isRented);
        bytes = Get((int)Math.Min(2L * Math.Max(old.Length, 1), Array.MaxLength));
        old.AsSpan(0, Length).CopyTo(bytes);
        if (wasRented)
        {
            ArrayPool<byte>.Shared.Return(old);
        }
    }

    private byte[] Get(int length)
    {
        isRented = length <= LargestRented;
        return isRented ? ArrayPool<byte>.Shared.Rent(length) : GC.AllocateUninitializedArray<byte>(length);
    }
}
