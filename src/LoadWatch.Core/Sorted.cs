namespace LoadWatch;

/// <summary>Looking things up that stand in rising order of a key.</summary>
public static class Sorted
{
    /// <summary>Index of the first one whose key is <paramref name="from"/> or more, by bisection; the number of them where none is.</summary>
    public static int FirstFrom<T, TKey>(ReadOnlySpan<T> rising, TKey from, Func<T, TKey> keyOf)
        where TKey : IComparable<TKey>
    {
        ArgumentNullException.ThrowIfNull(keyOf);
        var (low, high) = (0, rising.Length);
        while (low < high)
        {
            var middle = (low + high) / 2;
            (low, high) = keyOf(rising[middle]).CompareTo(from) < 0 ? (middle + 1, high) : (low, middle);
        }

        return low;
    }
}
