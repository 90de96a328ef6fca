namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Bounds what a file can make the decoder keep (I-11). A message of one byte may stand for a row of many; ordinary files stay far below.
/// What is spent is there twice while the copies are made that are handed out, and the file itself once: 56 MB + 4 x its size in all.
/// </summary>
internal sealed class MemoryBudget(long fileBytes)
{
    private const long Base = 28L << 20;
    private long left = Base + (fileBytes * 3 / 2);

    public bool Overspent => left < 0;

    public void Spend(long bytes) => left -= bytes;
}
