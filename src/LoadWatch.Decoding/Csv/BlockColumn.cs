namespace LoadWatch.Decoding.Csv;

/// <summary>
/// One value per row, in blocks that are larger the more rows there are; a block in which nothing was set takes no memory, and nothing is ever
/// moved while it grows.
/// </summary>
internal sealed class BlockColumn<T>(T missing)
{
    private const int FirstRows = 64;
    private const int Doublings = 6;

    private readonly List<T[]?> blocks = [];
    private T[] current = [];
    private int first;
    private int end;

    public bool IsEmpty => blocks.Count == 0;

    /// <param name="row">From 0; not below one set before.</param>
    /// <param name="value">Of the row.</param>
    public void Set(int row, T value)
    {
        if (row >= end)
        {
            Enter(row);
        }

        current[row - first] = value;
    }

    /// <summary>The values of the first rows; the column is empty then.</summary>
    public T[] Take(int rows)
    {
        var taken = GC.AllocateUninitializedArray<T>(rows);
        var at = 0;
        for (var block = 0; block < blocks.Count && at < rows; block++)
        {
            var count = Math.Min(RowsOf(block), rows - at);
            if (blocks[block] is { } values)
            {
                values.AsSpan(0, count).CopyTo(taken.AsSpan(at));
            }
            else
            {
                Array.Fill(taken, missing, at, count);
            }

            at += count;
        }

        Array.Fill(taken, missing, at, rows - at);
        blocks.Clear();
        (current, first, end) = ([], 0, 0);
        return taken;
    }

    private void Enter(int row)
    {
        while (row >= end)
        {
            first = end;
            end += RowsOf(blocks.Count);
            blocks.Add(null);
        }

        blocks[^1] = current = new T[end - first];
        Array.Fill(current, missing);
    }

    private static int RowsOf(int block) => FirstRows << Math.Min(block, Doublings);
}
