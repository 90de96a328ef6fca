namespace LoadWatch.Decoding.Csv;

/// <summary>A column of unknown length in small pieces, so that nothing is copied while it grows; a piece without a value takes no memory.</summary>
/// <param name="none">What a row holds that was never set.</param>
internal sealed class GrowingColumn<T>(T none)
    where T : struct
{
    private const int PieceRows = 512;

    private readonly List<T[]?> pieces = [];

    public T this[int row]
    {
        set => Piece(row / PieceRows)[row % PieceRows] = value;
    }

    /// <summary>The first rows as one array; the pieces are let go, and nothing can be set after it.</summary>
    public T[] Close(int rows)
    {
        var all = new T[rows];
        for (var start = 0; start < rows; start += PieceRows)
        {
            var piece = start / PieceRows < pieces.Count ? pieces[start / PieceRows] : null;
            var target = all.AsSpan(start, Math.Min(PieceRows, rows - start));
            if (piece is null)
            {
                target.Fill(none);
            }
            else
            {
                piece.AsSpan(0, target.Length).CopyTo(target);
                pieces[start / PieceRows] = null;
            }
        }

        return all;
    }

    private T[] Piece(int number)
    {
        while (pieces.Count <= number)
        {
            pieces.Add(null);
        }

        return pieces[number] ??= Empty();
    }

    private T[] Empty()
    {
        var piece = new T[PieceRows];
        Array.Fill(piece, none);
        return piece;
    }
}
