using System.Globalization;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// The dates on which a reference value changes that a person's loads rest on (I-15). Only kinds count that bear on something that the group looks at: a critical power
/// moves no load. That a maximal heart rate by the birth year falls by a part of a beat each year is no change, and where heart rate is not valid its
/// values change nothing before it is again.
/// </summary>
public sealed class ReferencePeriods
{
    /// <summary>
    /// So long after a change rules are read by the values before it, too: 12 weeks, as far back as rules compare weeks at their defaults. A choice; only the
    /// distribution of a year (median of chronic load, own strains) reaches further.
    /// </summary>
    public const int WindowDays = 84;

    /// <summary>So far before a date sessions are wanted by its values: the look-back, and a month more so that what lies at its far end is whole.</summary>
    private const int ReachDays = 430;

    /// <summary>A change so soon after a date asks for days before the look-back of that date. Days.</summary>
    private const int AheadDays = 30;

    private static readonly LocalDate Beginning = LocalDate.MinIsoValue;

    private readonly List<ReferencePeriod> periods;
    private readonly bool converts;

    private ReferencePeriods(List<ReferencePeriod> periods, IReadOnlySet<string> quantities, bool converts)
    {
        this.periods = periods;
        this.converts = converts;
        Quantities = quantities;
    }

    /// <summary>Names of the quantities that rest on reference values, among those that the group looks at.</summary>
    public IReadOnlySet<string> Quantities { get; }

    public IReadOnlyList<ReferencePeriod> All => periods;

    public static ReferencePeriods Of(Person person, Group group, AnchorBook anchors)
    {
        IReadOnlyList<string> ofLoad = [group.LoadQuantity, .. group.LoadFallbacks];
        var quantities = ofLoad.Concat(group.Limits.Quantities).Where(name => KindsOf(name).Count > 0).ToHashSet(StringComparer.Ordinal);
        var kinds = quantities.SelectMany(KindsOf).Distinct().Order().ToList();
        var loadKinds = ofLoad.SelectMany(KindsOf).ToHashSet();
        var values = new DatedValues(person, anchors);
        var found = new List<ReferencePeriod>();
        foreach (var from in kinds.Count == 0 ? [Beginning] : Dates(person, anchors, kinds))
        {
            var (all, load) = (values.Key(from, kinds), values.Key(from, kinds.Where(loadKinds.Contains)));
            if (found.Count == 0 || found[^1].Basis != all)
            {
                var loadFrom = found.Count > 0 && found[^1].LoadBasis == load ? found[^1].LoadFrom : from;
                found.Add(new ReferencePeriod(from, loadFrom, from, values.HeartRateOn(from), []) { Basis = all, LoadBasis = load });
            }
        }

        return new ReferencePeriods([.. found.Select((period, at) => WithValues(period, found.ElementAtOrDefault(at + 1), values, kinds))], quantities, group.LoadFallbacks.Count > 0);
    }

    public ReferencePeriod On(LocalDate date) => periods.FindLast(period => period.From <= date)!;

    /// <summary>Whose values held at the beginning of the window that ends with a date.</summary>
    public ReferencePeriod Before(LocalDate date) => On(date.PlusDays(-WindowDays));

    /// <summary>The first change behind the beginning of that window; only where there is one.</summary>
    public LocalDate FirstChange(LocalDate date) => periods.Find(period => period.From > date.PlusDays(-WindowDays))!.From;

    /// <summary>Dates behind the first and up to the last on which the values, or those before them, become others.</summary>
    public IEnumerable<LocalDate> Cuts(LocalDate first, LocalDate last) => periods.Skip(1)
        .SelectMany(period => new[] { period.From, period.From.PlusDays(WindowDays) })
        .Where(date => date > first && date <= last)
        .Distinct()
        .Order();

    /// <summary>
    /// From when on sessions are wanted to compute a date and those after it; null: nothing changed within reach, or does soon. A session that was converted before a change is
    /// converted anew by the line of that date, which rests on the 12 months before it.
    /// </summary>
    public LocalDate? Reach(LocalDate date)
    {
        var first = periods.Skip(1).FirstOrDefault(period => period.From > date.PlusDays(-ReachDays) && period.From <= date.PlusDays(AheadDays))?.From;
        return first is { } change ? (converts ? LocalDate.Min(change, date) : date).PlusDays(-ReachDays) : null;
    }

    private static IReadOnlyList<AnchorKind> KindsOf(string quantity) => quantity switch
    {
        QuantityNames.BanisterTrimp => [AnchorKind.HeartRateRest, AnchorKind.HeartRateMax],
        QuantityNames.EdwardsLoad or QuantityNames.StagnoLoad => [AnchorKind.HeartRateMax],
        QuantityNames.LuciaLoad => [AnchorKind.HeartRateVt1, AnchorKind.HeartRateVt2],
        QuantityNames.IndividualTrimp => [AnchorKind.HeartRateRest, AnchorKind.HeartRateMax, AnchorKind.TrimpWeight, AnchorKind.TrimpExponent],
        QuantityNames.SpeedTopShare => [AnchorKind.SpeedMax],
        _ when SpeedMaxShares.IsName(quantity) => [AnchorKind.SpeedMax],
        _ => [],
    };

    private static IEnumerable<LocalDate> Dates(Person person, AnchorBook anchors, List<AnchorKind> kinds) => anchors.Of(person.Id)
        .Where(anchor => kinds.Contains(anchor.Kind))
        .Select(anchor => anchor.Date ?? Beginning)
        .Append(Beginning)
        .Concat(person.HeartRateInvalid.All.Select(period => period.Until?.PlusDays(1)).OfType<LocalDate>())
        .Distinct()
        .Order();

    /// <summary>The first period speaks by its last date: there is no age on the earliest of all.</summary>
    private static ReferencePeriod WithValues(ReferencePeriod period, ReferencePeriod? next, DatedValues values, List<AnchorKind> kinds)
    {
        var on = period.From > Beginning || next is null ? period.From : next.From.PlusDays(-1);
        return period with { ValuesOn = on, HeartRateOn = values.HeartRateOn(on), Values = [.. kinds.Select(kind => new ReferenceValue(kind, values.Shown(kind, on)))] };
    }

    private sealed class DatedValues(Person person, AnchorBook anchors)
    {
        public LocalDate HeartRateOn(LocalDate date) =>
            person.HeartRateInvalid.BeginningOf(date) is not { } invalid ? date : invalid > Beginning ? invalid.PlusDays(-1) : Beginning;

        public string Key(LocalDate date, IEnumerable<AnchorKind> kinds) => string.Join(' ', kinds.Select(kind => Text(kind, date)));

        public double? Shown(AnchorKind kind, LocalDate date) => On(kind, date)?.Value
            ?? (kind == AnchorKind.HeartRateMax && HeartRateOn(date) > Beginning ? HeartRateMaximum.On(HeartRateOn(date), person, anchors)?.Bpm : null);

        /// <summary>A weight and an exponent of different dates are no pair, whatever their values.</summary>
        private string Text(AnchorKind kind, LocalDate date)
        {
            var value = On(kind, date)?.Value.ToString("R", CultureInfo.InvariantCulture) ?? "-";
            return kind == AnchorKind.TrimpWeight && TrimpPair.On(HeartRateOn(date), person, anchors).Pair is null ? $"{value} alone" : value;
        }

        private Anchor? On(AnchorKind kind, LocalDate date) => anchors.On(kind == AnchorKind.SpeedMax ? date : HeartRateOn(date), person.Id, kind);
    }
}
