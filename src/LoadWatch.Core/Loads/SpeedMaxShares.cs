using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.People;

namespace LoadWatch.Loads;

/// <summary>
/// Speed against the person's own best. One speed for all is 74 % of the best of a fast player and 84 % of a slower one, so what is fast differs;
/// that bounds should be relative is common practice, where they lie has no consensus (Gualtieri et al. 2023, Front Sports Act Living 5:1116293).
/// Share = v / v_max: v_max the anchor <c>speed_max</c> on the date, m/s. A session may beat it: then the share is above 1.
/// Distances are those of <see cref="DistanceAbove"/>: the bound share x v_max acts as the next higher tenth of a metre per second.
/// </summary>
public static class SpeedMaxShares
{
    /// <summary>Lower is no fast running. A choice.</summary>
    public const double Lowest = 0.5;

    public const double Highest = 1;

    private const string NameEnd = "_percent_speed_max";

    /// <summary>Those that have a quantity of their own, in their order.</summary>
    public static IEnumerable<double> Distinct(IEnumerable<double> shares) =>
        shares.Where(share => share is >= Lowest and <= Highest).Select(Significant.Round).Distinct();

    /// <summary><c>distance_above_80_percent_speed_max</c> for 0.8.</summary>
    public static string Name(double share)
    {
        var percent = Significant.Round(share * 100).ToString("0.#######", CultureInfo.InvariantCulture);
        return $"{DistanceAbove.Prefix}{percent.Replace('.', '_')}{NameEnd}";
    }

    /// <summary>True for what <see cref="Name"/> gives.</summary>
    public static bool IsName(string quantity) =>
        quantity.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal) && quantity.EndsWith(NameEnd, StringComparison.Ordinal);

    /// <summary>The distances and the share of the top speed.</summary>
    /// <param name="speed">Milliseconds by tenths of a metre per second.</param>
    /// <param name="top">Top speed, m/s, or null.</param>
    /// <param name="best">The anchor, m/s.</param>
    public static IEnumerable<Quantity> Of(Histogram speed, double? top, Anchor best, IEnumerable<double> shares)
    {
        var estimated = best.Source == AnchorSource.Estimated;
        if (Significant.Round(top / best.Value) is { } share)
        {
            yield return new Quantity(QuantityNames.SpeedTopShare, share, "1", estimated);
        }

        foreach (var bound in Distinct(shares))
        {
            if (DistanceAbove.Metres(speed, Significant.Round(bound * best.Value)) is { } metres)
            {
                yield return new Quantity(Name(bound), metres, "m", estimated);
            }
        }
    }
}
