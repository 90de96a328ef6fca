using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// What the histograms of a recording tell of it together with its person's anchors, without its samples: the loads of heart rate, the distances
/// above a speed, the times in zone. From stored histograms it comes out the same to the last bit.
/// </summary>
/// <param name="Quantities">Each at most once, in no order.</param>
/// <param name="TimesInZone">Heart rate, power, speed, in this order.</param>
/// <param name="Remarks">What hinders a load of heart rate, in plain words; all of <see cref="HeartRateLoads.EveryRemark"/>.</param>
public sealed record HistogramLoads(IReadOnlyList<Quantity> Quantities, IReadOnlyList<TimeInZone> TimesInZone, IReadOnlyList<string> Remarks)
{
    /// <param name="histograms">Of heart rate, power and speed, where usable; none of heart rate where it is not valid for the person.</param>
    /// <param name="speedTop">The quantity <see cref="QuantityNames.SpeedTop"/> of the recording, m/s, or null.</param>
    /// <param name="date">The local date of the session: anchors are taken as they hold on it.</param>
    public static HistogramLoads Of(
        IReadOnlyDictionary<Channel, Histogram> histograms,
        Sport sport,
        double? speedTop,
        LocalDate date,
        Person person,
        AnchorBook anchors,
        ComputationSettings settings)
    {
        var (ofHeartRate, remarks) = HeartRateLoads.Of(histograms.GetValueOrDefault(Channel.HeartRate), date, person, anchors, settings.Equations);
        var ofSpeed = SpeedLoads.OfHistogram(
            histograms.GetValueOrDefault(Channel.Speed), sport, speedTop, anchors.On(date, person.Id, AnchorKind.SpeedMax), settings);
        return new HistogramLoads([.. ofHeartRate, .. ofSpeed], [.. Zones(histograms, sport, date, person, anchors, settings)], remarks);
    }

    /// <summary>True for a quantity that <see cref="Of"/> may tell, so that it can be told from those that need samples.</summary>
    public static bool Tells(string quantity) =>
        QuantityNames.IsOfHeartRate(quantity) || quantity == QuantityNames.SpeedTopShare || quantity.StartsWith(DistanceAbove.Prefix, StringComparison.Ordinal);

    private static IEnumerable<TimeInZone> Zones(
        IReadOnlyDictionary<Channel, Histogram> histograms, Sport sport, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        if (histograms.TryGetValue(Channel.HeartRate, out var heartRate)
            && ZoneTimes.OfHeartRate(heartRate, date, person, anchors, settings.HeartRateReserveBounds) is { } ofHeartRate)
        {
            yield return ofHeartRate;
        }

        if (!sport.IsOnFoot
            && histograms.TryGetValue(Channel.Power, out var power)
            && anchors.On(date, person.Id, AnchorKind.CriticalPower, sport) is { } criticalPower)
        {
            yield return ZoneTimes.OfPower(power, criticalPower, settings.PowerBounds);
        }

        if (histograms.TryGetValue(Channel.Speed, out var speed))
        {
            yield return ZoneTimes.OfSpeed(speed, settings.SpeedBounds);
        }
    }
}
