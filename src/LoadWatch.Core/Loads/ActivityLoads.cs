using LoadWatch.Activities;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>Every quantity and zone time of one recording, and why one is missing.</summary>
/// <param name="Quantities">Sorted by name.</param>
/// <param name="TimesInZone">Heart rate, power, speed, in this order.</param>
/// <param name="Remarks">Of the sets, in plain words.</param>
/// <param name="HistogramRemarks">What <see cref="HistogramLoads"/> says.</param>
public sealed record ActivityLoads(
    IReadOnlyList<Quantity> Quantities,
    IReadOnlyList<TimeInZone> TimesInZone,
    IReadOnlyList<string> Remarks,
    IReadOnlyList<string> HistogramRemarks)
{
    public static ActivityLoads Of(UsableRecording usable, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var ofSpeed = SpeedLoads.OfSamples(usable);
        var top = SessionLoads.Find(ofSpeed, QuantityNames.SpeedTop)?.Value;
        var ofHistograms = HistogramLoads.Of(usable.Histograms, usable.Recording.Sport, top, date, person, anchors, settings);
        var (ofSets, remark) = SetTotals.Of(usable.Recording.Sets, settings.Equations.OneRepetitionMaxByRepetitions);
        IEnumerable<Quantity> quantities = [.. ofHistograms.Quantities, .. ExternalLoads.Of(usable), .. ofSpeed, .. ofSets, .. EffortMinutes.Of(usable, date, person, anchors, settings.Equations)];
        return new ActivityLoads(
            [.. quantities.OrderBy(quantity => quantity.Name, StringComparer.Ordinal)],
            ofHistograms.TimesInZone,
            remark is null ? [] : [remark],
            ofHistograms.Remarks);
    }
}
