using System.Globalization;
using LoadWatch.Activities;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Explain;

/// <summary>What lies between a session's heart rate and its loads: minutes by zone with their weights, the mean fraction of the reserve, the factors.</summary>
/// <param name="HeartRate">Milliseconds by whole bpm.</param>
internal sealed record HeartRateSteps(Histogram HeartRate, LocalDate Date, Person Person, AnchorBook Anchors, EquationChoices Equations)
{
    private const double MillisecondsPerMinute = 60_000;

    /// <summary>Nothing for a quantity that is not of heart rate, or where a value that it hangs on is missing.</summary>
    public IEnumerable<string> Of(string quantity) => quantity switch
    {
        QuantityNames.BanisterTrimp => OfReserve(BanisterTrimp.Pair(Person.Sex, Equations), Person.Sex is null ? "the mean of the pairs of women and men, as the sex is not stated" : "the pair of the sex"),
        QuantityNames.IndividualTrimp => TrimpPair.On(Date, Person, Anchors).Pair is { } own ? OfReserve((own.A, own.B), "the person's own") : [],
        QuantityNames.EdwardsLoad => HeartRateMaximum.On(Date, Person, Anchors) is { } max ? [Zones(bpm => EdwardsLoad.Zone(bpm, max.Bpm), [0, .. Equations.EdwardsWeights])] : [],
        QuantityNames.LuciaLoad => HeartRateThresholds.On(Date, Person, Anchors) is { } thresholds ? [Zones(bpm => LuciaLoad.Zone(bpm, thresholds) - 1, Equations.LuciaWeights)] : [],
        QuantityNames.StagnoLoad => HeartRateMaximum.On(Date, Person, Anchors) is { } max ? [Zones(bpm => StagnoZone(bpm, max.Bpm), [0, .. Equations.StagnoWeights])] : [],
        _ => [],
    };

    private IEnumerable<string> OfReserve((double A, double B) pair, string whose)
    {
        if (HeartRateReserve.On(Date, Person, Anchors).Reserve is not { } reserve)
        {
            return [];
        }

        var minutes = HeartRate.Bins.Sum(bin => bin.Value / MillisecondsPerMinute);
        var mean = HeartRate.Bins.Sum(bin => bin.Value / MillisecondsPerMinute * reserve.Fraction(bin.Key)) / minutes;
        var held = HeartRate.Bins.Where(bin => reserve.Unclamped(bin.Key) is < 0 or > 1).Sum(bin => bin.Value / MillisecondsPerMinute);
        return
        [
            Text($"a = {pair.A:0.###}, b = {pair.B:0.###} ({whose}); reserve from {reserve.RestBpm:0.#} to {reserve.MaxBpm:0.#} bpm"),
            Text($"{minutes:0.##} min with heart rate, mean fraction of the reserve {mean:0.###}; {held:0.##} min outside the reserve, held at its ends"),
        ];
    }

    private string Zones(Func<int, int> zoneOf, IReadOnlyList<double> weights)
    {
        var minutes = new double[weights.Count];
        foreach (var (bpm, milliseconds) in HeartRate.Bins)
        {
            minutes[zoneOf(bpm)] += milliseconds / MillisecondsPerMinute;
        }

        return string.Join(" + ", minutes.Select((time, zone) => Text($"{time:0.##} min x {weights[zone]:0.###}")));
    }

    private int StagnoZone(int bpm, double maxBpm)
    {
        var fraction = Math.Round(bpm / maxBpm, 11);
        return Equations.StagnoBounds.Count(bound => fraction >= bound);
    }

    private static string Text(FormattableString text) => text.ToString(CultureInfo.InvariantCulture);
}
