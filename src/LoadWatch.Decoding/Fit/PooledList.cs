using System.Buffers;
using System.Runtime.CompilerServices;

namespace LoadWatch.Decoding.Fit;

/// <summary>A list in blocks, so that nothing of it is there twice while it grows. Its memory is lent and goes back at the end.</summary>
internal sealed class PooledList<T>
{
    private const int BlockItems = 512;
    private readonly List<T[]> blocks = [];

    public int Count { get; private set; }

    public ref readonly T this[int index] => ref blocks[index / BlockItems][index % BlockItems];

    public void Add(T item)
    {
        if (Count == blocks.Count * BlockItems)
            blocks.Add(ArrayPool<T>.Shared.Rent(BlockItems));

        blocks[^1][Count++ % BlockItems] = item;
    }

    public void AddRange(PooledList<T> more)
    {
        for (var i = 0; i < more.Count; i++)
            Add(more[i]);
    }

    /// <summary>Gives the memory back; the list is empty then.</summary>
    public void Return()
    {
        foreach (var block in blocks)
            ArrayPool<T>.Shared.Return(block, RuntimeHelpers.IsReferenceOrContainsReferences<T>());

        blocks.Clear();
        Count = 0;
    }
}
