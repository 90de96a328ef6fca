using System.Buffers;

namespace LoadWatch.Decoding.Fit;

/// <summary>A list whose memory is lent and goes back at the end.</summary>
internal sealed class PooledList<T>
    where T : struct
{
    private const int First = 256;
    private T[] items = [];

    public int Count { get; private set; }

    public ReadOnlySpan<T> Items => items.AsSpan(0, Count);

    public void Add(T item)
    {
        if (Count == items.Length)
            Grow(Count + 1);

        items[Count++] = item;
    }

    public void AddRange(ReadOnlySpan<T> more)
    {
        if (Count + more.Length > items.Length)
            Grow(Count + more.Length);

        more.CopyTo(items.AsSpan(Count));
        Count += more.Length;
    }

    /// <summary>Gives the memory back; the list is empty then.</summary>
    public void Return()
    {
        if (items.Length > 0)
            ArrayPool<T>.Shared.Return(items);

        (items, Count) = ([], 0);
    }

    private void Grow(int least)
    {
        var larger = ArrayPool<T>.Shared.Rent(Math.Max(First, Math.Max(least, items.Length * 2)));
        Items.CopyTo(larger);
        if (items.Length > 0)
            ArrayPool<T>.Shared.Return(items);

        items = larger;
    }
}
