namespace LoadWatch.Activities;

/// <summary>
/// Time by value of one channel: milliseconds per bin. Bins are whole bpm, whole watts, or tenths of a metre per second (the value's
/// floor),
/// so every heart-rate load and time in zone is exact again without decoding.
/// </summary>
public sealed class Histogram
{
    private readonly SortedDictionary<int, long> milliseconds = [];

    /// <summary>Bins in ascending order with their milliseconds, each above 0.</summary>
    public IEnumerable<KeyValuePair<int, long>> Bins => milliseconds;

    /// <summary>Sum over all bins, milliseconds.</summary>
    public long TotalMilliseconds => milliseconds.Values.Sum();

    /// <summary>Adds time to a bin; nothing for 0.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative.</exception>
    public void Add(int bin, long duration)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(duration);
        if (duration > 0)
        {
            milliseconds[bin] = milliseconds.GetValueOrDefault(bin) + duration;
        }
    }
}
