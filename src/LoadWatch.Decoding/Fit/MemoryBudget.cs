namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Bounds what a file can make the decoder hold at one time (I-11). A message of one byte may stand for a row of many; ordinary files stay far below.
/// Each thing is spent with all that is there of it at most, the copies included that are handed out; with the file itself it is 52 MB + 4 x its size.
/// </summary>
internal sealed class MemoryBudget(long fileBytes)
{
    private const long Base = 52L << 20;
    private long left = Base + (fileBytes * 3);

    public bool Overspent => left < 0;

    public void Spend(long bytes) => left -= bytes;
}
