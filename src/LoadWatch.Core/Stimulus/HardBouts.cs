namespace LoadWatch.Stimulus;

/// <summary>Counts hard bouts: stretches at or above <see cref="HardLine"/> of at least 3 s, stretches less than 2 s apart being one. A
/// choice.</summary>
public sealed class HardBouts
{
    /// <summary>The shortest stretch that counts, s.</summary>
    public const int ShortestSeconds = 3;

    private const long ShortestMilliseconds = ShortestSeconds * 1000;
    private const long MergedGapMilliseconds = 2000;

    private long start;
    private long? end;
    private int finished;

    /// <summary>Bouts so far; a bout's merged gaps count for its length.</summary>
    public int Count => finished + (OpenIsLong ? 1 : 0);

    private bool OpenIsLong => end is { } until && until - start >= ShortestMilliseconds;

    /// <summary>Adds the next reading; times must not run backwards.</summary>
    /// <param name="unixMilliseconds">When it was taken.</param>
    /// <param name="milliseconds">How long it stands for; 0 adds nothing.</param>
    public void Add(long unixMilliseconds, int milliseconds, double drive)
    {
        if (milliseconds == 0 || !HardLine.Reached(drive))
        {
            return;
        }

        if (end is not { } until || unixMilliseconds - until >= MergedGapMilliseconds)
        {
            finished = Count;
            start = unixMilliseconds;
        }

        end = unixMilliseconds + milliseconds;
    }
}
