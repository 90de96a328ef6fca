using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Csv;

/// <summary>From when to when the sessions of a person went that were handed on; there may be many, and most rows lie where the last one lay.</summary>
internal sealed class EndedSessions
{
    private readonly SortedList<long, long> lasts = [];
    private (long From, long To) free = (long.MinValue, long.MaxValue);

    public void Add(SampleSeries session)
    {
        var (first, last) = (session.First!.Value, session.Last!.Value);
        Add(first.ToUnixTimeMilliseconds(), last.ToUnixTimeMilliseconds());
    }

    /// <param name="first">Milliseconds since 1970, as the last.</param>
    public void Add(long first, long last)
    {
        lasts[first] = last;
        free = (0, -1);
    }

    /// <summary>Whether a time belongs to one of them: it is no long gap away.</summary>
    public bool Hold(long time)
    {
        if (time >= free.From && time <= free.To)
        {
            return false;
        }

        var after = FirstAfter(time);
        var from = after > 0 ? lasts.GetValueAtIndex(after - 1) + SessionGaps.LongestMilliseconds + 1 : long.MinValue;
        var to = after < lasts.Count ? lasts.GetKeyAtIndex(after) - SessionGaps.LongestMilliseconds - 1 : long.MaxValue;
        if (time < from || time > to)
        {
            return true;
        }

        free = (from, to);
        return false;
    }

    private int FirstAfter(long time)
    {
        var (low, high) = (0, lasts.Count);
        while (low < high)
        {
            var middle = (low + high) / 2;
            (low, high) = lasts.GetKeyAtIndex(middle) > time ? (low, middle) : (middle + 1, high);
        }

        return low;
    }
}
