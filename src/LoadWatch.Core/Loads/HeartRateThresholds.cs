using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>A person's heart rates at the two ventilatory thresholds on a date.</summary>
/// <param name="FirstBpm">Above 0.</param>
/// <param name="SecondBpm">Above the first.</param>
/// <param name="Estimated">True when one of the two comes from an equation.</param>
public sealed record HeartRateThresholds(double FirstBpm, double SecondBpm, bool Estimated)
{
    /// <summary>Null unless both are anchored and the second lies above the first.</summary>
    public static HeartRateThresholds? On(LocalDate date, Person person, AnchorBook anchors)
    {
        var first = anchors.On(date, person.Id, AnchorKind.HeartRateVt1);
        var second = anchors.On(date, person.Id, AnchorKind.HeartRateVt2);
        return first is not null && second is not null && first.Value < second.Value
            ? new HeartRateThresholds(first.Value, second.Value, first.Source == AnchorSource.Estimated || second.Source == AnchorSource.Estimated)
            : null;
    }
}
