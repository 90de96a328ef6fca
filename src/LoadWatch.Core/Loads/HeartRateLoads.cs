using LoadWatch.Activities;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Loads;

/// <summary>
/// Every load that follows from heart rate and a person's anchors. All of them are sums over the bins of the histogram in ascending order, so what is
/// computed from samples and what is computed again from a stored histogram agree to the last bit.
/// </summary>
public static class HeartRateLoads
{
    /// <summary>Everything that <see cref="Of"/> may say, so that what it said before can be told from other remarks.</summary>
    public static IReadOnlyList<string> EveryRemark { get; } = [.. HeartRateReserve.EveryMissing, .. TrimpPair.EveryMissing];

    /// <summary>Only what can be computed, each at most once, and in plain words what hinders the others.</summary>
    /// <param name="heartRate">Milliseconds by whole bpm; null where heart rate was not recorded or is not usable: then nothing is told.</param>
    /// <param name="date">The local date of the session: anchors are taken as they hold on it.</param>
    public static (IReadOnlyList<Quantity> Quantities, IReadOnlyList<string> Remarks) Of(
        Histogram? heartRate, LocalDate date, Person person, AnchorBook anchors, EquationChoices equations)
    {
        if (heartRate is null)
        {
            return ([], []);
        }

        var (reserve, missing) = HeartRateReserve.On(date, person, anchors);
        var (own, missingOfPair) = TrimpPair.On(date, person, anchors);
        IEnumerable<Quantity?> quantities =
        [
            .. OfReserve(heartRate, reserve, own, person.Sex, equations),
            .. OfMaximum(heartRate, HeartRateMaximum.On(date, person, anchors), equations),
            HeartRateThresholds.On(date, person, anchors) is { } thresholds
                ? Load(QuantityNames.LuciaLoad, LuciaLoad.Of(heartRate, thresholds, equations.LuciaWeights), thresholds.Estimated)
                : null,
        ];
        return ([.. quantities.OfType<Quantity>()], [.. new[] { missing, missingOfPair }.OfType<string>()]);
    }

    private static IEnumerable<Quantity?> OfReserve(Histogram heartRate, HeartRateReserve? reserve, TrimpPair? own, Sex? sex, EquationChoices equations)
    {
        if (reserve is null)
        {
            yield break;
        }

        yield return Load(QuantityNames.BanisterTrimp, BanisterTrimp.Of(heartRate, reserve, sex, equations), reserve.Estimated || sex is null);
        if (own is not null)
        {
            yield return Load(QuantityNames.IndividualTrimp, IndividualTrimp.Of(heartRate, reserve, own), reserve.Estimated || own.Estimated);
        }
    }

    private static IEnumerable<Quantity?> OfMaximum(Histogram heartRate, HeartRateMaximum? max, EquationChoices equations)
    {
        if (max is { Bpm: > 0 })
        {
            yield return Load(QuantityNames.EdwardsLoad, EdwardsLoad.Of(heartRate, max.Bpm, equations.EdwardsWeights), max.Estimated);
            yield return Load(QuantityNames.StagnoLoad, StagnoLoad.Of(heartRate, max.Bpm, equations), max.Estimated);
        }
    }

    private static Quantity? Load(string name, double? value, bool estimated) => value is { } known ? new Quantity(name, known, "AU", estimated) : null;
}
