namespace LoadWatch.Decoding.Fit;

/// <summary>Which session a moment belongs to: the last one begun at or before it, else the first.</summary>
internal sealed class SessionOwners
{
    private readonly int[] order;
    private readonly long[] starts;
    private readonly int[] places;

    public SessionOwners(IReadOnlyList<SessionFacts> sessions)
    {
        order = [.. Enumerable.Range(0, sessions.Count).OrderBy(i => sessions[i].Start ?? long.MinValue)];
        starts = [.. order.Select(i => sessions[i].Start ?? long.MinValue)];
        places = new int[order.Length];
        for (var place = 0; place < order.Length; place++)
            places[order[place]] = place;
    }

    public int Count => order.Length;

    /// <summary>The same for a moment, asked of the session of the moment before it first.</summary>
    public int Of(long time, int before)
    {
        var place = places[before];
        var isOfIt = (place == 0 || starts[place] <= time) && (place + 1 == starts.Length || time < starts[place + 1]);
        return isOfIt ? before : Of(time);
    }

    /// <summary>The index of the session; what has no time belongs to the first.</summary>
    public int Of(long? time)
    {
        var low = 0;
        var high = starts.Length;
        while (high - low > 1)
        {
            var middle = (low + high) / 2;
            (low, high) = time >= starts[middle] ? (middle, high) : (low, middle);
        }

        return order[low];
    }
}
