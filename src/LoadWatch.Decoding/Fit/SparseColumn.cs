using System.Buffers;

namespace LoadWatch.Decoding.Fit;

/// <summary>One value per row in blocks; a block in which nothing was set takes no memory. Blocks are lent and go back at the end.</summary>
internal sealed class SparseColumn<T>(T missing, int bytesPerValue, MemoryBudget budget)
    where T : struct
{
    private const int BlockBits = 11;
    private const int BlockRows = 1 << BlockBits;
    private readonly List<T[]?> blocks = [];
    private T[] current = [];
    private int currentIndex = -1;

    public T this[int row] => Block(row >> BlockBits) is { } block ? block[row & (BlockRows - 1)] : missing;

    public bool IsEmpty => blocks.Count == 0;

    public void Set(int row, T value)
    {
        if (row >> BlockBits != currentIndex)
            Enter(row >> BlockBits);

        current[row & (BlockRows - 1)] = value;
    }

    /// <summary>Copies the rows from <paramref name="first"/> on.</summary>
    public void CopyTo(int first, Span<T> values)
    {
        while (!values.IsEmpty)
        {
            var start = first & (BlockRows - 1);
            var count = Math.Min(values.Length, BlockRows - start);
            if (Block(first >> BlockBits) is { } block)
                block.AsSpan(start, count).CopyTo(values);
            else
                values[..count].Fill(missing);

            first += count;
            values = values[count..];
        }
    }

    /// <summary>Gives the blocks back; the column is empty then.</summary>
    public void Return()
    {
        foreach (var block in blocks.OfType<T[]>())
            ArrayPool<T>.Shared.Return(block);

        blocks.Clear();
        (current, currentIndex) = ([], -1);
    }

    private T[]? Block(int index) => index < blocks.Count ? blocks[index] : null;

    private void Enter(int index)
    {
        while (blocks.Count <= index)
            blocks.Add(null);

        current = blocks[index] ??= Lend();
        currentIndex = index;
    }

    private T[] Lend()
    {
        var block = ArrayPool<T>.Shared.Rent(BlockRows);
        Array.Fill(block, missing);
        budget.Spend((long)BlockRows * bytesPerValue);
        return block;
    }
}
