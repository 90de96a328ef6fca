namespace LoadWatch.Service.Pipeline;

/// <summary>Cuts a stream of contents into pieces that fit into memory, however much an archive file unpacks to (I-11).</summary>
public static class SeenContents
{
    private const int MostContents = 64;
    private const long MostBytes = 16L * 1024 * 1024;

    /// <summary>Lazily; a piece is over once it holds enough, so one content may exceed it.</summary>
    public static IEnumerable<IReadOnlyList<SeenContent>> InPieces(this IEnumerable<SeenContent> contents)
    {
        var piece = new List<SeenContent>();
        long bytes = 0;
        foreach (var content in contents)
        {
            piece.Add(content);
            bytes += content.Content.Size;
            if (piece.Count >= MostContents || bytes >= MostBytes)
            {
                yield return piece;
                (piece, bytes) = ([], 0);
            }
        }

        if (piece.Count > 0)
        {
            yield return piece;
        }
    }
}
