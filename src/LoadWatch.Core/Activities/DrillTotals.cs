using LoadWatch.Loads;

namespace LoadWatch.Activities;

/// <summary>
/// What drills of one session make of a quantity together: amounts (metres, minutes, counts, kilojoules) add up, tops and maxima take the largest, and
/// shares, means, rates and ratings cannot be put together.
/// </summary>
internal static class DrillTotals
{
    private static readonly string[] Largest = ["_top", "_max"];
    private static readonly string[] Apart = ["_share", "_mean", "_per_minute", RatedLoad.Rating];
    private static readonly string[] UnitsOfNoAmount = ["%", "bpm", "m/s", "m/s2", "m/min", "W", "W/kg"];

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
        if (EndsWithAny(kind.Name, Largest))
        {
            return values.Max(one => one.Value);
        }

        return EndsWithAny(kind.Name, Apart) || UnitsOfNoAmount.Contains(kind.Unit, StringComparer.Ordinal) ? null : values.Sum(one => one.Value);
    }

    private static bool EndsWithAny(string name, string[] endings) => Array.Exists(endings, ending => name.EndsWith(ending, StringComparison.Ordinal));
}
