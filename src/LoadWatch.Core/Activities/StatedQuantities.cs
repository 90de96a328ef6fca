using LoadWatch.Loads;
using LoadWatch.Rows;

namespace LoadWatch.Activities;

/// <summary>The quantities of one session from the rows of one table: those of the whole session win, drills fill what it lacks.</summary>
internal static class StatedQuantities
{
    /// <summary>Sorted by name; what is not finite is left out.</summary>
    public static IReadOnlyList<Quantity> Of(IEnumerable<SessionRow> whole, IEnumerable<SessionRow> drills)
    {
        var stated = new SortedDictionary<string, Quantity>(StringComparer.Ordinal);
        foreach (var quantity in whole.SelectMany(Told))
        {
            stated.TryAdd(quantity.Name, quantity);
        }

        foreach (var quantity in drills.SelectMany(Told).GroupBy(one => one.Name, StringComparer.Ordinal).Select(DrillTotals.Of).OfType<Quantity>())
        {
            stated.TryAdd(quantity.Name, quantity);
        }

        return [.. stated.Values];
    }

    /// <summary>Each at most once.</summary>
    private static IEnumerable<Quantity> Told(SessionRow row) => Columns(row)
        .Concat(row.Quantities)
        .Where(one => double.IsFinite(one.Value))
        .Select(one => one with { Value = Significant.Round(one.Value) })
        .DistinctBy(one => one.Name, StringComparer.Ordinal);

    private static IEnumerable<Quantity> Columns(SessionRow row)
    {
        if (row.Minutes is > 0 and var minutes)
        {
            yield return new Quantity(QuantityNames.Minutes, minutes, "min", Estimated: false);
        }

        if (row.Rating is >= 0 and <= 10 and var rating)
        {
            yield return new Quantity(QuantityNames.Rating, rating, "points", Estimated: false);
        }
    }
}
