namespace LoadWatch.Quality;

/// <summary>Which readings of a channel are cut, and why. Nothing is kept while none is.</summary>
/// <param name="rows">Of the channel's time line.</param>
internal sealed class ReadingMarks(int rows)
{
    private byte[]? marks;

    /// <summary>Whether there is a row without a usable reading.</summary>
    public bool Any => marks is not null;

    /// <summary>For each row 0 where its reading is usable; empty where all are. To be asked for again after a cut.</summary>
    public ReadOnlySpan<byte> ByRow => marks;

    public CutReason? this[int row] => marks is null || marks[row] == 0 ? null : (CutReason)(marks[row] - 1);

    /// <summary>The first reason stands.</summary>
    public void Cut(int row, CutReason reason)
    {
        marks ??= new byte[rows];
        if (marks[row] == 0)
        {
            marks[row] = (byte)((int)reason + 1);
        }
    }

    /// <summary>Cuts all of the rows from one to another, both included.</summary>
    public void Cut(int first, int last, CutReason reason)
    {
        for (var row = first; row <= last; row++)
        {
            Cut(row, reason);
        }
    }

    /// <summary>The same marks, to go on with.</summary>
    public ReadingMarks Copy() => new(rows) { marks = (byte[]?)marks?.Clone() };
}
