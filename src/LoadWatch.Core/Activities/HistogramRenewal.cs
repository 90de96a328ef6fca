using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Activities;

/// <summary>Takes a changed anchor, zone or speed bound into stored values without decoding the file again.</summary>
public static class HistogramRenewal
{
    /// <summary>
    /// The values with all that their histograms tell computed anew, equal to what <see cref="ActivityComputation"/> gives but for the stimulus,
    /// the minutes of effort, and the cut above the maximal heart rate, which need the samples. Where the usable share wanted, the formulas (<see cref="ActivityComputation.Version"/>) or the dates on which the
    /// person's heart rate is valid changed, only decoding helps.
    /// </summary>
    /// <param name="values">As computed from one recording, with every histogram that was stored of it.</param>
    /// <param name="date">The recording's local date.</param>
    public static ActivityValues Of(
        ActivityValues values, Sport sport, LocalDate date, Person person, AnchorBook anchors, ComputationSettings settings)
    {
        var kept = values.Quantities.Where(quantity => !HistogramLoads.Tells(quantity.Name)).ToList();
        var top = kept.Find(quantity => quantity.Name == QuantityNames.SpeedTop)?.Value;
        var told = HistogramLoads.Of(values.Histograms, sport, top, date, person, anchors, settings);
        return values with
        {
            Quantities = [.. kept.Concat(told.Quantities).OrderBy(quantity => quantity.Name, StringComparer.Ordinal)],
            TimesInZone = told.TimesInZone,
            Remarks = [.. values.Remarks.Where(remark => !HeartRateLoads.EveryRemark.Contains(remark, StringComparer.Ordinal)), .. told.Remarks],
        };
    }
}
