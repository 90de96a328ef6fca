using System.Buffers;
using System.Runtime.CompilerServices;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// One value per row in blocks, set from the first row to the last; a block in which nothing was set takes no memory. Blocks are lent and go back at the end.
/// </summary>
internal sealed class SparseColumn<T>(T missing, MemoryBudget budget)
    where T : struct
{
    private const int BlockBits = 11;
    private const int BlockRows = 1 << BlockBits;
    private readonly List<T[]?> blocks = [];
    private T[] current = [];
    private int currentIndex = -1;

    /// <summary>Rows of the current block that hold something; those behind them are whatever the block held before.</summary>
    private int written;

    public T this[int row]
    {
        get
        {
            var (index, place) = (row >> BlockBits, row & (BlockRows - 1));
            return Block(index) is { } block && place < Written(index) ? block[place] : missing;
        }
    }

    public bool IsEmpty => blocks.Count == 0;

    /// <param name="row">Not before a row that was set.</param>
    public void Set(int row, T value)
    {
        if (row >> BlockBits != currentIndex)
            Enter(row >> BlockBits);

        var place = row & (BlockRows - 1);
        if (place > written)
            current.AsSpan(written, place - written).Fill(missing);

        current[place] = value;
        written = place + 1;
    }

    /// <summary>Copies the rows from <paramref name="first"/> on.</summary>
    public void CopyTo(int first, Span<T> values)
    {
        while (!values.IsEmpty)
        {
            var (index, start) = (first >> BlockBits, first & (BlockRows - 1));
            var count = Math.Min(values.Length, BlockRows - start);
            var held = Block(index) is null ? 0 : Math.Clamp(Written(index) - start, 0, count);
            if (held > 0)
                Block(index).AsSpan(start, held).CopyTo(values);

            values[held..count].Fill(missing);
            first += count;
            values = values[count..];
        }
    }

    /// <summary>Gives the blocks back; the column is empty then.</summary>
    public void Return()
    {
        foreach (var block in blocks)
        {
            if (block is not null)
                ArrayPool<T>.Shared.Return(block);
        }

        blocks.Clear();
        (current, currentIndex, written) = ([], -1, 0);
    }

    private T[]? Block(int index) => index < blocks.Count ? blocks[index] : null;

    private int Written(int index) => index == currentIndex ? written : BlockRows;

    private void Enter(int index)
    {
        if (currentIndex >= 0)
            current.AsSpan(written, BlockRows - written).Fill(missing);

        while (blocks.Count <= index)
            blocks.Add(null);

        current = blocks[index] ??= Lend();
        (currentIndex, written) = (index, 0);
    }

    /// <summary>The first block goes from part to part, however many they are.</summary>
    private T[] Lend()
    {
        budget.Spend(currentIndex < 0 ? 0 : (long)BlockRows * Unsafe.SizeOf<T>());
        return ArrayPool<T>.Shared.Rent(BlockRows);
    }
}
