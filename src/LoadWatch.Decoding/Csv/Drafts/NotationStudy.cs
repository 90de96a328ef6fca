namespace LoadWatch.Decoding.Csv.Drafts;

/// <summary>Which notations fit every filled cell of a column so far, and how its times go on from row to row.</summary>
/// <param name="candidates">Those that a first cell is written in.</param>
internal sealed class NotationStudy(Func<byte[], IReadOnlyList<Notation>> candidates)
{
    private const long SessionMilliseconds = 10 * 60_000;

    private readonly byte[] lastCell = new byte[64];
    private int lastLength = -1;
    private List<Notation>? fitting;
    private long? before;

    /// <summary>In order of preference; empty where none fits, or no cell was filled.</summary>
    public IReadOnlyList<Notation> Fitting => fitting ?? [];

    public bool Fits => Fitting.Count > 0;

    /// <summary>Whether a cell came without zone or offset.</summary>
    public bool IsLocal { get; private set; }

    /// <summary>Steps from row to row, and those of more than ten minutes either way: rows of a session lie closer.</summary>
    public (long All, long Long) Steps { get; private set; }

    public void Take(ReadOnlySpan<byte> cell)
    {
        if (fitting is { Count: 0 } || (lastLength >= 0 && cell.SequenceEqual(lastCell.AsSpan(0, lastLength))))
        {
            Steps = (Steps.All + 1, Steps.Long);
            return;
        }

        if (fitting is null)
        {
            fitting = [.. candidates(cell.ToArray())];
        }
        else
        {
            Strike(cell);
        }

        lastLength = cell.TryCopyTo(lastCell) ? cell.Length : -1;
        Follow(cell);
    }

    private void Strike(ReadOnlySpan<byte> cell)
    {
        for (var index = fitting!.Count - 1; index >= 0; index--)
        {
            if (fitting[index].Read(cell) is null)
            {
                fitting.RemoveAt(index);
            }
        }
    }

    private void Follow(ReadOnlySpan<byte> cell)
    {
        if (fitting is not [var first, ..] || first.Read(cell) is not var (time, isLocal))
        {
            return;
        }

        IsLocal |= isLocal;
        Steps = before is { } last ? (Steps.All + 1, Steps.Long + (Math.Abs(time - last) > SessionMilliseconds ? 1 : 0)) : Steps;
        before = time;
    }
}
