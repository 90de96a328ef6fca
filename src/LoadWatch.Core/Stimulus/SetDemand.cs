using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Stimulus;

/// <summary>How hard a working set was against the person's maximum.</summary>
/// <param name="Repetitions">1 or more.</param>
/// <param name="RelativeLoad">Load over one-repetition maximum, above 0.</param>
/// <param name="RelativeError">Of the maximum.</param>
/// <param name="Reserve">Repetitions that would still have been possible; null where not stated.</param>
public sealed record SetDemand(int Repetitions, double RelativeLoad, double RelativeError, double? Reserve, Grade Grade)
{
    /// <summary>A maximum measured this long ago still counts as measured for grade A, days. A choice.</summary>
    public const int FreshDays = 56;

    private const int MostRepetitions = 1000;

    /// <summary>
    /// The demand, or null with what is missing. Load over anchored maximum where both are known (no load, or 0 kg, is body weight);
    /// else the load chart from repetitions done and in reserve, up to 12 together.
    /// </summary>
    public static (SetDemand? Demand, string? Missing) Of(StrengthSet set, LocalDate date, string person, AnchorBook anchors)
    {
        if (set.Repetitions is not (>= 1 and <= MostRepetitions) || set.Repetitions is not { } repetitions)
        {
            return (null, "repetitions");
        }

        var kilograms = set.Kilograms is > 0 and <= SetTotals.MostKilograms ? set.Kilograms : null;
        var reserve = set.RepetitionsInReserve is >= 0 and < double.PositiveInfinity ? set.RepetitionsInReserve : null;
        var maximum = anchors.On(date, person, AnchorKind.OneRepetitionMax, set.Exercise);
        if (kilograms is { } load && maximum is not null)
        {
            return (new SetDemand(repetitions, load / maximum.Value, ErrorOf(maximum), reserve, GradeOf(maximum, reserve, date)), null);
        }

        return reserve is { } left && LoadChart.Share(repetitions + left) is { } share
            ? (FromChart(repetitions, share, left, kilograms is not null), null)
            : (null, $"{(kilograms is null ? "load" : "one_repetition_max")}, or repetitions in reserve up to 12 in all");
    }

    /// <summary>
    /// Relative drive of each repetition in a variant. Without a stated reserve it is the load alone, a lower bound, and the high variant
    /// reads the set as taken to failure.
    /// </summary>
    public IEnumerable<double> Drives(Variant variant)
    {
        var load = RelativeLoad / variant.Capacity(1, RelativeError);
        double? failing = Reserve is { } left ? Repetitions + left : variant.Side > 0 ? Repetitions : null;
        return Enumerable.Range(1, Repetitions).Select(repetition => StrengthDrive.Of(load, repetition, failing));
    }

    private static SetDemand FromChart(int repetitions, double share, double reserve, bool loaded) => new(
        repetitions,
        share,
        loaded ? CapacityError.Estimated : CapacityError.Population,
        reserve,
        loaded ? Grade.B : Grade.D);

    private static double ErrorOf(Anchor maximum) =>
        maximum.Source == AnchorSource.Measured ? CapacityError.Measured : CapacityError.Estimated;

    private static Grade GradeOf(Anchor maximum, double? reserve, LocalDate date)
    {
        var fresh = maximum.Source == AnchorSource.Measured && maximum.Date is { } tested && tested >= date.PlusDays(-FreshDays);
        return fresh && reserve is not null ? Grade.A : Grade.B;
    }
}
