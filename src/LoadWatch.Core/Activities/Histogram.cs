namespace LoadWatch.Activities;

/// <summary>
/// Time by value of one channel: milliseconds per bin. Bins are whole bpm, whole watts, or tenths of a metre per second (the value's
/// floor),
/// so every heart-rate load and time in zone is exact again without decoding.
/// </summary>
public sealed class Histogram
{
    private int count;
    private int[] bins = [];
    private long[] milliseconds = [];

    public Histogram()
    {
    }

    /// <summary>The bins from 0 on with their milliseconds, none negative.</summary>
    internal Histogram(ReadOnlySpan<long> fromZero)
    {
        count = fromZero.Length - fromZero.Count(0L);
        (bins, milliseconds) = (new int[count], new long[count]);
        var at = 0;
        for (var bin = 0; bin < fromZero.Length; bin++)
        {
            if (fromZero[bin] > 0)
            {
                (bins[at], milliseconds[at]) = (bin, fromZero[bin]);
                at++;
            }
        }
    }

    /// <summary>Bins in ascending order with their milliseconds, each above 0.</summary>
    public IEnumerable<KeyValuePair<int, long>> Bins
    {
        get
        {
            for (var at = 0; at < count; at++)
            {
                yield return KeyValuePair.Create(bins[at], milliseconds[at]);
            }
        }
    }

    /// <summary>Sum over all bins, milliseconds.</summary>
    public long TotalMilliseconds => milliseconds.Sum();

    /// <summary>Adds time to a bin; nothing for 0.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The time is negative.</exception>
    public void Add(int bin, long duration)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(duration);
        if (duration == 0)
        {
            return;
        }

        var at = Array.BinarySearch(bins, 0, count, bin);
        if (at < 0)
        {
            at = ~at;
            Insert(at, bin);
        }

        milliseconds[at] += duration;
    }

    private void Insert(int at, int bin)
    {
        if (count == bins.Length)
        {
            var room = Math.Max(16, 2 * count);
            Array.Resize(ref bins, room);
            Array.Resize(ref milliseconds, room);
        }

        Array.Copy(bins, at, bins, at + 1, count - at);
        Array.Copy(milliseconds, at, milliseconds, at + 1, count - at);
        (bins[at], milliseconds[at]) = (bin, 0);
        count++;
    }
}
