namespace LoadWatch.Days;

/// <summary>The median of values that come and go. Holds the values themselves in order, so nothing drifts.</summary>
internal sealed class RunningMedian
{
    private readonly List<double> sorted = [];

    public int Count => sorted.Count;

    /// <summary>Mean of the two middle values of an even count; null when empty.</summary>
    public double? Value => sorted.Count == 0 ? null : Significant.Round((sorted[(sorted.Count - 1) / 2] + sorted[sorted.Count / 2]) / 2);

    /// <summary>Null is nothing to add.</summary>
    public void Add(double? value)
    {
        if (value is { } known)
        {
            var place = sorted.BinarySearch(known);
            sorted.Insert(place < 0 ? ~place : place, known);
        }
    }

    public void AddAll(IEnumerable<double> values)
    {
        foreach (var value in values)
        {
            Add(value);
        }
    }

    /// <summary>Takes out one value that was added before; null is nothing to take out.</summary>
    public void Remove(double? value)
    {
        if (value is { } known)
        {
            sorted.RemoveAt(sorted.BinarySearch(known));
        }
    }
}
