using LoadWatch.Activities;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>Every quantity and zone time of one recording, and why one is missing.</summary>
/// <param name="Quantities">Sorted by name.</param>
/// <param name="TimesInZone">Heart rate, power, speed, in this order.</param>
/// <param name="Remarks">In plain words.</param>
public sealed record ActivityLoads(
    IReadOnlyList<Quantity> Quantities,
    IReadOnlyList<TimeInZone> TimesInZone,
    IReadOnlyList<string> Remarks)
{
    public static ActivityLoads Of(UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var (ofHeartRate, remarks) = HeartRateLoads.Of(usable, date, person, anchors);
        var (ofSets, remark) = SetTotals.Of(usable.Recording.Sets);
        var ofSpeed = SpeedLoads.Of(usable, anchors.On(date, person.Id, AnchorKind.SpeedMax), settings);
        IEnumerable<Quantity> quantities = [.. ofHeartRate, .. ExternalLoads.Of(usable), .. ofSpeed, .. ofSets];
        return new ActivityLoads(
            [.. quantities.OrderBy(quantity => quantity.Name, StringComparer.Ordinal)],
            [.. Zones(usable, date, person, anchors, settings)],
            remark is null ? remarks : [.. remarks, remark]);
    }

    private static IEnumerable<TimeInZone> Zones(
        UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        if (usable.Histograms.TryGetValue(Channel.HeartRate, out var heartRate)
            && ZoneTimes.OfHeartRate(heartRate, date, person, anchors, settings.HeartRateReserveBounds) is { } ofHeartRate)
        {
            yield return ofHeartRate;
        }

        if (!usable.Recording.Sport.IsOnFoot
            && usable.Histograms.TryGetValue(Channel.Power, out var power)
            && anchors.On(date, person.Id, AnchorKind.CriticalPower) is { } criticalPower)
        {
            yield return ZoneTimes.OfPower(power, criticalPower, settings.PowerBounds);
        }

        if (usable.Histograms.TryGetValue(Channel.Speed, out var speed))
        {
            yield return ZoneTimes.OfSpeed(speed, settings.SpeedBounds);
        }
    }
}
