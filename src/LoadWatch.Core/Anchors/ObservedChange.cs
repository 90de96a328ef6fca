using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>The dates on which another observed value holds than did before.</summary>
/// <param name="Anchor">One of the values that changed.</param>
/// <param name="From">First date.</param>
/// <param name="Before">First date on which the same holds again; null: all later ones differ.</param>
public sealed record ObservedChange(Anchor Anchor, LocalDate From, LocalDate? Before)
{
    /// <summary>One for each thing that changed, in the order of the kinds.</summary>
    public static IReadOnlyList<ObservedChange> Between(IReadOnlyCollection<ObservedAnchor> former, IReadOnlyCollection<ObservedAnchor> now)
    {
        var (gone, come) = (former.Except(now).ToList(), now.Except(former).ToList());
        var kept = former.Intersect(now).ToLookup(one => one.Of);
        return
        [
            .. gone.Concat(come)
                .GroupBy(one => one.Of)
                .OrderBy(same => same.Key.Kind).ThenBy(same => same.Key.Sport, StringComparer.Ordinal)
                .ThenBy(same => same.Key.Exercise, StringComparer.Ordinal).ThenBy(same => same.Key.Machine, StringComparer.Ordinal)
                .Select(same => new ObservedChange(
                    same.First().ToAnchor(), same.Min(one => one.From), kept[same.Key].Where(one => one.From > same.Max(other => other.From)).Min(one => (LocalDate?)one.From))),
        ];
    }
}
