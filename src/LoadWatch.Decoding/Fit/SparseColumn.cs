namespace LoadWatch.Decoding.Fit;

/// <summary>One value per row in blocks; a block in which nothing was set takes no memory.</summary>
internal sealed class SparseColumn<T>(T missing, int bytesPerValue, MemoryBudget budget)
    where T : struct
{
    private const int BlockBits = 10;
    private const int BlockRows = 1 << BlockBits;
    private readonly List<T[]?> blocks = [];

    public T this[int row] => Block(row) is { } block ? block[row & (BlockRows - 1)] : missing;

    public bool IsEmpty => blocks.Count == 0;

    public void Set(int row, T value) => (Block(row) ?? Allocate(row))[row & (BlockRows - 1)] = value;

    private T[]? Block(int row) => row >> BlockBits is var index && index < blocks.Count ? blocks[index] : null;

    private T[] Allocate(int row)
    {
        var index = row >> BlockBits;
        while (blocks.Count <= index)
            blocks.Add(null);

        var block = new T[BlockRows];
        Array.Fill(block, missing);
        budget.Spend((long)BlockRows * bytesPerValue);
        return blocks[index] = block;
    }
}
