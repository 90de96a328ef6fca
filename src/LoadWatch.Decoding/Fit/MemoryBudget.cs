namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Bounds what a file can make the decoder keep (I-11). A message of one byte may stand for a row of many; ordinary files stay far below.
/// Together with the copies handed out this keeps one file of up to 32 MB under 64 MB + 4 x its size.
/// </summary>
internal sealed class MemoryBudget(long fileBytes)
{
    private const long Base = 24L << 20;
    private long left = Base + (fileBytes * 5 / 2);

    public bool Overspent => left < 0;

    public void Spend(long bytes) => left -= bytes;
}
