using LoadWatch.Loads;

namespace LoadWatch.Activities;

/// <summary>
/// What drills of one session make of a quantity together: amounts (metres, minutes, counts, kilojoules) add up, tops and maxima take the largest, and
/// shares, means, rates and ratings cannot be put together.
/// </summary>
internal static class DrillTotals
{
    private static readonly string[] Apart = ["_share", "_mean", "_per_minute", QuantityNames.Rating];
    private static readonly string[] UnitsOfNoAmount = ["1", "%", "bpm", "m/s", "m/s2", "m/min", "W", "W/kg"];

    /// <summary>Null where the drills cannot be put together.</summary>
    /// <param name="drills">Of one name, at least one, finite.</param>
    public static Quantity? Of(IEnumerable<Quantity> drills)
    {
        var values = drills.ToList();
        var first = values[0];
        if (values.Exists(one => one.Unit != first.Unit) || Value(first, values) is not { } value || !double.IsFinite(value))
        {
            return null;
        }

        return first with { Value = Significant.Round(value), Estimated = values.Exists(one => one.Estimated) };
    }

    private static double? Value(Quantity kind, List<Quantity> values)
    {
        if (IsLargest(kind))
        {
            return values.Max(one => one.Value);
        }

        return IsApart(kind) ? null : values.Sum(one => one.Value);
    }

    /// <summary>A distance above a share of <c>speed_max</c> is an amount in spite of its name.</summary>
    private static bool IsLargest(Quantity kind) =>
        kind.Name.EndsWith("_top", StringComparison.Ordinal) || (kind.Name.EndsWith("_max", StringComparison.Ordinal) && !IsAmount(kind));

    private static bool IsApart(Quantity kind) =>
        !IsAmount(kind) || Array.Exists(Apart, ending => kind.Name.EndsWith(ending, StringComparison.Ordinal));

    private static bool IsAmount(Quantity kind) => !UnitsOfNoAmount.Contains(kind.Unit, StringComparer.Ordinal);
}
