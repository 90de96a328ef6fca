using System.Globalization;
using LoadWatch.Capacity;
using LoadWatch.Loads;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Anchors;

/// <summary>An observed value that contradicts a measured one. The measured one is used; this is shown, so that somebody may test again.</summary>
public sealed record AnchorContradiction(ObservedAnchor Observed, Anchor Measured)
{
    /// <summary>Whose line lies below this share of the measured one has not gone to the limit, rather than lost so much. A choice.</summary>
    internal const double ReachWanted = 0.8;

    /// <summary>
    /// Those that hold on a date, in the order of the kinds. A regression may contradict either way, a lower one only where it reaches 80 % of the measured line; a best
    /// only by being higher, since who has not tried shows less. W' and D' are too unsure to contradict anything.
    /// </summary>
    /// <param name="observed">Of one person.</param>
    /// <param name="stated">The person's anchors of the configuration and of tables.</param>
    public static IReadOnlyList<AnchorContradiction> On(LocalDate date, IEnumerable<ObservedAnchor> observed, AnchorBook stated)
    {
        var held = observed.Where(one => one.From <= date).GroupBy(one => one.Of).ToDictionary(same => same.Key, same => same.MaxBy(one => one.From)!);
        return
        [
            .. held.Values
                .Select(one => (Observed: one, Measured: stated.MeasuredOn(date, one.ToAnchor())))
                .Where(pair => pair.Measured is not null && IsBeyond(pair.Observed, pair.Measured) && IsReached(pair.Observed, pair.Measured))
                .Select(pair => new AnchorContradiction(pair.Observed, pair.Measured!))
                .OrderBy(one => one.Observed.Kind).ThenBy(one => one.Observed.Sport, StringComparer.Ordinal)
                .ThenBy(one => one.Observed.Exercise, StringComparer.Ordinal).ThenBy(one => one.Observed.Machine, StringComparer.Ordinal),
        ];

        bool IsReached(ObservedAnchor critical, Anchor measured) => ReserveOf(critical.Kind) is not { } kind || Reach(critical, measured, kind) >= ReachWanted;

        // Where both reserves are known, the nearest that the lines come at durations for which they hold; else the ratio of the critical values.
        double Reach(ObservedAnchor critical, Anchor measured, AnchorKind kind) =>
            held.TryGetValue(critical.Of with { Kind = kind }, out var reserve) && stated.MeasuredOn(date, reserve.ToAnchor()) is { } measuredReserve
                ? TrialChoice.Span.Max(seconds => (critical.Value + (reserve.Value / seconds)) / (measured.Value + (measuredReserve.Value / seconds)))
                : critical.Value / measured.Value;
    }

    private static AnchorKind? ReserveOf(AnchorKind kind) => kind switch
    {
        AnchorKind.CriticalPower => AnchorKind.WPrime,
        AnchorKind.CriticalSpeed => AnchorKind.DPrime,
        _ => null,
    };

    /// <summary>One sentence, without a full stop.</summary>
    public string Words
    {
        get
        {
            var unit = AnchorKinds.Of(Observed.Kind).Unit;
            var of = Observed switch
            {
                { Sport: { } sport } => $" ({sport})",
                { Exercise: { } exercise, Machine: null } => $" of {exercise.Replace('_', ' ')}",
                { Exercise: { } exercise, Machine: { } machine } => $" of {exercise.Replace('_', ' ')} on {machine.Replace('_', ' ')}",
                _ => "",
            };
            var measured = Measured.Date is { } date ? FormattableString.Invariant($"measured on {date:d MMMM uuuu}") : "measured";
            return FormattableString.Invariant(
                $"{ReferenceWords.Of(Observed.Kind)}{of}: {Measured.Value:0.##} {unit} {measured}, own sessions up to {Observed.ShownOn:d MMMM uuuu} show {Told(Observed.Value)} {unit} (within {Told(Observed.Error)} {unit}): the measured one is used; measure again?");
        }
    }

    /// <summary>As fine as it can be read: a hundred watts and more to the watt.</summary>
    private static string Told(double value) => value.ToString(value >= 100 ? "0" : value >= 10 ? "0.#" : "0.##", CultureInfo.InvariantCulture);

    private static bool IsBeyond(ObservedAnchor observed, Anchor measured) => observed.Kind switch
    {
        AnchorKind.CriticalPower or AnchorKind.CriticalSpeed => Math.Abs(observed.Value - measured.Value) > observed.Error,
        AnchorKind.WPrime or AnchorKind.DPrime => false,
        _ => observed.Value - measured.Value > observed.Error,
    };
}
